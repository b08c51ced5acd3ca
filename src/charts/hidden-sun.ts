import type { Direction } from './azimuth-window.ts';

/** Elevation of a skyline at an azimuth that its pieces span, straight between its points; the higher side of an upright edge. */
export const elevationOf =
  (pieces: readonly (readonly Direction[])[]) =>
  (azimuthDeg: number): number => {
    let elevation = 0;
    for (const points of pieces)
      for (let i = 1; i < points.length; i++) {
        const [a, b] = [points[i - 1], points[i]];
        if (azimuthDeg < a.azimuthDeg || azimuthDeg > b.azimuthDeg) continue;
        const span = b.azimuthDeg - a.azimuthDeg;
        const here =
          span === 0
            ? Math.max(a.elevationDeg, b.elevationDeg)
            : a.elevationDeg + ((azimuthDeg - a.azimuthDeg) / span) * (b.elevationDeg - a.elevationDeg);
        elevation = Math.max(elevation, here);
      }
    return elevation;
  };

export interface SunStretch {
  readonly hidden: boolean;
  readonly points: readonly Direction[];
}

/** How finely a line between two samples is searched for the edge of the skyline, degrees of azimuth or elevation. */
const STEP_DEG = 0.5;

/** Cuts a sun's path into stretches before and behind the skyline, neighbours sharing their end. */
export const sunStretches = (
  path: readonly Direction[],
  elevationAt: (azimuthDeg: number) => number,
): SunStretch[] => {
  const stretches: { hidden: boolean; points: Direction[] }[] = [];
  const hidden = (p: Direction) => p.elevationDeg < elevationAt(p.azimuthDeg);
  for (const [i, to] of path.entries()) {
    if (i === 0) {
      stretches.push({ hidden: hidden(to), points: [to] });
      continue;
    }
    const from = path[i - 1];
    const [turn, rise] = [to.azimuthDeg - from.azimuthDeg, to.elevationDeg - from.elevationDeg];
    const steps = Math.max(1, Math.ceil(Math.max(Math.abs(turn), Math.abs(rise)) / STEP_DEG));
    for (let s = 1; s <= steps; s++) {
      const p = {
        azimuthDeg: from.azimuthDeg + (s / steps) * turn,
        elevationDeg: from.elevationDeg + (s / steps) * rise,
      };
      const last = stretches[stretches.length - 1];
      if (hidden(p) !== last.hidden) {
        last.points.push(p);
        stretches.push({ hidden: !last.hidden, points: [p] });
      } else if (s === steps) last.points.push(p);
    }
  }
  return stretches.filter(({ points }) => points.length > 1);
};
