import { type HourlyYear, MONTH_FIRST_DAY } from '../shared/index.ts';
import { closureEstimate, type Estimate, edgeEstimate, edgePlay } from './clock-estimates.ts';
import { lightAheadOfSunMin, type Misfit, misfit, type Season } from './clock-statistics.ts';
import type { SunHours } from './sun-hours.ts';

/** A shift of so many minutes or more withholds the recommendation. */
export const BLOCKING_SHIFT_MIN = 20;
/** Centres of light and sun this far apart are more than weather: search there, not about zero. */
export const FAR_MIN = 100;
/** A year that fits so well has one clock. */
const FITTING_SHIFT_MIN = 10;
/** Summer and winter this far apart are on different clocks. */
const SEASONS_APART_MIN = { low: 40, high: 80 };

/** What the year's light says about its clock. */
export interface Clock {
  /** Minutes to add to the file's times so that the year fits the sun best; null where no evidence is sharp. */
  readonly timeShiftMin: number | null;
  /** Evidence of GHI = DNI cos z + DHI; null where a component is derived or missing, or beam is scarce. */
  readonly closure: Estimate | null;
  /** Evidence of light before sunrise and after sunset. */
  readonly edges: Estimate | null;
  /** May to August less November to February where that looks like daylight saving time, else null. */
  readonly seasonsApartMin: number | null;
  /** How much earlier the year's light is centred than the sun's path. Weather does that too. */
  readonly lightAheadMin: number;
  /** The misfit as the file stands, and with `timeShiftMin` (whole minutes) added. */
  readonly asFiled: Misfit;
  readonly shifted: Misfit | null;
}

const wholeYear: Season = () => true;
const midyear: Season = (h) => h >= MONTH_FIRST_DAY[4] * 24 && h < MONTH_FIRST_DAY[8] * 24;
const turnOfYear: Season = (h) => h < MONTH_FIRST_DAY[2] * 24 || h >= MONTH_FIRST_DAY[10] * 24;

/**
 * Estimates by how many minutes the file's clock is off. Closure (three given components only) is the sharper evidence
 * and gives the figure where it is sure; the edges of the light stand alone for the other years, and overrule a
 * closure that fits a wrong clock, as it does where the components were worked out from GHI by that clock.
 *
 * @param sunAt the sun over the same hours, all beginning so many minutes later than their index says
 */
export const estimateClock = (year: HourlyYear, sunAt: (offsetMin: number) => SunHours): Clock => {
  const suns = new Map<number, SunHours>();
  const sun = (shiftMin: number): SunHours => {
    const known = suns.get(shiftMin) ?? sunAt(year.offsetMin + shiftMin);
    suns.set(shiftMin, known);
    return known;
  };
  const trials = (season: Season) => {
    const done = new Map<number, Misfit>();
    return (shiftMin: number): Misfit => {
      const known = done.get(shiftMin) ?? misfit(year, sun(shiftMin), season);
      done.set(shiftMin, known);
      return known;
    };
  };
  const lightAheadMin = lightAheadOfSunMin(year, sun(0));
  const from = Math.abs(lightAheadMin) > FAR_MIN ? Math.round(lightAheadMin / 60) * 60 : 0;
  const measured = Object.values(year.origin).every((origin) => origin === 'given');
  const estimates = (season: Season) => {
    const trial = trials(season);
    const closure = measured ? closureEstimate(trial, from) : null;
    return { trial, closure, edges: edgeEstimate(edgePlay(trial, from)) };
  };
  const { trial, closure, edges } = estimates(wholeYear);
  const chosen = choose(closure, edges);
  const timeShiftMin = chosen?.sure ? Math.round(chosen.shiftMin) + 0 : null;
  // A clock that changes with the seasons does not fit the whole year: most years need no second look.
  const fits = timeShiftMin !== null && Math.abs(timeShiftMin) < FITTING_SHIFT_MIN;
  return {
    timeShiftMin,
    closure,
    edges,
    seasonsApartMin: fits ? null : seasonsApart([estimates(midyear), estimates(turnOfYear)]),
    lightAheadMin,
    asFiled: trial(0),
    shifted: timeShiftMin === null ? null : trial(timeShiftMin),
  };
};

const blocks = (e: Estimate | null): boolean =>
  e?.sure === true && Math.abs(e.shiftMin) >= BLOCKING_SHIFT_MIN;

const choose = (closure: Estimate | null, edges: Estimate | null): Estimate | null => {
  if (!closure?.sure) return edges ?? closure;
  return blocks(edges) && !blocks(closure) ? edges : closure;
};

const seasonsApart = ([summer, winter]: readonly { closure: Estimate | null; edges: Estimate | null }[]):
  | number
  | null => {
  const [a, b] = [choose(summer.closure, summer.edges), choose(winter.closure, winter.edges)];
  if (!a?.sure || !b?.sure) return null;
  const apart = a.shiftMin - b.shiftMin;
  const { low, high } = SEASONS_APART_MIN;
  return Math.abs(apart) >= low && Math.abs(apart) <= high ? Math.round(apart) : null;
};
