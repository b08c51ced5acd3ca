import type { Finding, HourLabel } from '../shared/index.ts';
import type { Cells } from './cells.ts';
import { dayOfYear, isLeapDay } from './hour-of-year.ts';
import { MINUTES_BEFORE_LABEL } from './labels.ts';
import type { Problems } from './problems.ts';
import { LEAP_HOUR, UNKNOWN_HOUR } from './raw-year.ts';
import { type PrintedTime, printedTimes } from './table-dates.ts';

const YEAR_MIN = 365 * 24 * 60;
const UNKNOWN = Number.NaN;
/** No day is the 0th of a month 0, so this is refused like any other date that does not exist. */
const NO_TIME: PrintedTime = [0, 0, 0, 0, 0, 0];

export interface TableTimes {
  readonly hour: Int32Array;
  readonly year: Int16Array;
  readonly offsetMin: number;
  readonly notes: readonly Finding[];
}

/**
 * Which hour of the year each row of a table stands for, from its printed local time and what that stands for.
 * The hours of all rows begin at the same minute; what is left over whole hours is `offsetMin`, -30..30.
 */
export const tableTimes = (cells: Cells, name: string, label: HourLabel, problems: Problems): TableTimes => {
  const year = new Int16Array(cells.count);
  const leap = new Uint8Array(cells.count);
  const begins = new Float64Array(cells.count).fill(UNKNOWN);
  const { read, notes } = printedTimes(cells, name, problems);
  for (let row = 0; row < cells.count; row++) {
    if (cells.faulty[row]) continue;
    const time = read(cells.cell(0, row));
    const [y, month, day, h, minute, second] = time ?? NO_TIME;
    const dayIndex = time ? dayOfYear(month, day) : -1;
    leap[row] = time && isLeapDay(month, day) ? 1 : 0;
    if (leap[row]) continue;
    if (dayIndex < 0 || h > 24 || minute > 59 || second > 0 || (h === 24 && minute > 0)) {
      badTime(cells, row, name, problems);
      continue;
    }
    begins[row] = dayIndex * 1440 + h * 60 + minute - MINUTES_BEFORE_LABEL[label];
    year[row] = y;
  }
  return { year, notes, ...wholeHours(begins, leap, cells, problems) };
};

/** Splits beginnings in minutes into hours of the year and one offset. The year is a ring. */
const wholeHours = (begins: Float64Array, leap: Uint8Array, cells: Cells, problems: Problems) => {
  const hour = new Int32Array(begins.length).fill(UNKNOWN_HOUR);
  const first = begins.find((b) => !Number.isNaN(b)) ?? 0;
  const phase = ((first % 60) + 60) % 60;
  // Half hours could count either way: a year that begins at 23:30 is the one that lies half an hour early.
  const offsetMin = phase > 30 || (phase === 30 && first < 0) ? phase - 60 : phase;
  const step = begins[1] - begins[0];
  if (step > 0 && step !== 60 && begins[2] - begins[1] === step)
    problems.fail({
      code: 'not-hourly',
      line: cells.line[1],
      expected: 'one row an hour',
      found: `a step of ${step} minutes`,
      fix: 'Average the table to hours.',
    });
  for (let row = 0; row < begins.length; row++) {
    const h = (begins[row] - offsetMin) / 60;
    if (leap[row]) hour[row] = LEAP_HOUR;
    else if (Number.isInteger(h)) hour[row] = (h + YEAR_MIN / 60) % (YEAR_MIN / 60);
    else if (!Number.isNaN(h))
      problems.add({
        code: 'uneven-time',
        line: cells.line[row],
        expected: 'the same minute past the hour as in the first row',
        found: JSON.stringify(cells.cell(0, row).trim()),
        fix: 'Give one row an hour, an hour apart.',
      });
  }
  return { hour, offsetMin };
};

const badTime = (cells: Cells, row: number, name: string, problems: Problems): void =>
  problems.add({
    code: 'bad-time',
    line: cells.line[row],
    field: name,
    expected: 'local standard time without a zone, as 2021-01-31 13:00, in one form all through',
    found: JSON.stringify(cells.cell(0, row).trim().slice(0, 40)),
    fix: 'Rewrite the time column; the offset from UTC goes to site.utc_offset.',
  });
