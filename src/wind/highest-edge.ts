import { asinDeg, cosDeg, sinDeg } from '../shared/index.ts';

/** Lengths of one mount as plain numbers, m; null where the study is blank. */
export interface EdgeGeometry {
  readonly arrangement: 'ground-rack' | 'tracker' | 'roof';
  /** Rack: its tilt. Tracker: `steepestChordTiltDeg`, or 90 for a dual axis. Roof: rise relative to the roof, 0 where parallel. */
  readonly steepestTiltDeg: number;
  /** Rack or tracker chord, along the slope. */
  readonly slantM: number | null;
  /** Trackers: the axis above ground at its highest point. */
  readonly axisHeightM: number | null;
  /** Racks: lower edge above ground. */
  readonly lowerEdgeM: number | null;
  /** Roofs: clear gap between the roof and the back of the modules. */
  readonly airBehindM: number | null;
  readonly moduleThicknessM: number | null;
  /** Roofs: the roof above ground where the array's upper edge lies. */
  readonly roofHeightM: number | null;
}

/** Where a mount's highest edge is; null where lengths are missing. */
export interface HighestEdge {
  readonly aboveGroundM: number | null;
  /** Measured square to the roof; null for ground mounts. */
  readonly aboveRoofM: number | null;
  /** The study keys that are blank and needed. */
  readonly missing: readonly string[];
}

/**
 * Steepest angle of a single-axis tracker's chord above horizontal, degrees: asin(sin(swing) cos(axis tilt)).
 * The chord stays square to the axis, so a tilted axis lifts its edge less than a level one.
 */
export const steepestChordTiltDeg = (swingDeg: number, axisTiltDeg: number): number =>
  asinDeg(sinDeg(swingDeg) * cosDeg(axisTiltDeg));

/**
 * The same where axis and rows follow a slope: the angle whose sine is the upper edge's height over the ground below
 * it, less that of the axis, per half chord: sin(swing + |cross-axis slope|) / cos(slope), at most 1. Plain geometry: a
 * distance square to the slope is turned upright; the edge that stands out downhill is the higher one.
 * @param crossAxisTiltDeg of the ground in the plane square to the axis, either sign
 */
export const steepestChordAboveSlopeDeg = (
  swingDeg: number,
  crossAxisTiltDeg: number,
  slopeDeg: number,
): number =>
  asinDeg(Math.min(1, sinDeg(Math.min(90, swingDeg + Math.abs(crossAxisTiltDeg))) / cosDeg(slopeDeg)));

const sumOrNull = (...parts: readonly (number | null)[]): number | null =>
  parts.reduce<number | null>((sum, part) => (sum === null || part === null ? null : sum + part), 0);

const blanks = (lengths: Record<string, number | null>): string[] =>
  Object.keys(lengths).filter((key) => lengths[key] === null);

const rise = (lengthM: number | null, tiltDeg: number): number | null =>
  tiltDeg === 0 ? 0 : lengthM === null ? null : lengthM * sinDeg(tiltDeg);

/**
 * Height of a mount's highest edge at its steepest working angle, by plain geometry. Rack: lower edge + slant
 * sin(tilt). Tracker: axis height + slant / 2 sin(angle). Roof: gap + module thickness + slant sin(rise), square
 * to the roof; above ground that projection is added to the roof's height as if it were upright, which errs high.
 */
export const highestEdge = (g: EdgeGeometry): HighestEdge => {
  switch (g.arrangement) {
    case 'ground-rack':
      return {
        aboveGroundM: sumOrNull(g.lowerEdgeM, rise(g.slantM, g.steepestTiltDeg)),
        aboveRoofM: null,
        missing: blanks({ lower_edge: g.lowerEdgeM, slant: rise(g.slantM, g.steepestTiltDeg) }),
      };
    case 'tracker':
      return {
        aboveGroundM: sumOrNull(g.axisHeightM, rise(g.slantM && g.slantM / 2, g.steepestTiltDeg)),
        aboveRoofM: null,
        missing: blanks({ axis_height: g.axisHeightM, slant: rise(g.slantM, g.steepestTiltDeg) }),
      };
    case 'roof': {
      const projection = sumOrNull(g.airBehindM, g.moduleThicknessM, rise(g.slantM, g.steepestTiltDeg));
      return {
        aboveGroundM: sumOrNull(g.roofHeightM, projection),
        aboveRoofM: projection,
        missing: blanks({
          air_behind: g.airBehindM,
          'array.module.thickness': g.moduleThicknessM,
          slant: rise(g.slantM, g.steepestTiltDeg),
          'site.roof_height': g.roofHeightM,
        }),
      };
    }
  }
};
