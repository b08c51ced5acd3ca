import type { Place } from '../shared/index.ts';
import type { Problems } from './problems.ts';
import type { PartialPlace } from './raw-year.ts';

/** Range of each part of a place, its unit, and its key under `site` in a study. */
const PARTS = {
  latitudeDeg: { key: 'latitude', low: -90, high: 90, unit: 'degrees, north positive' },
  longitudeDeg: { key: 'longitude', low: -180, high: 180, unit: 'degrees, east positive' },
  // The shore of the Dead Sea and the top of Everest, rounded outward.
  elevationM: { key: 'elevation', low: -500, high: 9000, unit: 'm above sea level' },
  // Clocks in use run from UTC-12 to UTC+14.
  utcOffsetH: { key: 'utc_offset', low: -12, high: 14, unit: 'hours from UTC' },
} as const satisfies Record<keyof Place, unknown>;

/** The place of a year: what the study says, else what the file says. Reports what is missing or impossible. */
export const settlePlace = (
  file: PartialPlace,
  fileLine: number | undefined,
  study: Partial<PartialPlace>,
  problems: Problems,
): Place => {
  const part = (name: keyof Place): number => {
    const { key, low, high, unit } = PARTS[name];
    const value = study[name] ?? file[name];
    const fix = `Write site: { ${key}: ... } in the study.`;
    const expected = `a number from ${low} to ${high} (${unit})`;
    if (value === null) {
      const found = 'nothing in the file or the study';
      problems.add({ code: 'missing-place', field: `site.${key}`, expected, found, fix });
    } else if (!(value >= low && value <= high)) {
      const line = study[name] == null ? fileLine : undefined;
      const found = Number.isFinite(value) ? String(value) : 'text that is no number';
      problems.add({ code: 'impossible-place', line, field: `site.${key}`, expected, found, fix });
    }
    return value ?? Number.NaN;
  };
  return {
    latitudeDeg: part('latitudeDeg'),
    longitudeDeg: part('longitudeDeg'),
    elevationM: part('elevationM'),
    utcOffsetH: part('utcOffsetH'),
  };
};
