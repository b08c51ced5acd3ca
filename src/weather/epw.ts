/**
 * EPW, the open EnergyPlus weather format (public data dictionary of the format). Eight header lines, of which
 * LOCATION gives the place and DATA PERIODS is the last; then one line an hour: year, month, day, hour 1..24 (hour 1
 * ends at 01:00 local standard time), minute (0 or 60, no offset), flags, and values. Irradiance is Wh/m2 over
 * the hour, which is the hour's mean in W/m2.
 */
import type { Finding } from '../shared/index.ts';
import { type Cells, cutCells } from './cells.ts';
import { readNumbers } from './columns.ts';
import { dayOfYear, isLeapDay } from './hour-of-year.ts';
import { offsetOfLabel } from './labels.ts';
import { parseCell } from './numbers.ts';
import type { Problems } from './problems.ts';
import { LEAP_HOUR, type ReaderInput, type Reading, UNKNOWN_HOUR, type WeatherReader } from './raw-year.ts';

/** 0-based columns, and the least values that mean missing. */
const DATE = { year: 0, month: 1, day: 2, hour: 3, minute: 4 };
const VALUES = {
  temperature: { column: 6, name: 'dry bulb temperature', missing: (v: number) => v === 99.9 },
  ghi: { column: 13, name: 'global horizontal radiation', missing: (v: number) => v >= 9999 },
  dni: { column: 14, name: 'direct normal radiation', missing: (v: number) => v >= 9999 },
  dhi: { column: 15, name: 'diffuse horizontal radiation', missing: (v: number) => v >= 9999 },
  wind: { column: 21, name: 'wind speed', missing: (v: number) => v >= 999 },
  albedo: { column: 32, name: 'albedo', missing: (v: number) => v >= 999 },
};
/** Up to and with the wind speed; later columns are missing in some old files. */
const LEAST_WIDTH = 22;

const readEpw = async ({ lines, label: wantedLabel, problems }: ReaderInput): Promise<Reading> => {
  const location = lines[0].split(',');
  const number = (cell: string | undefined): number => parseCell(cell ?? '') ?? Number.NaN;
  const from = bodyBegins(lines, problems);
  const width = (lines[from] ?? '').split(',').length;
  if (width < LEAST_WIDTH && from < lines.length && lines[from].trim() !== '')
    problems.fail({
      code: 'column-count',
      line: from + 1,
      expected: `at least ${LEAST_WIDTH} columns, as EPW has`,
      found: String(width),
      fix: 'Check that the file is a whole EPW file.',
    });
  const albedo = width > VALUES.albedo.column ? [VALUES.albedo.column] : [];
  const { temperature, ghi, dni, dhi, wind } = VALUES;
  const wanted = [
    ...Object.values(DATE),
    ...[temperature, ghi, dni, dhi, wind].map((v) => v.column),
    ...albedo,
  ];
  const cells = await cutCells({ lines, from, delimiter: ',', wanted, width }, problems);
  const column = (value: keyof typeof VALUES) =>
    readNumbers(cells, wanted.indexOf(VALUES[value].column), VALUES[value], problems);
  const label = wantedLabel ?? 'end';
  return {
    station: [location[1], location[2], location[3]].filter((s) => s?.trim()).join(', '),
    place: {
      latitudeDeg: number(location[6]),
      longitudeDeg: number(location[7]),
      utcOffsetH: number(location[8]),
      elevationM: number(location[9]),
    },
    placeLine: 1,
    rows: {
      count: cells.count,
      line: cells.line,
      ...dates(cells, problems),
      columns: {
        ghi: column('ghi'),
        dni: column('dni'),
        dhi: column('dhi'),
        temperature: column('temperature'),
        wind: column('wind'),
        albedo: albedo.length > 0 ? column('albedo') : null,
      },
    },
    label,
    offsetMin: offsetOfLabel(label),
    begins: 'first hour',
    notes: minuteNote(cells),
  };
};

const bodyBegins = (lines: readonly string[], problems: Problems): number => {
  const periods = lines.findIndex((line) => /^"?DATA PERIODS/i.test(line));
  if (periods < 0)
    problems.fail({
      code: 'no-data-periods',
      expected: 'a header line that begins with DATA PERIODS',
      found: 'none',
      fix: 'Check that the file is a whole EPW file.',
    });
  const perHour = lines[periods].split(',')[2]?.trim();
  if (perHour !== '1')
    problems.fail({
      code: 'not-hourly',
      line: periods + 1,
      field: 'DATA PERIODS',
      expected: '1 record per hour',
      found: JSON.stringify(perHour ?? ''),
      fix: 'Average the file to hours.',
    });
  return periods + 1;
};

const dates = (cells: Cells, problems: Problems): { hour: Int32Array; year: Int16Array } => {
  const hour = new Int32Array(cells.count).fill(UNKNOWN_HOUR);
  const year = new Int16Array(cells.count);
  const number = (slot: number, row: number): number => parseCell(cells.cell(slot, row)) ?? Number.NaN;
  for (let row = 0; row < cells.count; row++) {
    if (cells.faulty[row]) continue;
    const [y, month, day, h] = [number(0, row), number(1, row), number(2, row), number(3, row)];
    const dayIndex = dayOfYear(month, day);
    if (isLeapDay(month, day)) hour[row] = LEAP_HOUR;
    else if (dayIndex >= 0 && Number.isInteger(y) && Number.isInteger(h) && h >= 1 && h <= 24) {
      hour[row] = dayIndex * 24 + h - 1;
      year[row] = y;
    } else
      problems.add({
        code: 'bad-date',
        line: cells.line[row],
        expected: 'year, month, day and hour 1 to 24',
        found: [0, 1, 2, 3].map((slot) => cells.cell(slot, row)).join(','),
        fix: 'Correct the date of the row.',
      });
  }
  return { hour, year };
};

const minuteNote = (cells: Cells): Finding[] => {
  for (let row = 0; row < cells.count; row++) {
    const minute = cells.cell(4, row).trim();
    if (cells.faulty[row] || Number(minute) === 0 || Number(minute) === 60) continue;
    return [
      {
        code: 'minute-field',
        severity: 'note',
        text: `Line ${cells.line[row]} has ${minute} in the minute field; EPW gives it no meaning and it was ignored.`,
        fix: 'If the times are not the ends of the hours, say so under weather.label or weather.add_minutes.',
      },
    ];
  }
  return [];
};

export const epw: WeatherReader = {
  format: 'EPW',
  recognises: (lines) => /^"?LOCATION"?,/i.test(lines[0]),
  read: readEpw,
};
