/**
 * TMY2 (Marion & Urban 1995, User's Manual for TMY2s, NREL/SP-463-7668, tables 3-1 and 3-2): fixed columns, a
 * station line and 8,760 lines of 142 characters. Hours 1..24 by their end, local standard time; irradiance in Wh/m2
 * over the hour; years of two digits, 19xx.
 */
import { dayOfYear, isLeapDay } from './hour-of-year.ts';
import { offsetOfLabel } from './labels.ts';
import { notANumber, parseCell } from './numbers.ts';
import type { Problems } from './problems.ts';
import {
  LEAP_HOUR,
  type PartialPlace,
  type ReaderInput,
  type Reading,
  type Rows,
  UNKNOWN_HOUR,
  type WeatherReader,
} from './raw-year.ts';

/** WBAN number, city, state, zone, latitude, longitude in degrees and minutes, elevation in m. */
const STATION =
  /^ ?(\d{5}) (.{22}) (.{2}) +([-+]?\d+) ([NS]) +(\d+) +(\d+) ([EW]) +(\d+) +(\d+) +(-?\d+)\s*$/;
const LINE_LENGTH = 142;

/** First and last character (1-based, as the manual counts), value for missing, and what makes the stated unit of it. */
const FIELDS = {
  ghi: { first: 18, last: 21, missing: 9999, per: 1, name: 'global horizontal radiation' },
  dni: { first: 24, last: 27, missing: 9999, per: 1, name: 'direct normal radiation' },
  dhi: { first: 30, last: 33, missing: 9999, per: 1, name: 'diffuse horizontal radiation' },
  temperature: { first: 68, last: 71, missing: 9999, per: 10, name: 'dry bulb temperature' },
  wind: { first: 96, last: 98, missing: 999, per: 10, name: 'wind speed' },
} as const;
type Field = keyof typeof FIELDS;
const FIELD_NAMES = Object.keys(FIELDS) as Field[];

const readTmy2 = ({ lines, label: wantedLabel, problems }: ReaderInput): Reading => {
  const label = wantedLabel ?? 'end';
  const station = STATION.exec(lines[0]) as RegExpExecArray;
  return {
    station: `${station[2].trim().replaceAll('_', ' ')}, ${station[3].trim()}`,
    place: placeOf(station),
    placeLine: 1,
    rows: readRows(lines, problems),
    label,
    offsetMin: offsetOfLabel(label),
    begins: 'first hour',
    notes: [],
  };
};

const placeOf = (station: RegExpExecArray): PartialPlace => {
  const degrees = (letter: string, whole: string, minutes: string): number =>
    (letter === 'S' || letter === 'W' ? -1 : 1) * (Number(whole) + Number(minutes) / 60);
  return {
    latitudeDeg: degrees(station[5], station[6], station[7]),
    longitudeDeg: degrees(station[8], station[9], station[10]),
    utcOffsetH: Number(station[4]),
    elevationM: Number(station[11]),
  };
};

const readRows = (lines: readonly string[], problems: Problems): Rows => {
  const at: number[] = [];
  for (let i = 1; i < lines.length; i++) if (lines[i].trim() !== '') at.push(i);
  const count = at.length;
  const hour = new Int32Array(count).fill(UNKNOWN_HOUR);
  const year = new Int16Array(count);
  const column = () => new Float64Array(count).fill(Number.NaN);
  const columns = { ghi: column(), dni: column(), dhi: column(), temperature: column(), wind: column() };
  for (let row = 0; row < count; row++) {
    const [text, line] = [lines[at[row]], at[row] + 1];
    if (text.trimEnd().length !== LINE_LENGTH) {
      problems.add({
        code: 'column-count',
        line,
        expected: `${LINE_LENGTH} characters, as TMY2 has`,
        found: String(text.trimEnd().length),
        fix: 'Check the row for lost or surplus characters.',
      });
      continue;
    }
    hour[row] = hourOf(text, line, problems);
    year[row] = 1900 + Number(text.slice(1, 3));
    for (const name of FIELD_NAMES) columns[name][row] = readField(text, name, line, problems);
  }
  return {
    count,
    line: Int32Array.from(at, (i) => i + 1),
    hour,
    year,
    columns: { ...columns, albedo: null },
  };
};

const hourOf = (text: string, line: number, problems: Problems): number => {
  const [month, day, hour] = [Number(text.slice(3, 5)), Number(text.slice(5, 7)), Number(text.slice(7, 9))];
  if (isLeapDay(month, day)) return LEAP_HOUR;
  const dayIndex = dayOfYear(month, day);
  if (dayIndex >= 0 && hour >= 1 && hour <= 24 && /^\d{8}$/.test(text.slice(1, 9)))
    return dayIndex * 24 + hour - 1;
  problems.add({
    code: 'bad-date',
    line,
    column: 2,
    expected: 'year, month, day and hour 01 to 24, two digits each',
    found: JSON.stringify(text.slice(1, 9)),
    fix: 'Correct the date of the row.',
  });
  return UNKNOWN_HOUR;
};

const readField = (text: string, name: Field, line: number, problems: Problems): number => {
  const field = FIELDS[name];
  const cell = text.slice(field.first - 1, field.last);
  const value =
    parseCell(cell) ?? notANumber(cell, { line, column: field.first, field: field.name }, problems);
  return value === field.missing ? Number.NaN : value / field.per;
};

export const tmy2: WeatherReader = {
  format: 'TMY2',
  recognises: (lines) => STATION.test(lines[0]),
  read: readTmy2,
};
