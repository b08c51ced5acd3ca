import type { Misfit } from './clock-statistics.ts';

/** Trial shifts lie so far apart; between them the misfits are bent by the laws that they follow. */
const STEP_MIN = 20;
/** Trials reach so many steps to either side of where the search begins: 140 minutes. */
const STEPS = 7;
/** Light above the clear-sky limit beyond this share of the year's light is no longer chance; trackworth's choice. */
export const EXCESS_SHARE = 0.003;
/** With the clock right the edges leave 17 to 41 minutes of play (16 public years, test/weather/clock.test.ts); more means hills, haze or fog. */
const USUAL_PLAY_MIN = 50;
const HALF_PLAY_MIN = 12;
/** Closure on fewer hours with beam says too little. */
const LEAST_BEAM_HOURS = 100;

/** What one sort of evidence says. */
export interface Estimate {
  /** Minutes to add to the file's times. */
  readonly shiftMin: number;
  /** The evidence is sharp enough to act on: to withhold the recommendation, or to say that the clock fits. */
  readonly sure: boolean;
}

/** A trial: the misfit with `shiftMin` added to the file's times. */
export type Trial = (shiftMin: number) => Misfit;

/**
 * The shift that closes GHI = DNI cos z + DHI best. Its mean square is a parabola in the shift, since cos z is
 * nearly linear in the time; walks downhill from `from` and takes the vertex. Null where there is too little beam, or no
 * lowest point in reach. Sure where an hour more or less would at least double the rms.
 */
export const closureEstimate = (trial: Trial, from: number): Estimate | null => {
  const square = (k: number): number => trial(from + k * STEP_MIN).closure;
  if (!(trial(from).beamHours >= LEAST_BEAM_HOURS)) return null;
  let k = 0;
  const way = square(1) < square(-1) ? 1 : -1;
  while (Math.abs(k) < STEPS && square(k + way) < square(k)) k += way;
  if (Math.abs(k) === STEPS) return null;
  const [before, middle, after] = [square(k - 1), square(k), square(k + 1)];
  const bend = (before - 2 * middle + after) / 2;
  const vertex = (before - after) / (4 * bend);
  const least = Math.max(0, middle - bend * vertex ** 2);
  const anHourOff = least + bend * (60 / STEP_MIN) ** 2;
  const shiftMin = from + (k + vertex) * STEP_MIN;
  return { shiftMin, sure: anHourOff >= 4 * least };
};

/** How far the edges of the light let the clock be moved. */
export interface EdgePlay {
  /** Below this shift, light comes before the sun in the morning. */
  readonly least: number;
  /** Above this shift, light stays after the sun in the evening. */
  readonly most: number;
}

/**
 * The shifts under which neither the morning's nor the evening's light exceeds what a clear sky can give. Darkness while
 * the sun is up proves nothing, since hills, fog and broken loggers make it too, so only light counts. The excess
 * grows with the square of the shift, so its root is interpolated linearly. Null where an edge shows nothing: polar years.
 * `least` is above `most` where the light overlaps both ends of the day: no clock mends that.
 */
export const edgePlay = (trial: Trial, from: number): EdgePlay | null => {
  const morning = crossing((s) => trial(s).morning, from, 1);
  const evening = crossing((s) => trial(s).evening, from, -1);
  return morning === null || evening === null ? null : { least: morning, most: evening };
};

/** The shift at which an excess falls to its limit; it falls with the shift (`way` 1) or against it (-1). */
const crossing = (excess: (shiftMin: number) => number, from: number, way: 1 | -1): number | null => {
  const root = (k: number): number => Math.sqrt(excess(from + way * k * STEP_MIN));
  const limit = Math.sqrt(EXCESS_SHARE);
  const heading = root(0) < limit ? -1 : 1;
  for (let k = 0; Math.abs(k) < STEPS; k += heading) {
    const [high, low] = heading === 1 ? [k, k + 1] : [k - 1, k];
    if (root(high) >= limit && root(low) < limit)
      return from + way * STEP_MIN * (high + (root(high) - limit) / (root(high) - root(low)));
  }
  return null;
};

/**
 * The shift from the edges alone. Hills, fog and haze take light away at an edge and widen the play, on their side
 * only: within a wide play nothing is sure, and outside it the nearer edge counts, being the one in open view.
 */
export const edgeEstimate = (play: EdgePlay | null): Estimate | null => {
  if (!play || play.least > play.most) return null;
  const { least, most } = play;
  if (most - least <= USUAL_PLAY_MIN) return { shiftMin: (least + most) / 2, sure: true };
  if (least > 0) return { shiftMin: least + HALF_PLAY_MIN, sure: true };
  if (most < 0) return { shiftMin: most - HALF_PLAY_MIN, sure: true };
  return null;
};
