import type { Problems } from './problems.ts';

/** The wanted cells of a delimited body, row by row. */
export interface Cells {
  readonly count: number;
  /** 1-based line of each row. */
  readonly line: Int32Array;
  /** 1 where the row's number of cells was wrong (and reported). */
  readonly faulty: Uint8Array;
  /** Text of a row in the column `wanted[slot]`; blank in a faulty row. */
  readonly cell: (slot: number, row: number) => string;
}

export interface CellRequest {
  readonly lines: readonly string[];
  /** Index into `lines` at which the body begins. */
  readonly from: number;
  readonly delimiter: string;
  /** 0-based columns to keep. */
  readonly wanted: readonly number[];
  /** How many cells every row must have. */
  readonly width: number;
}

/**
 * Cuts the body of a delimited file into cells. A body without any quotation mark is cut directly, in a tenth of
 * the time that a general parser needs; one with quotation marks goes through csv-parse. Blank lines are passed over.
 * Reports rows with too few or too many cells.
 */
export const cutCells = async (request: CellRequest, problems: Problems): Promise<Cells> => {
  for (let i = request.from; i < request.lines.length; i++)
    if (request.lines[i].includes('"')) return cutQuoted(request, problems);
  return cutPlain(request, problems);
};

const wrongWidth = (line: number, expected: number, found: number, problems: Problems): void =>
  problems.add({
    code: 'column-count',
    line,
    expected: `${expected} columns`,
    found: String(found),
    fix: 'Check the row for lost or surplus separators.',
  });

/** For bodies without quotation marks. Keeps where the cells lie and cuts them when asked: no string outlives its use. */
export const cutPlain = (request: CellRequest, problems: Problems): Cells => {
  const { lines, from, delimiter, wanted, width } = request;
  const room = Math.max(0, lines.length - from);
  const [line, faulty] = [new Int32Array(room), new Uint8Array(room)];
  const bounds = new Int32Array(room * wanted.length * 2);
  const starts = new Int32Array(width + 2);
  let row = 0;
  for (let i = from; i < lines.length; i++) {
    const text = lines[i];
    if (text.trim() === '') continue;
    const found = findCells(text, delimiter, starts);
    line[row] = i + 1;
    if (found === width)
      for (let slot = 0; slot < wanted.length; slot++) {
        const at = (row * wanted.length + slot) * 2;
        bounds[at] = starts[wanted[slot]];
        bounds[at + 1] = starts[wanted[slot] + 1] - 1;
      }
    else {
      faulty[row] = 1;
      wrongWidth(i + 1, width, found, problems);
    }
    row++;
  }
  return {
    count: row,
    line: line.subarray(0, row),
    faulty: faulty.subarray(0, row),
    cell: (slot, r) => {
      const at = (r * wanted.length + slot) * 2;
      return lines[line[r] - 1].slice(bounds[at], bounds[at + 1]);
    },
  };
};

/** Writes where each cell of a line starts, and one past the last; returns how many there are. */
const findCells = (text: string, delimiter: string, starts: Int32Array): number => {
  const code = delimiter.charCodeAt(0);
  let count = 1;
  starts[0] = 0;
  for (let at = 0; at < text.length; at++) if (text.charCodeAt(at) === code) starts[count++] = at + 1; // beyond the array this is dropped, and the row is faulty
  starts[count] = text.length + 1;
  return count;
};

/** For bodies with quotation marks: csv-parse knows all their rules (RFC 4180). */
export const cutQuoted = async (request: CellRequest, problems: Problems): Promise<Cells> => {
  const { parse, CsvError } = await import('csv-parse/sync');
  const rows: { line: number; record: string[] }[] = [];
  try {
    parse(request.lines.slice(request.from).join('\n'), {
      delimiter: request.delimiter,
      record_delimiter: '\n',
      skip_empty_lines: true,
      relax_column_count: true,
      max_record_size: 100_000,
      on_record: (record: string[], { lines }) => {
        rows.push({ line: request.from + lines, record });
        return null;
      },
    });
  } catch (cause) {
    if (!(cause instanceof CsvError)) throw cause;
    const line = typeof cause.lines === 'number' ? request.from + cause.lines : undefined;
    problems.add({
      code: 'quoting',
      line,
      expected: 'quotation marks in pairs, around whole cells',
      found: 'a stray one',
      fix: 'Remove it, or double it inside a quoted cell.',
    });
    problems.throwIfAny({ cause });
  }
  const faulty = Uint8Array.from(rows, ({ record }) => (record.length === request.width ? 0 : 1));
  for (const { line, record } of rows)
    if (record.length !== request.width) wrongWidth(line, request.width, record.length, problems);
  return {
    count: rows.length,
    line: Int32Array.from(rows, ({ line }) => line),
    faulty,
    cell: (slot, row) => (faulty[row] ? '' : rows[row].record[request.wanted[slot]]),
  };
};
