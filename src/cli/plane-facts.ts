import type { Study } from '../inputs/index.ts';
import { compassWords, MONTH_NAMES } from '../shared/index.ts';
import { type PlaneFacts, planeFacts, type SiteSurvey } from '../study.ts';
import { slopeWords, surveyCautions } from '../survey/index.ts';
import type { RawYear } from '../weather/index.ts';

/** The readings that a rise and a level run went into. */
const RISE_AND_RUN = /^rise|\d ?(?::|\/|in) ?\d/i;

const cautionsOf = (study: Study, mountId: string): string[] => {
  const mount = study.mounts.find(({ id }) => id === mountId);
  const { bearing = null, slope = null } = mount?.readings ?? {};
  return surveyCautions({
    compass: bearing?.north === 'magnetic',
    roof: mount?.geometry.kind === 'roof-plane',
    riseAndRun: slope !== null && RISE_AND_RUN.test(slope.written),
    skyline: study.site.skyline !== null,
  });
};

/** The least of twelve months; the first of equals. */
const worstMonth = ({ peak_sun_hours_per_day: { months } }: PlaneFacts) => {
  const least = Math.min(...months);
  return { month: MONTH_NAMES[months.indexOf(least)], peak_sun_hours_per_day: least };
};

/** What `trackworth plane` tells, key for key what its `--json` prints: fields may be added, never renamed. */
export const planeReport = (study: Study, raw: RawYear, mountId: string, survey: SiteSurvey) => {
  const facts = planeFacts(study, raw, mountId, survey);
  const { profiles = [] } = survey.skyline ?? {};
  return {
    schema: 'trackworth-plane-1',
    mount: mountId,
    weather: raw.source,
    site: { latitude_deg: raw.place.latitudeDeg, longitude_deg: raw.place.longitudeDeg },
    slope: slopeWords(facts.tilt_deg),
    faces: compassWords(facts.azimuth_deg),
    ...facts,
    worst_month: worstMonth(facts),
    /** Points of the array with a skyline of their own; 0 where the horizon is open. */
    skyline_points: profiles.length,
    cautions: cautionsOf(study, mountId),
  };
};

export type PlaneReport = ReturnType<typeof planeReport>;
