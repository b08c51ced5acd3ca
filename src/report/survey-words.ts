import type { Comparison, MountResult } from '../shared/index.ts';
import { SURVEY_CAUTIONS, surveyCautions } from '../survey/index.ts';
import { shorten } from './columns.ts';
import { formatNumber, formatPercent, UNKNOWN } from './numbers.ts';
import { nameOf } from './words.ts';

/** Mounts whose bearing or slope was read on site. */
export const surveyed = (c: Comparison): MountResult[] => c.mounts.filter((m) => m.readings.length > 0);

/** `14.0° ± 2.0°`; the angle alone where no reading error is given. */
export const angleWords = (deg: number | null, errorDeg: number | null): string => {
  if (deg === null) return UNKNOWN;
  return `${formatNumber(deg, 1)}°${errorDeg === null ? '' : ` ± ${formatNumber(errorDeg, 1)}°`}`;
};

/** True where the array is seen from several points, of which one is worst. */
export const hasSeveralPoints = (c: Comparison): boolean => (c.skyline?.profiles.length ?? 0) > 1;

/** What to mind where angles were read on site. That declination is applied already stands beside the readings, once. */
export const cautionsOfSurvey = (c: Comparison): string[] => {
  const read = surveyed(c);
  const compass = c.declinations.length > 0 || read.some((m) => m.measured_with.includes('compass'));
  if (read.length === 0 && !compass && c.skyline === null) return [];
  return surveyCautions({
    compass,
    roof: read.some((m) => m.kind === 'roof-plane'),
    riseAndRun: read.some((m) => m.measured_with.includes('rise and run')),
    skyline: c.skyline !== null,
  }).filter((text) => text !== SURVEY_CAUTIONS.declinationOnce);
};

const NAME_COLUMNS = 20;

/** `skyline takes, of a year's light: Tracker 6.2 %, Ground rack 2.1 %`; null with an open horizon. */
export const shadingLine = (c: Comparison): string | null => {
  if (c.skyline === null) return null;
  const shares = c.mounts.map(
    (m) => `${shorten(nameOf(c, m), NAME_COLUMNS)} ${formatPercent(m.shading_fraction)}`,
  );
  return `skyline takes, of a year's light: ${shares.join(', ')}`;
};
