import { type Problem, TrackworthError } from '../shared/index.ts';
import { shown } from './refuse.ts';
import type { SkylinePoint } from './skyline.ts';
import { pointProblems } from './skyline-points.ts';

const COLUMNS = ['bearing', 'elevation'] as const;
const NUMBER = /^[+-]?(?:\d+(?:\.\d*)?|\.\d+)$/;

interface Row {
  readonly line: number;
  readonly cells: readonly string[];
}

/**
 * A skyline from the text of a CSV file with the header `bearing,elevation` (either order; commas, semicolons or tabs),
 * in degrees; beside semicolons or tabs numbers may have a decimal comma. Bearings are as the file has them, magnetic or true. Throws every problem of the file with its line.
 */
export const readSkylineFile = async (file: string, text: string): Promise<SkylinePoint[]> => {
  const delimiter = delimiterOf(text);
  const [header, ...body] = await rowsOf(file, text, delimiter);
  const names = header.cells.map((cell) => cell.toLowerCase());
  const [bearing, elevation] = COLUMNS.map((name) => names.indexOf(name));
  if (bearing < 0 || elevation < 0 || names.length !== COLUMNS.length)
    throw new TrackworthError('input', [
      {
        code: 'wrong-header',
        file,
        line: header.line,
        expected: 'the header bearing,elevation',
        found: shown(header.cells.join(',')),
        fix: 'Let the first line name the two columns, and nothing else.',
      },
    ]);
  const problems: Problem[] = [];
  const decimalComma = hasDecimalComma(body, delimiter);
  const plain = (cell: string): string => (decimalComma ? cell.replace(',', '.') : cell);
  const read = body.map(({ line, cells }) => {
    if (cells.length !== COLUMNS.length) problems.push(wrongWidth(file, line, cells.length));
    const [azimuthDeg, elevationDeg] = [bearing, elevation].map((column, i) =>
      cells.length === COLUMNS.length
        ? number(file, line, COLUMNS[i], plain(cells[column]), problems)
        : Number.NaN,
    );
    return { line, azimuthDeg, elevationDeg };
  });
  const readable = read.filter((p) => !Number.isNaN(p.azimuthDeg) && !Number.isNaN(p.elevationDeg));
  const points = readable.map(({ azimuthDeg, elevationDeg }) => ({ azimuthDeg, elevationDeg }));
  const found = pointProblems(points, (index) => ({ file, line: readable[index]?.line ?? header.line }));
  // With unreadable rows, how many bearings there are cannot be told.
  problems.push(...found.filter(({ code }) => problems.length === 0 || code !== 'too-few-points'));
  if (problems.length > 0)
    throw new TrackworthError(
      'input',
      problems.toSorted((a, b) => (a.line ?? 0) - (b.line ?? 0)),
    );
  return points;
};

/** The header tells: only a semicolon or a tab that divides its two names leaves the comma to the numbers. */
const delimiterOf = (text: string): string => {
  const header = text.split(/\r\n|\n|\r/).find((line) => line.replace('\uFEFF', '').trim() !== '') ?? '';
  return [';', '\t'].find((delimiter) => header.includes(delimiter)) ?? ',';
};

/** A file that has 1.5 as well fails at its first cell with a comma. */
const hasDecimalComma = (body: readonly Row[], delimiter: string): boolean =>
  delimiter !== ',' &&
  !body.some(({ cells }) => cells.some((cell) => cell.includes('.'))) &&
  body.some(({ cells }) => cells.some((cell) => cell.includes(',')));

const rowsOf = async (file: string, text: string, delimiter: string): Promise<Row[]> => {
  const { parse, CsvError } = await import('csv-parse/sync');
  const rows: Row[] = [];
  try {
    parse(text, {
      bom: true,
      delimiter,
      relax_column_count: true,
      skip_empty_lines: true,
      trim: true,
      max_record_size: 10_000,
      on_record: (cells: string[], { lines }) => {
        rows.push({ line: lines, cells });
        return null;
      },
    });
  } catch (cause) {
    if (!(cause instanceof CsvError)) throw cause;
    const line = typeof cause.lines === 'number' ? cause.lines : undefined;
    const [expected, fix] = [
      'rows of a bearing and an elevation',
      'Write one point a line, such as 120,8.5.',
    ];
    throw new TrackworthError(
      'input',
      [{ code: 'quoting', file, line, expected, found: 'a stray quotation mark or an endless line', fix }],
      { cause },
    );
  }
  if (rows.length > 0) return rows;
  throw new TrackworthError('input', [
    {
      code: 'empty-file',
      file,
      expected: 'a skyline with the header bearing,elevation',
      found: 'an empty file',
      fix: 'Check that the copy was complete.',
    },
  ]);
};

const wrongWidth = (file: string, line: number, found: number): Problem => ({
  code: 'column-count',
  file,
  line,
  expected: '2 columns',
  found: String(found),
  fix: 'Write one point a line, divided as the header is; numbers with a decimal comma need semicolons between them.',
});

/** Reports what is no number and gives NaN for it. */
const number = (file: string, line: number, field: string, cell: string, problems: Problem[]): number => {
  if (NUMBER.test(cell)) return Number(cell);
  problems.push({
    code: 'not-a-number',
    file,
    line,
    field,
    expected: 'degrees as a bare number',
    found: shown(cell),
    fix: 'Write for example 8.5.',
  });
  return Number.NaN;
};
