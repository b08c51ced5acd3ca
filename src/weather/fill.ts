import { DEG, type Finding, HOURS, type HourlyYear, hourName, type Origin } from '../shared/index.ts';
import { Problems } from './problems.ts';
import type { RawYear } from './raw-year.ts';
import type { SunHours } from './sun-hours.ts';

/** Below this the beam cannot be had from a difference of two horizontal readings: the sun above 87 degrees of zenith. */
const LEAST_COSINE = Math.cos(87 * DEG);
/** Radiation that is missing within so many hours of the night is taken for night: a clock that is off moves the edge. */
const EDGE_HOURS = 2;
/** ... unless a component that is there is brighter than this, W/m2. */
const TWILIGHT_WM2 = 5;

type Component = 'ghi' | 'dni' | 'dhi';
type Columns = Record<Component, Float64Array>;
type Count = Record<'night' | 'edge' | 'derived' | 'negative' | 'least', number>;
const COMPONENTS: readonly Component[] = ['ghi', 'dni', 'dhi'];

/**
 * Completes the irradiance of a year by closure, GHI = DNI cos z + DHI, with cos z the mean over the sunlit part of
 * the hour (the hour's mean DNI already carries the share of the hour that is sunlit). A missing value is worked out
 * where the two others are there: GHI always; DHI not below 0; DNI where z < 87 degrees, at most the extraterrestrial
 * normal irradiance. What is missing at night is 0, as are negative readings. All of it is counted in `notes`.
 * A global-only year keeps DNI and DHI at zero with origin `missing`.
 *
 * @param sun over the hours of `raw`, its `offsetMin` included
 * @throws TrackworthError of kind `input` where daylight cannot be filled
 */
export const fillByClosure = (raw: RawYear, sun: SunHours): HourlyYear => {
  const problems = new Problems(raw.source);
  checkComponents(raw, problems);
  const columns = { ghi: raw.ghi.slice(), dni: raw.dni.slice(), dhi: raw.dhi.slice() };
  const count: Count = { night: 0, edge: 0, derived: 0, negative: 0, least: 0 };
  const given = COMPONENTS.filter((name) => raw.origin[name] !== 'missing');
  const unfilled: number[] = [];
  for (let h = 0; h < HOURS; h++) {
    if (!settleMissing(columns, given, h, sun, count)) {
      unfilled.push(h);
      continue;
    }
    for (const name of given) clampNegative(columns[name], h, count);
    if (given.length > 1) count.derived += derive(columns, h, sun);
  }
  reportUnfilled(raw, unfilled, problems);
  problems.throwIfAny();
  if (given.length === 1) for (const name of ['dni', 'dhi'] as const) columns[name].fill(0);
  const origin = (name: Component): Origin =>
    raw.origin[name] === 'missing' && given.length === 2 ? 'derived' : raw.origin[name];
  const { line: _, ...year } = raw;
  return {
    ...year,
    ...columns,
    origin: { ghi: origin('ghi'), dni: origin('dni'), dhi: origin('dhi') },
    notes: [...raw.notes, ...notesOn(count, given)],
  };
};

/** Sets to 0 what is missing at night; false where it is day and too little is there to derive the rest from. */
const settleMissing = (
  columns: Columns,
  given: readonly Component[],
  h: number,
  sun: SunHours,
  count: Count,
): boolean => {
  if (!Number.isNaN(columns.ghi[h] + columns.dni[h] + columns.dhi[h])) return true; // as nearly always
  const missing = given.filter((name) => Number.isNaN(columns[name][h]));
  if (missing.length === 0) return true;
  const dark = sun.sunlit[h] === 0;
  const likeNight = nearNight(sun, h) && given.every((name) => !(columns[name][h] > TWILIGHT_WM2));
  if (!dark && !likeNight) return given.length === 3 && missing.length === 1;
  count[dark ? 'night' : 'edge']++;
  for (const name of missing) columns[name][h] = 0;
  return true;
};

