import { acosDeg, atan2Deg, wrap360 } from '../shared/index.ts';
import type { SunHours } from '../sun/index.ts';
import { type MastReach, nearestPlane } from './mast.ts';
import { turnAt } from './single-axis.ts';
import type { SingleAxis } from './spec.ts';

/** Turns that stand for all turns of a year, and directions (azimuth groups, each in height groups) for all of a mast. */
const TURNS = 7;
const AZIMUTHS = 6;
const HEIGHTS = 3;

/** Minutes of daylight, in any unit, that each sample of the sun stands for. */
const daylightOfSamples = (sun: SunHours): Float64Array => {
  const share = new Float64Array(sun.up.length);
  for (let h = 0; h < sun.sunlit.length; h++) {
    const [from, to] = [sun.first[h], sun.first[h + 1]];
    for (let s = from; s < to; s++) share[s] = sun.sunlit[h] / (to - from);
  }
  return share;
};

/** Cuts samples, in the order of a key, into groups of equal daylight. */
const equalGroups = (
  samples: readonly number[],
  key: (sample: number) => number,
  daylight: Float64Array,
  count: number,
): number[][] => {
  const keys = new Map(samples.map((s) => [s, key(s)]));
  const order = [...samples].sort((a, b) => (keys.get(a) as number) - (keys.get(b) as number));
  const all = order.reduce((sum, s) => sum + daylight[s], 0);
  const groups: number[][] = Array.from({ length: count }, () => []);
  let before = 0;
  for (const s of order) {
    const middle = before + daylight[s] / 2;
    groups[Math.min(count - 1, Math.floor((middle / all) * count))].push(s);
    before += daylight[s];
  }
  return groups.filter((group) => group.length > 0);
};

/** Turns of every sample, 0 in hours (1 in `flatHours`) that the tracker spends lying flat. */
const everyTurn = (sun: SunHours, mount: SingleAxis, flatHours: Uint8Array | null): Float64Array => {
  const turns = Float64Array.from(sun.up, (_, s) => turnAt(sun, mount, s));
  for (let h = 0; flatHours && h < flatHours.length; h++)
    if (flatHours[h]) turns.fill(0, sun.first[h], sun.first[h + 1]);
  return turns;
};

const everySample = (sun: SunHours): number[] => Array.from({ length: sun.up.length }, (_, s) => s);

/**
 * Where a single-axis tracker stands that failed at a random moment of daylight and stays: turns in degrees, each as
 * likely as the others. They are the means of seven groups of equal daylight, in the order of the turn; seven keep the
 * light that it still takes within 0.3 % of that of all turns (test/mounts/stopped-at-random.test.ts).
 * @param flatHours 1 for every hour in which a working one lies flat; null: none
 */
export const turnsStoppedAt = (
  sun: SunHours,
  mount: SingleAxis,
  flatHours: Uint8Array | null = null,
): number[] => {
  const daylight = daylightOfSamples(sun);
  const turns = everyTurn(sun, mount, flatHours);
  return equalGroups(everySample(sun), (s) => turns[s], daylight, TURNS).map((group) => {
    const all = group.reduce((sum, s) => sum + daylight[s], 0);
    return group.reduce((sum, s) => sum + turns[s] * daylight[s], 0) / all;
  });
};

/**
 * The same for a tracker that faces the sun: 18 directions, each the mean of a group of equal daylight. They keep the
 * light within about 1 % of that of all suns of the year. A mast with limits stops as near to each as it reaches.
 */
export const planesStoppedAt = (
  sun: SunHours,
  reach: MastReach | null = null,
): { tiltDeg: number; azimuthDeg: number }[] => {
  const daylight = daylightOfSamples(sun);
  // Counted from north where the sun stands south at noon, else from south: the cut lies where the sun never is long.
  const noonNorth = sun.north.reduce((sum, north, s) => sum + north * daylight[s] * sun.up[s], 0) > 0;
  const cut = noonNorth ? -1 : 1;
  const azimuth = (s: number) => wrap360(atan2Deg(cut * sun.east[s], cut * sun.north[s]));
  return equalGroups(everySample(sun), azimuth, daylight, AZIMUTHS)
    .flatMap((group) => equalGroups(group, (s) => sun.up[s], daylight, HEIGHTS))
    .map((group) => {
      const mean = (column: Float64Array) => group.reduce((sum, s) => sum + column[s] * daylight[s], 0);
      const [east, north, up] = [mean(sun.east), mean(sun.north), mean(sun.up)];
      const length = Math.sqrt(east * east + north * north + up * up);
      const [tiltDeg, azimuthDeg] = [acosDeg(up / length), wrap360(atan2Deg(east, north))];
      return reach ? nearestPlane(reach, azimuthDeg, 90 - tiltDeg) : { tiltDeg, azimuthDeg };
    });
};
