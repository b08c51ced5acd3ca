import type { Problems } from './problems.ts';

/** The cells of the wanted columns of a delimited body: `cells[k][row]` belongs to `wanted[k]`. */
export interface Cells {
  readonly count: number;
  readonly line: Int32Array;
  readonly cells: readonly string[][];
  /** 1 where the row's number of cells was wrong (and reported): its cells are blank. */
  readonly faulty: Uint8Array;
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

const collector = (request: CellRequest, problems: Problems) => {
  const line: number[] = [];
  const faulty: number[] = [];
  const cells = request.wanted.map((): string[] => []);
  return {
    add(lineNumber: number, width: number, cellAt: (k: number) => string): void {
      line.push(lineNumber);
      const wrong = width !== request.width;
      faulty.push(wrong ? 1 : 0);
      for (let k = 0; k < cells.length; k++) cells[k].push(wrong ? '' : cellAt(k));
      if (wrong)
        problems.add({
          code: 'column-count',
          line: lineNumber,
          expected: `${request.width} columns`,
          found: String(width),
          fix: 'Check the row for lost or surplus separators.',
        });
    },
    done: (): Cells => ({
      count: line.length,
      line: Int32Array.from(line),
      cells,
      faulty: Uint8Array.from(faulty),
    }),
  };
};

/** For bodies without quotation marks. */
export const cutPlain = (request: CellRequest, problems: Problems): Cells => {
  const { lines, from, delimiter, wanted, width } = request;
  const rows = collector(request, problems);
  const starts = new Int32Array(width + 1);
  for (let i = from; i < lines.length; i++) {
    const text = lines[i];
    if (text.trim() === '') continue;
    let count = 0;
    let at = 0;
    starts[0] = 0;
    while (at >= 0) {
      at = text.indexOf(delimiter, at);
      count++;
      if (at >= 0 && count <= width) starts[count] = ++at;
      else if (at >= 0) at++;
    }
    starts[count] = text.length + 1;
    rows.add(i + 1, count, (k) => text.slice(starts[wanted[k]], starts[wanted[k] + 1] - 1));
  }
  return rows.done();
};

/** For bodies with quotation marks: csv-parse knows all their rules (RFC 4180). */
export const cutQuoted = async (request: CellRequest, problems: Problems): Promise<Cells> => {
  const { parse, CsvError } = await import('csv-parse/sync');
  const rows = collector(request, problems);
  try {
    parse(request.lines.slice(request.from).join('\n'), {
      delimiter: request.delimiter,
      record_delimiter: '\n',
      skip_empty_lines: true,
      relax_column_count: true,
      max_record_size: 100_000,
      on_record: (record: string[], { lines }) => {
        rows.add(request.from + lines, record.length, (k) => record[request.wanted[k]]);
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
  return rows.done();
};
