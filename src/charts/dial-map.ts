import type { Comparison } from '../shared/index.ts';
import { outlines, sampleGrid, withinCircle } from './contours.ts';
import type { Layer } from './frame.ts';
import { dialColor, INK } from './palette.ts';
import { type DialPoint, polarField } from './polar-field.ts';

/** Pixels from the centre to the rim, which stands for 90 degrees of tilt. */
export const DIAL_RADIUS = 172;
export const PX_PER_DEG = DIAL_RADIUS / 90;
const RIM_DEG = 90;
/** Contours are computed on a square that reaches a little past the rim. */
const REACH_DEG = 93;
const STEP_DEG = 2;
const FULL_TURN = 6.2831853;

/** Losses (fractions) at which the shade of the field changes, fine where planes are chosen. */
const SHADES = [
  0.0025, 0.005, 0.01, 0.015, 0.02, 0.03, 0.04, 0.05, 0.06, 0.08, 0.1, 0.12, 0.14, 0.16, 0.18, 0.2, 0.225, 0.25,
  0.275, 0.3, 0.325, 0.35, 0.375, 0.4, 0.425, 0.45, 0.475, 0.5, 0.525, 0.55, 0.575, 0.6, 0.625, 0.65, 0.675, 0.7,
]; // biome-ignore format: one scale
/** Losses that get a line and a label. */
export const CONTOUR_LOSSES = [0.01, 0.02, 0.05, 0.1, 0.2] as const;

export interface LossContour {
  readonly loss: number;
  /** Lines within the rim, in degrees east and north of lying flat. */
  readonly lines: DialPoint[][];
}

export interface DialMap {
  readonly contours: LossContour[];
  /** Pale where little is lost; outlines of each shade, the widest first. */
  readonly shades: { color: string; outlines: DialPoint[][] }[];
}

/** Shades and contour lines of the loss against the best plane, from the orientation map. */
export const dialMap = (comparison: Comparison): DialMap => {
  const peak = comparison.best_orientation.irradiation_kwh_m2;
  if (!(peak > 0)) return { contours: [], shades: [] };
  const grid = sampleGrid(nearDial(polarField(comparison.orientation_map)), REACH_DEG, STEP_DEG);
  return {
    contours: CONTOUR_LOSSES.map((loss) => ({
      loss,
      lines: outlines(grid, peak * (1 - loss)).flatMap((line) => withinCircle(line, RIM_DEG)),
    })).filter((contour) => contour.lines.length > 0),
    shades: SHADES.toReversed()
      .map((loss, i) => ({
        color: dialColor((loss + (SHADES[SHADES.length - 2 - i] ?? 0)) / 2),
        outlines: outlines(grid, peak * (1 - loss)).map((line) => line.map(ontoDial)),
      }))
      .filter((shade) => shade.outlines.length > 0),
  };
};

/** The field up to the reach, nothing beyond: every cell that the rim crosses has its four corners. */
const nearDial =
  (field: (x: number, y: number) => number) =>
  (x: number, y: number): number =>
    Math.hypot(x, y) > REACH_DEG ? Number.NEGATIVE_INFINITY : field(x, y);

/** Draws what lies past the rim in onto the rim: an outline keeps its shape inside and gains no area outside. */
const ontoDial = (p: DialPoint): DialPoint => {
  const shrink = RIM_DEG / Math.max(RIM_DEG, Math.hypot(...p));
  return [p[0] * shrink, p[1] * shrink];
};

/** The field, its tilt rings and spokes, the contour lines and the rim. */
export const mapLayers = (map: DialMap): Layer[] => [
  disc(0, DIAL_RADIUS, { color: dialColor(1) }),
  {
    data: {
      values: map.shades.map((shade) => ({
        type: 'Feature',
        properties: { color: shade.color },
        geometry: { type: 'Polygon', coordinates: shade.outlines.map(rounded) },
      })),
    },
    projection: DIAL_PROJECTION,
    mark: { type: 'geoshape', stroke: null, clip: false },
    encoding: { fill: { field: 'properties.color', type: 'nominal', scale: null } },
  },
  {
    data: { values: [0, 45, 90, 135].map((azimuth) => ({ azimuth, ...spoke(azimuth) })) },
    mark: { type: 'rule', color: INK, opacity: 0.14, strokeWidth: 1 },
    encoding: { x: dialAxis('x'), y: dialAxis('y'), x2: { field: 'x2' }, y2: { field: 'y2' } },
  },
  ...[30, 60].map((tilt) =>
    disc(tilt * PX_PER_DEG - 0.5, tilt * PX_PER_DEG + 0.5, { color: INK, opacity: 0.16 }),
  ),
  {
    data: {
      values: map.contours.map(({ loss, lines }) => ({
        type: 'Feature',
        properties: { loses_percent: loss * 100 },
        geometry: { type: 'MultiLineString', coordinates: lines.map(rounded) },
      })),
    },
    projection: DIAL_PROJECTION,
    mark: { type: 'geoshape', clip: false, filled: false, stroke: INK, strokeWidth: 1, strokeJoin: 'round' },
  },
  disc(DIAL_RADIUS, DIAL_RADIUS + 1.5, { color: INK }),
  {
    data: { values: Array.from({ length: 12 }, (_, i) => ({ azimuth: i * 30, ...rimTick(i * 30) })) },
    mark: { type: 'rule', color: INK, strokeWidth: 1 },
    encoding: { x: dialAxis('x'), y: dialAxis('y'), x2: { field: 'x2' }, y2: { field: 'y2' } },
  },
];

/** Degrees on both axes; the field names say east and north. */
export const dialAxis = (field: string) => ({
  field,
  type: 'quantitative',
  axis: null,
  scale: { domain: [-RIM_DEG, RIM_DEG], nice: false, zero: false },
});

const DIAL_PROJECTION = {
  type: 'identity',
  reflectY: true,
  scale: PX_PER_DEG,
  translate: [DIAL_RADIUS, DIAL_RADIUS],
};

const disc = (innerPx: number, outerPx: number, mark: Record<string, unknown>): Layer => ({
  data: { values: [{}] },
  mark: { type: 'arc', ...mark },
  encoding: {
    x: { value: DIAL_RADIUS },
    y: { value: DIAL_RADIUS },
    theta: { value: 0 },
    theta2: { value: FULL_TURN },
    radius: { value: outerPx },
    radius2: { value: innerPx },
  },
});

const hundredth = (x: number): number => Math.round(x * 100) / 100 + 0;
const rounded = (line: readonly DialPoint[]): number[][] =>
  line.map(([x, y]) => [hundredth(x), hundredth(y)]);

const ray = (azimuth: number, from: number, to: number) => {
  const [sin, cos] = [Math.sin((azimuth * Math.PI) / 180), Math.cos((azimuth * Math.PI) / 180)];
  return {
    x: hundredth(from * sin),
    y: hundredth(from * cos),
    x2: hundredth(to * sin),
    y2: hundredth(to * cos),
  };
};
const spoke = (azimuth: number) => ray(azimuth, -RIM_DEG, RIM_DEG);
const rimTick = (azimuth: number) => ray(azimuth, RIM_DEG, RIM_DEG + (azimuth % 90 === 0 ? 4 : 2.5));