const nearNight = (sun: SunHours, h: number): boolean => {
  for (let k = -EDGE_HOURS; k <= EDGE_HOURS; k++) if (sun.sunlit[(h + k + HOURS) % HOURS] === 0) return true;
  return false;
};

const clampNegative = (column: Float64Array, h: number, count: Count): void => {
  if (!(column[h] < 0)) return;
  count.negative++;
  count.least = Math.min(count.least, column[h]);
  column[h] = 0;
};

/** Fills the one component that is NaN in hour `h`; returns 1 where it did. */
const derive = (c: Columns, h: number, sun: SunHours): number => {
  const cosine = sun.cosZenith[h];
  if (Number.isNaN(c.ghi[h])) c.ghi[h] = c.dhi[h] + c.dni[h] * cosine;
  else if (Number.isNaN(c.dhi[h])) c.dhi[h] = Math.max(0, c.ghi[h] - c.dni[h] * cosine);
  else if (Number.isNaN(c.dni[h])) {
    const limit = sun.extraterrestrialWm2[h] * sun.sunlit[h];
    const beam = cosine > LEAST_COSINE ? (c.ghi[h] - c.dhi[h]) / cosine : 0;
    c.dni[h] = Math.min(limit, Math.max(0, beam));
  } else return 0;
  return 1;
};

const checkComponents = (raw: RawYear, problems: Problems): void => {
  const { ghi, dni, dhi } = raw.origin;
  if (ghi !== 'missing' || (dni !== 'missing' && dhi !== 'missing')) return;
  problems.fail({
    code: 'no-radiation',
    expected: 'GHI, or DNI and DHI',
    found: dni !== 'missing' ? 'DNI alone' : dhi !== 'missing' ? 'DHI alone' : 'no irradiance at all',
    fix: 'Use a file with global irradiance; in a plain table name its column under weather.table.ghi.',
  });
};

const reportUnfilled = (raw: RawYear, hours: readonly number[], problems: Problems): void => {
  for (const h of hours)
    problems.add({
      code: 'missing-daylight',
      line: raw.line[h],
      expected: 'irradiance in every hour of daylight (of GHI, DNI and DHI one may be missing)',
      found: `too little of it in the hour from ${hourName(h)}`,
      fix: 'Fill the gap, or use another year.',
    });
};

const hoursInWords = (n: number): string => (n === 1 ? '1 hour' : `${n} hours`);

const notesOn = (count: Count, given: readonly Component[]): Finding[] => {
  const notes: Finding[] = [];
  const note = (code: string, severity: Finding['severity'], text: string) =>
    notes.push({ code, severity, text, fix: '' });
  if (count.night > 0)
    note(
      'missing-at-night',
      'note',
      `Irradiance is missing in ${hoursInWords(count.night)} without sun and counts as 0.`,
    );
  if (count.edge > 0)
    note(
      'missing-at-the-edge',
      'warning',
      `Irradiance is missing in ${hoursInWords(count.edge)} of daylight close to sunrise or sunset and counts as 0.`,
    );
  if (count.negative > 0)
    note(
      'negative-irradiance',
      count.least < -20 ? 'warning' : 'note',
      `${count.negative === 1 ? '1 value of irradiance is' : `${count.negative} values of irradiance are`} negative (down to ${count.least.toFixed(1)} W/m2) and ${count.negative === 1 ? 'counts' : 'count'} as 0.`,
    );
  if (given.length === 3 && count.derived > 0)
    note(
      'filled-by-closure',
      'note',
      `In ${hoursInWords(count.derived)} one component was missing and was worked out from the two others.`,
    );
  if (given.length === 2) {
    const absent = COMPONENTS.find((name) => !given.includes(name)) as Component;
    const [a, b] = given.map((name) => name.toUpperCase());
    note(
      'derived-component',
      'note',
      `The file gives ${a} and ${b}; ${absent.toUpperCase()} was worked out from them.`,
    );
  }
  if (given.length === 1)
    note('global-only', 'warning', 'The file gives global irradiance only: beam and diffuse are estimates.');
  return notes;
};
