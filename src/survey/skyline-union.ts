import { wrap360 } from '../shared/index.ts';
import { type Skyline, type SkylineCorner, sidesAt } from './skyline.ts';

/** The higher of several skylines at every azimuth, exactly: with the corners where their lines cross. */
export const unionOf = (name: string, skylines: readonly Skyline[]): Skyline => {
  if (skylines.length === 0) throw new RangeError('a union needs a skyline');
  return { ...skylines.reduce(higherOf), name };
};

const higherOf = (a: Skyline, b: Skyline): Skyline => {
  const shared = [...new Set([...a.corners, ...b.corners].map((c) => c.azimuthDeg))].sort((x, y) => x - y);
  const crossings = shared.flatMap((from, i) => {
    const to = shared[i + 1] ?? shared[0] + 360;
    return crossingOf(a, b, from, to);
  });
  const azimuths = [...shared, ...crossings].sort((x, y) => x - y);
  return { name: a.name, corners: azimuths.map((azimuthDeg) => cornerOf(a, b, azimuthDeg)) };
};

const cornerOf = (a: Skyline, b: Skyline, azimuthDeg: number): SkylineCorner => {
  const [[aBefore, aAfter], [bBefore, bAfter]] = [sidesAt(a, azimuthDeg), sidesAt(b, azimuthDeg)];
  return { azimuthDeg, beforeDeg: Math.max(aBefore, bBefore), afterDeg: Math.max(aAfter, bAfter) };
};

/** Where two lines that are straight from one azimuth to the next cross between them; none or one. */
const crossingOf = (a: Skyline, b: Skyline, from: number, to: number): number[] => {
  const start = sidesAt(a, from)[1] - sidesAt(b, from)[1];
  const end = sidesAt(a, to)[0] - sidesAt(b, to)[0];
  if (!(start * end < 0)) return [];
  const at = wrap360(from + ((to - from) * start) / (start - end));
  return at === wrap360(from) || at === wrap360(to) ? [] : [at];
};
