import { HOURS, hourName } from '../shared/index.ts';
import { thousands } from './numbers.ts';
import type { Problems } from './problems.ts';
import { LEAP_HOUR, type Reading, type Rows, UNKNOWN_HOUR } from './raw-year.ts';

/**
 * Checks that the rows are the 8,760 hours of one year, each once and in order. Reports leap days, surplus rows,
 * missing, repeated and misplaced hours with their lines, and a year that stops early.
 */
export const checkOrder = (rows: Rows, begins: Reading['begins'], problems: Problems): void => {
  const leapRow = rows.hour.indexOf(LEAP_HOUR);
  if (rows.count === 0)
    problems.add({
      code: 'no-data',
      expected: `${thousands(HOURS)} hourly rows`,
      found: 'none below the header',
      fix: 'Check that the download or copy was complete.',
    });
  else if (leapRow >= 0)
    problems.add({
      code: 'leap-year',
      line: rows.line[leapRow],
      expected: `a year of 365 days, ${thousands(HOURS)} rows`,
      found: `${thousands(rows.count)} rows with 29 February among them`,
      fix: 'Leap years are not read yet: leave out the 24 rows of 29 February, as typical years do.',
    });
  else if (rows.count > HOURS + 24)
    problems.add({
      code: 'too-many-rows',
      expected: `${thousands(HOURS)} hourly rows`,
      found: thousands(rows.count),
      fix: 'Give one year, one row an hour.',
    });
  else walk(rows, begins === 'any hour' ? firstKnown(rows.hour) : 0, problems);
};

const firstKnown = (hours: Int32Array): number => hours.find((hour) => hour !== UNKNOWN_HOUR) ?? 0;

/** Follows the rows hour by hour, counting hours from `first` and round the end of the year. */
const walk = (rows: Rows, first: number, problems: Problems): void => {
  const seen = new Uint8Array(HOURS);
  const name = (step: number) => `the hour from ${hourName((first + step) % HOURS)}`;
  let expected = 0;
  for (let row = 0; row < rows.count; row++) {
    if (rows.hour[row] === UNKNOWN_HOUR) {
      expected++; // its problem is known; take it for the hour that was due
      continue;
    }
    const step = (rows.hour[row] - first + HOURS) % HOURS;
    if (step > expected) reportGap(rows, row, expected, step, name, problems);
    if (step < expected)
      problems.add({
        code: seen[step] ? 'duplicate-hour' : 'hour-out-of-order',
        line: rows.line[row],
        expected: expected < HOURS ? name(expected) : 'the end of the year',
        found: `${name(step)}${seen[step] ? ' a second time' : ''}`,
        fix: 'Sort the rows and keep one for each hour.',
      });
    else expected = step + 1;
    seen[step] = 1;
  }
  if (expected < HOURS) reportEnd(rows, name(expected - 1), problems);
};

const reportGap = (
  rows: Rows,
  row: number,
  from: number,
  to: number,
  name: (step: number) => string,
  problems: Problems,
): void =>
  problems.add({
    code: 'missing-hours',
    line: rows.line[row],
    expected: name(from),
    found: `${name(to)}: ${to - from === 1 ? 'one hour is' : `${thousands(to - from)} hours are`} missing`,
    fix: 'Add the missing rows; leave blank what was not measured.',
  });

const reportEnd = (rows: Rows, last: string, problems: Problems): void =>
  problems.add({
    code: 'truncated-year',
    line: rows.line[rows.count - 1],
    expected: `${thousands(HOURS)} hourly rows`,
    found: `${thousands(rows.count)}, of which the last is ${last}`,
    fix: 'Check that the download or copy was complete.',
  });
