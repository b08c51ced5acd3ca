import { wrap360 } from '../shared/index.ts';

/** A direction where the skyline was measured: true azimuth 0..360, elevation above level 0..90. */
export interface SkylinePoint {
  readonly azimuthDeg: number;
  readonly elevationDeg: number;
}

/** A corner of the line: it arrives at `before` and leaves at `after`, which differ at a vertical edge. */
export interface SkylineCorner {
  /** 0 included .. 360 excluded. */
  readonly azimuthDeg: number;
  readonly beforeDeg: number;
  readonly afterDeg: number;
}

/** What stands before the sky all round, seen from one point of the array. */
export interface Skyline {
  readonly name: string;
  /** In order of azimuth, at least one; between two corners, and from the last to the first, the line is straight. */
  readonly corners: readonly SkylineCorner[];
}

/** Nothing stands before the sky. */
export const OPEN_SKYLINE: Skyline = {
  name: 'open',
  corners: [{ azimuthDeg: 0, beforeDeg: 0, afterDeg: 0 }],
};

/** The skyline through measured points in any order, by straight lines round the circle. Points must be checked already. */
export const skylineOfPoints = (name: string, points: readonly SkylinePoint[]): Skyline => {
  const elevations = new Map(points.map((p) => [wrap360(p.azimuthDeg), p.elevationDeg]));
  const corners = [...elevations]
    .map(([azimuthDeg, elevationDeg]) => ({ azimuthDeg, beforeDeg: elevationDeg, afterDeg: elevationDeg }))
    .sort((a, b) => a.azimuthDeg - b.azimuthDeg);
  return { name, corners };
};

/** Index of the last corner at or before an azimuth; the last of all where the azimuth lies before the first. */
const cornerBefore = (corners: readonly SkylineCorner[], azimuthDeg: number): number => {
  let [low, high] = [0, corners.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (corners[middle].azimuthDeg <= azimuthDeg) low = middle + 1;
    else high = middle;
  }
  return low === 0 ? corners.length - 1 : low - 1;
};

/** Elevation of the skyline at each side of an azimuth, degrees; the two differ only at a vertical edge. */
export const sidesAt = ({ corners }: Skyline, azimuthDeg: number): [beforeDeg: number, afterDeg: number] => {
  const azimuth = wrap360(azimuthDeg);
  const index = cornerBefore(corners, azimuth);
  const corner = corners[index];
  if (corner.azimuthDeg === azimuth) return [corner.beforeDeg, corner.afterDeg];
  const next = corners[(index + 1) % corners.length];
  const span = wrap360(next.azimuthDeg - corner.azimuthDeg) || 360;
  const along = wrap360(azimuth - corner.azimuthDeg) / span;
  const elevationDeg = corner.afterDeg + along * (next.beforeDeg - corner.afterDeg);
  return [elevationDeg, elevationDeg];
};

/** Elevation of the skyline (0..90) at a true azimuth; at a vertical edge the higher side. */
export const elevationAt = (skyline: Skyline, azimuthDeg: number): number =>
  Math.max(...sidesAt(skyline, azimuthDeg));

/** The same points with magnetic bearings turned to true; declination east positive. */
export const turnPoints = (points: readonly SkylinePoint[], declinationDeg: number): SkylinePoint[] =>
  points.map((p) => ({ ...p, azimuthDeg: wrap360(p.azimuthDeg + declinationDeg) }));

/** The line as points for a chart, from azimuth 0 to 360, vertical edges as two points. */
export const outlineOf = (skyline: Skyline): SkylinePoint[] => {
  const [before, after] = sidesAt(skyline, 0);
  const inner = skyline.corners.filter((c) => c.azimuthDeg > 0);
  return [
    { azimuthDeg: 0, elevationDeg: after },
    ...inner.flatMap(({ azimuthDeg, beforeDeg, afterDeg }) => [
      { azimuthDeg, elevationDeg: beforeDeg },
      ...(afterDeg === beforeDeg ? [] : [{ azimuthDeg, elevationDeg: afterDeg }]),
    ]),
    { azimuthDeg: 360, elevationDeg: before },
  ];
};
