import type { Finding } from '../shared/index.ts';
import type { Cells } from './cells.ts';
import type { Problems } from './problems.ts';

/** Year, month, day, hour, minute, second as printed, not yet checked for range. */
export type PrintedTime = readonly [number, number, number, number, number, number];

export interface PrintedTimes {
  /** The time in a cell; null where it is not in the file's form. */
  readonly read: (cell: string) => PrintedTime | null;
  /** Which order day and month were taken in, where the form leaves that open. */
  readonly notes: readonly Finding[];
}

const CLOCK = String.raw`[T ]+(\d{1,2}):(\d{2})(?::(\d{2})(?:[.,]0+)?)?\s*$`;
const YEAR_FIRST = new RegExp(String.raw`^\s*(\d{4})[-/](\d{1,2})[-/](\d{1,2})${CLOCK}`);
const DOTTED = new RegExp(String.raw`^\s*(\d{1,2})\.(\d{1,2})\.(\d{4})${CLOCK}`);
const SLASHED = new RegExp(String.raw`^\s*(\d{1,2})/(\d{1,2})/(\d{4})${CLOCK}`);
const FORMS = [YEAR_FIRST, DOTTED, SLASHED];
const MONTHS = 12;

/** Whether a cell of a blank-separated row looks like a date whose time stands in the next cell. */
export const looksLikeDate = (cell: string): boolean =>
  /^(?:\d{4}[-/]\d+[-/]\d+|\d+\.\d+\.\d{4}|\d+\/\d+\/\d{4})$/.test(cell);

/**
 * How the times of a table are printed: year first (ISO 8601, or with slashes), day first with dots (31.01.2021), or
 * with slashes in an order that the file itself tells: a first number above 12 is a day, and so is a second one. The first
 * row that is in any of these forms sets the form for all. Reports slashes that are used in both orders.
 */
export const printedTimes = (cells: Cells, name: string, problems: Problems): PrintedTimes => {
  const form = formOf(cells);
  const order = form === SLASHED ? slashOrder(cells, name, problems) : null;
  const dayFirst = form === DOTTED || order === 'day';
  const read = (cell: string): PrintedTime | null => {
    const parts = form
      .exec(cell)
      ?.slice(1)
      .map((part) => Number(part ?? 0));
    if (!parts) return null;
    const [a, b, c, h, minute, second] = parts;
    if (form === YEAR_FIRST) return [a, b, c, h, minute, second];
    return dayFirst ? [c, b, a, h, minute, second] : [c, a, b, h, minute, second];
  };
  return { read, notes: form === YEAR_FIRST ? [] : [orderNote(form === DOTTED ? '.' : '/', dayFirst)] };
};

const formOf = (cells: Cells): RegExp => {
  for (let row = 0; row < cells.count; row++) {
    if (cells.faulty[row]) continue;
    const form = FORMS.find((f) => f.test(cells.cell(0, row)));
    if (form) return form;
  }
  return YEAR_FIRST;
};

/** A file too short to tell is not a whole year and is refused for that, whatever the order. */
const slashOrder = (cells: Cells, name: string, problems: Problems): 'day' | 'month' => {
  const above = [0, 0];
  const line = [0, 0];
  for (let row = 0; row < cells.count; row++) {
    const parts = cells.faulty[row] ? null : SLASHED.exec(cells.cell(0, row));
    for (const i of [0, 1])
      if (Number(parts?.[i + 1]) > MONTHS && above[i]++ === 0) line[i] = cells.line[row];
  }
  if (above[0] > 0 && above[1] > 0) {
    // A few odd rows do not turn the others round; they are reported as bad times by themselves.
    const odd = above[0] < above[1] ? 0 : 1;
    problems.add({
      code: 'mixed-dates',
      line: line[odd],
      field: name,
      expected: 'day and month in the same order all through',
      found: `${odd === 0 ? 'the day' : 'the month'} first here and last in line ${line[1 - odd]}`,
      fix: 'Write the dates in one order, best as 2021-01-31.',
    });
  }
  return above[0] > above[1] ? 'day' : 'month';
};

const orderNote = (separator: string, dayFirst: boolean): Finding => ({
  code: 'date-order',
  severity: 'note',
  text: `Dates were read as ${(dayFirst ? ['day', 'month', 'year'] : ['month', 'day', 'year']).join(separator)}.`,
  fix: '',
});
