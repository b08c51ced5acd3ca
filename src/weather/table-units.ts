import type { Problems } from './problems.ts';
import type { ColumnName } from './raw-year.ts';
import type { TableColumn } from './spec.ts';

type Convert = (value: number) => number;
const times =
  (factor: number): Convert =>
  (value) =>
    value * factor;

/** Energy over an hour counts as its mean power: 1 Wh/m2 in an hour is 1 W/m2; 1 kJ is 1/3.6 Wh. */
const IRRADIANCE: Record<string, Convert> = {
  'W/m2': times(1),
  'kW/m2': times(1000),
  'Wh/m2': times(1),
  'kWh/m2': times(1000),
  'kJ/m2': times(1 / 3.6),
  'MJ/m2': times(1000 / 3.6),
};
const TEMPERATURE: Record<string, Convert> = {
  degC: times(1),
  degF: (value) => (value - 32) / 1.8,
  K: (value) => value - 273.15,
};
/** The mile is 1609.344 m and the nautical mile 1852 m, both exact. */
const SPEED: Record<string, Convert> = {
  'm/s': times(1),
  'km/h': times(1 / 3.6),
  mph: times(1609.344 / 3600),
  kn: times(1852 / 3600),
};
const UNITS: Record<Exclude<ColumnName, 'albedo'>, Record<string, Convert>> = {
  ghi: IRRADIANCE,
  dni: IRRADIANCE,
  dhi: IRRADIANCE,
  temperature: TEMPERATURE,
  wind: SPEED,
};

/** Other ways to write the same units, in the reduced form of `reduce`. */
const ALIASES: Record<string, string> = {
  c: 'degC',
  celsius: 'degC',
  f: 'degF',
  fahrenheit: 'degF',
  kelvin: 'K',
  ms: 'm/s',
  kmh: 'km/h',
  kph: 'km/h',
  mih: 'mph',
  kt: 'kn',
  kts: 'kn',
  knot: 'kn',
  knots: 'kn',
};

/** `W/m²`, `W m-2`, `MJ/(m2 h)`, `kJ/m2/h`, `°F`: without blanks, signs and the hour, which all mean the same here. */
const reduce = (unit: string): string =>
  unit
    .toLowerCase()
    .replaceAll('²', '2')
    .replace(/[\s()^·*.°/_-]/g, '')
    .replace(/^deg(?:rees?)?/, '')
    .replace(/(m2)(?:perh|h)(?:our|r)?$/, '$1');

/** How to convert a table's column to W/m2, degrees C or m/s. Reports a unit that is not known for this quantity. */
export const unitConverter = (
  quantity: Exclude<ColumnName, 'albedo'>,
  column: TableColumn,
  problems: Problems,
): Convert => {
  const known = UNITS[quantity];
  if (column.unit === null) return times(1);
  const wanted = reduce(column.unit);
  const unit = Object.keys(known).find((name) => reduce(name) === wanted || name === ALIASES[wanted]);
  if (unit !== undefined) return known[unit];
  problems.add({
    code: 'unknown-unit',
    field: `weather.table.${quantity}`,
    expected: `one of the units ${Object.keys(known).join(', ')}`,
    found: JSON.stringify(column.unit),
    fix: 'Write one of these, or convert the column.',
  });
  return times(1);
};
