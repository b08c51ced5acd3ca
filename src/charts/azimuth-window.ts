import { wrap180 } from '../shared/index.ts';

/** A direction: true azimuth (may run past 0..360 along a line) and elevation above level, degrees. */
export interface Direction {
  readonly azimuthDeg: number;
  readonly elevationDeg: number;
}

/**
 * Where a panorama begins, degrees: north on the left in the northern hemisphere, so that south and the sun stand in
 * the middle; south on the left in the southern.
 */
export const windowStart = (latitudeDeg: number): number => (latitudeDeg < 0 ? -180 : 0);

/** A skyline, azimuths rising from 0 to 360. */
export const outlineLine = (azimuthsDeg: readonly number[], elevationsDeg: readonly number[]): Direction[] =>
  azimuthsDeg.map((azimuthDeg, i) => ({ azimuthDeg, elevationDeg: elevationsDeg[i] }));

/** From one sample to the next, minutes apart, a low sun cannot turn further than this. */
const LOW_SUN_STEP_DEG = 20;
const LOW_SUN_DEG = 30;

/**
 * The sun's path as lines whose azimuth runs on past north. Parted where a night lies between two samples (a clock far
 * from the sun's shows the end of one day before the start of the next), closed where the sun never sets.
 */
export const sunLines = (azimuthsDeg: readonly number[], elevationsDeg: readonly number[]): Direction[][] => {
  if (azimuthsDeg.length === 0) return [];
  const joined = (a: number, b: number): boolean =>
    Math.abs(wrap180(azimuthsDeg[b] - azimuthsDeg[a])) < LOW_SUN_STEP_DEG ||
    Math.max(elevationsDeg[a], elevationsDeg[b]) > LOW_SUN_DEG;
  const order = azimuthsDeg.map((_, i) => i);
  if (order.length > 2 && joined(order.length - 1, 0)) order.push(0);
  const lines: Direction[][] = [];
  for (const [step, i] of order.entries()) {
    const elevationDeg = elevationsDeg[i];
    const line = lines.at(-1);
    if (!line || !joined(order[step - 1], i)) {
      lines.push([{ azimuthDeg: azimuthsDeg[i], elevationDeg }]);
      continue;
    }
    const last = line[line.length - 1].azimuthDeg;
    line.push({ azimuthDeg: last + wrap180(azimuthsDeg[i] - last), elevationDeg });
  }
  return lines;
};

/** Cuts a line where it leaves the window of 360 degrees that begins at `startDeg`, and brings every piece into it. */
export const intoWindow = (line: readonly Direction[], startDeg: number): Direction[][] => {
  const pieces: Direction[][] = [];
  let turn: number | null = null;
  for (const [i, to] of line.entries()) {
    if (i === 0) continue;
    const stops = [line[i - 1], ...cuts(line[i - 1], to, startDeg), to];
    for (let s = 1; s < stops.length; s++) {
      const [a, b] = [stops[s - 1], stops[s]];
      const turns = ((a.azimuthDeg + b.azimuthDeg) / 2 - startDeg) / 360;
      // An upright edge on the border itself stays with the piece before it.
      const here: number = Number.isInteger(turns) && turn !== null ? turn : Math.floor(turns);
      const shifted = (p: Direction) => ({ ...p, azimuthDeg: p.azimuthDeg - 360 * here });
      if (here !== turn) pieces.push([shifted(a)]);
      pieces[pieces.length - 1].push(shifted(b));
      turn = here;
    }
  }
  return pieces;
};

/** Points strictly between two others where the line crosses the border of a window, in the order of the line. */
const cuts = (from: Direction, to: Direction, startDeg: number): Direction[] => {
  const span = to.azimuthDeg - from.azimuthDeg;
  const low = Math.min(from.azimuthDeg, to.azimuthDeg);
  const high = Math.max(from.azimuthDeg, to.azimuthDeg);
  const borders: number[] = [];
  for (let b = startDeg + 360 * Math.ceil((low - startDeg) / 360); b < high; b += 360)
    if (b > low) borders.push(b);
  const inOrder = span < 0 ? borders.toReversed() : borders;
  return inOrder.map((azimuthDeg) => ({
    azimuthDeg,
    elevationDeg:
      from.elevationDeg + ((azimuthDeg - from.azimuthDeg) / span) * (to.elevationDeg - from.elevationDeg),
  }));
};
