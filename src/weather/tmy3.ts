/**
 * TMY3 (Wilcox & Marion 2008, Users Manual for TMY3 Data Sets, NREL/TP-581-43156, tables 1-1 to 1-3): a station
 * line, a header line, and 8,760 rows separated by commas (tabs in copies). Hours 1:00..24:00 by their end, local
 * standard time; irradiance in Wh/m2 over the hour. Copies that went through a spreadsheet have unpadded dates,
 * no quotation marks, and 0:00 for 24:00.
 */
import type { Finding } from '../shared/index.ts';
import { type Cells, cutCells } from './cells.ts';
import { readNumbers } from './columns.ts';
import { dayOfYear, isLeapDay } from './hour-of-year.ts';
import { offsetOfLabel } from './labels.ts';
import { parseCell } from './numbers.ts';
import type { Problems } from './problems.ts';
import { LEAP_HOUR, type ReaderInput, type Reading, UNKNOWN_HOUR, type WeatherReader } from './raw-year.ts';

/** Names in the header, without their unit in brackets, in lower case. */
const NAMES = {
  ghi: 'ghi',
  dni: 'dni',
  dhi: 'dhi',
  temperature: 'dry-bulb',
  wind: 'wspd',
  albedo: 'alb',
} as const;
type Name = keyof typeof NAMES;
const OPTIONAL: readonly Name[] = ['temperature', 'wind', 'albedo'];
/** The manual writes -9900 for missing; nines turn up in copies. */
const isMissing = (value: number): boolean => value <= -9900 || value >= 9999;

const unquote = (cell: string): string =>
  cell
    .trim()
    .replace(/^"(.*)"$/, '$1')
    .trim();
const delimiterOf = (header: string): string => (header.includes('\t') ? '\t' : ',');
const headerOf = (line: string): string[] =>
  line.split(delimiterOf(line)).map((cell) =>
    unquote(cell)
      .replace(/\s*\(.*\)$/, '')
      .toLowerCase(),
  );

const readTmy3 = async ({ lines, label: wantedLabel, problems }: ReaderInput): Promise<Reading> => {
  const header = headerOf(lines[1]);
  const station = await stationCells(lines[0], problems);
  const names = (Object.keys(NAMES) as Name[]).filter((name) => {
    const there = header.includes(NAMES[name]);
    if (!there && !OPTIONAL.includes(name)) missingColumn(NAMES[name], header, problems);
    return there;
  });
  problems.throwIfAny();
  const wanted = [0, 1, ...names.map((name) => header.indexOf(NAMES[name]))];
  const request = { lines, from: 2, delimiter: delimiterOf(lines[1]), wanted, width: header.length };
  const cells = await cutCells(request, problems);
  const column = (name: Name) => {
    const slot = names.indexOf(name);
    return slot < 0
      ? null
      : readNumbers(cells, slot + 2, { name: NAMES[name], missing: isMissing }, problems);
  };
  const label = wantedLabel ?? 'end';
  const { notes, ...dates } = readDates(cells, problems);
  const number = (cell: string | undefined): number => parseCell(cell ?? '') ?? Number.NaN;
  return {
    station: [station[1], station[2]].filter((s) => s).join(', '),
    place: {
      utcOffsetH: number(station[3]),
      latitudeDeg: number(station[4]),
      longitudeDeg: number(station[5]),
      elevationM: number(station[6]),
    },
    placeLine: 1,
    rows: {
      count: cells.count,
      line: cells.line,
      ...dates,
      columns: {
        ghi: column('ghi'),
        dni: column('dni'),
        dhi: column('dhi'),
        temperature: column('temperature'),
        wind: column('wind'),
        albedo: column('albedo'),
      },
    },
    label,
    offsetMin: offsetOfLabel(label),
    begins: 'first hour',
    notes,
  };
};

/** The station line alone may hold a quoted name with commas in it. */
const stationCells = async (line: string, problems: Problems): Promise<string[]> => {
  const delimiter = line.includes('\t') ? '\t' : ',';
  if (!line.includes('"')) return line.split(delimiter).map((cell) => cell.trim());
  const { parse } = await import('csv-parse/sync');
  try {
    const [cells] = parse(line, { delimiter, relax_column_count: true }) as string[][];
    return cells.map((cell) => cell.trim());
  } catch (cause) {
    const [expected, found] = ['quotation marks in pairs, around whole cells', 'a stray one'];
    return problems.fail({ code: 'quoting', line: 1, expected, found, fix: 'Remove it.' }, { cause });
  }
};

const missingColumn = (name: string, header: readonly string[], problems: Problems): void =>
  problems.add({
    code: 'missing-column',
    line: 2,
    field: name,
    expected: `a column ${name.toUpperCase()}, as TMY3 has`,
    found: `${header.length} others`,
    fix: 'Use the whole TMY3 file, or describe a cut-down one as a plain table under weather.table.',
  });

const DATE = /^\s*(\d{1,2})\/(\d{1,2})\/(\d{4})\s*$/;
const TIME = /^\s*(\d{1,2}):00(?::00)?\s*$/;

const readDates = (cells: Cells, problems: Problems) => {
  const hour = new Int32Array(cells.count).fill(UNKNOWN_HOUR);
  const year = new Int16Array(cells.count);
  let midnights = 0;
  for (let row = 0; row < cells.count; row++) {
    if (cells.faulty[row]) continue;
    const [date, time] = [DATE.exec(cells.cell(0, row)), TIME.exec(cells.cell(1, row))];
    const [month, day, printed] = [Number(date?.[1]), Number(date?.[2]), Number(time?.[1] ?? 99)];
    const dayIndex = dayOfYear(month, day);
    if (date && isLeapDay(month, day)) hour[row] = LEAP_HOUR;
    else if (dayIndex >= 0 && printed <= 24) {
      hour[row] = dayIndex * 24 + printed - 1;
      if (printed === 0) {
        hour[row] = midnightHour(dayIndex, row > 0 ? hour[row - 1] : UNKNOWN_HOUR);
        midnights++;
      }
      year[row] = Number(date?.[3]);
    } else
      problems.add({
        code: 'bad-date',
        line: cells.line[row],
        expected: 'a date MM/DD/YYYY and a time from 1:00 to 24:00',
        found: `${cells.cell(0, row)} ${cells.cell(1, row)}`,
        fix: 'Correct the date of the row.',
      });
  }
  return { hour, year, notes: midnightNote(midnights) };
};

/** A row at 0:00 ends its day where 23:00 of the same date came before it, otherwise the day before. */
const midnightHour = (dayIndex: number, hourBefore: number): number =>
  hourBefore === dayIndex * 24 + 22 ? dayIndex * 24 + 23 : (dayIndex * 24 + 8759) % 8760;

const midnightNote = (midnights: number): Finding[] =>
  midnights === 0
    ? []
    : [
        {
          code: 'midnight-label',
          severity: 'note',
          text: `${midnights} rows are stamped 0:00 in place of 24:00; each was taken for the hour that ends at midnight.`,
          fix: '',
        },
      ];

export const tmy3: WeatherReader = {
  format: 'TMY3',
  recognises: (lines) => {
    const [date, time] = lines.length > 1 ? headerOf(lines[1]) : [];
    return date === 'date' && time === 'time' && /^"?\d{5,6}"?[,\t]/.test(lines[0]);
  },
  read: readTmy3,
};
