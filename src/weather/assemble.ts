import { DAYS, type Finding, HOURS, type WeatherFormat } from '../shared/index.ts';
import { fillGaps } from './gaps.ts';
import { checkOrder } from './order.ts';
import { settlePlace } from './place.ts';
import type { Problems } from './problems.ts';
import type { ColumnName, PartialPlace, RawYear, Reading } from './raw-year.ts';

/** Values outside are no weather on earth (records: -89 to 57 degrees C, 113 m/s), so they count as missing. */
const POSSIBLE = {
  temperature: { low: -95, high: 65, what: 'temperature' },
  wind: { low: 0, high: 115, what: 'wind speed' },
  // No ground is quite black: files write 0 where the reflectance is not known.
  albedo: { low: 0.005, high: 1, what: 'ground reflectance' },
} as const;

/** From what a reader took out of a file to a year in order: checks hours and place, fills temperature and wind. */
export const assemble = (
  reading: Reading,
  format: WeatherFormat,
  source: string,
  study: Partial<PartialPlace>,
  problems: Problems,
  earlierNotes: readonly Finding[],
): RawYear => {
  checkOrder(reading.rows, reading.begins, problems);
  const place = settlePlace(reading.place, reading.placeLine, study, problems);
  problems.throwIfAny();
  const notes = [...earlierNotes, ...reading.notes];
  const irradiance = (name: ColumnName) => byHour(reading, name) ?? new Float64Array(HOURS).fill(Number.NaN);
  const [ghi, dni, dhi] = [irradiance('ghi'), irradiance('dni'), irradiance('dhi')];
  const origin = (column: Float64Array) => (column.every(Number.isNaN) ? 'missing' : 'given');
  const weather = (name: keyof typeof POSSIBLE): Float64Array | null =>
    fillGaps(onlyPossible(byHour(reading, name), name, notes), POSSIBLE[name].what, name, notes);
  return {
    source,
    format,
    station: reading.station,
    place,
    label: reading.label,
    offsetMin: reading.offsetMin,
    calendarYear: yearOfEachDay(reading),
    line: lineOfEachHour(reading),
    ghi,
    dni,
    dhi,
    origin: { ghi: origin(ghi), dni: origin(dni), dhi: origin(dhi) },
    temperatureC: weather('temperature'),
    windMs: weather('wind'),
    albedo: groundReflectance(reading, notes),
    notes,
  };
};

/** Files that do not know the reflectance write 0 all year; such a column is dropped without a word. */
const groundReflectance = (reading: Reading, notes: Finding[]): Float64Array | null => {
  const unheard: Finding[] = [];
  const column = fillGaps(
    onlyPossible(byHour(reading, 'albedo'), 'albedo', unheard),
    'ground reflectance',
    'albedo',
    unheard,
  );
  if (column) notes.push(...unheard);
  return column;
};

const byHour = ({ rows }: Reading, name: ColumnName): Float64Array | null => {
  const column = rows.columns[name];
  if (!column) return null;
  const out = new Float64Array(HOURS);
  for (let row = 0; row < HOURS; row++) out[rows.hour[row]] = column[row];
  return out;
};

const lineOfEachHour = ({ rows }: Reading): Int32Array => {
  const out = new Int32Array(HOURS);
  for (let row = 0; row < HOURS; row++) out[rows.hour[row]] = rows.line[row];
  return out;
};

/** The year printed beside noon, which no label can carry over midnight. */
const yearOfEachDay = ({ rows }: Reading): Int16Array => {
  const out = new Int16Array(DAYS);
  for (let row = 0; row < HOURS; row++)
    if (rows.hour[row] % 24 === 12) out[Math.floor(rows.hour[row] / 24)] = rows.year[row];
  return out;
};

const onlyPossible = (
  column: Float64Array | null,
  name: keyof typeof POSSIBLE,
  notes: Finding[],
): Float64Array | null => {
  if (!column) return null;
  const { low, high, what } = POSSIBLE[name];
  let impossible = 0;
  const out = column.map((v) => {
    if (Number.isNaN(v) || (v >= low && v <= high)) return v;
    impossible++;
    return Number.NaN;
  });
  if (impossible > 0)
    notes.push({
      code: `impossible-${name}`,
      severity: name === 'albedo' ? 'note' : 'warning',
      text: `The ${what} lies outside ${low} to ${high} in ${impossible} hours, which count as missing.`,
      fix: name === 'albedo' ? '' : 'Check the unit and the missing codes of the column.',
    });
  return out;
};
