import type { Comparison, MountResult } from '../shared/index.ts';
import { wrap360 } from '../shared/index.ts';
import { DIAL_RADIUS, dialAxis, dialMap, type LossContour, mapLayers, PX_PER_DEG } from './dial-map.ts';
import { CHART_WIDTH, type Chart, frame, LABEL_SIZE, type Layer, MARGIN, textLayer } from './frame.ts';
import { fixed, forSpec, percentSize, whole } from './numbers.ts';
import { INK, MUTED, PAPER, seriesStyle } from './palette.ts';
import { type DialPoint, dialPoint } from './polar-field.ts';
import { spreadLabels } from './spread.ts';
import { textWidth, wrap } from './text.ts';
import { highest, labelOf, named, orientationWords } from './words.ts';

const LEFT = CHART_WIDTH / 2 - DIAL_RADIUS;
/** Labels stand this far from the rim, clear of the compass letters. */
const LABEL_GAP = 34;
const LABEL_ROOM = LEFT - LABEL_GAP - MARGIN;
const DETAIL_SIZE = 11;
const NAME_LINE = 15;
const DETAIL_LINE = 14;
const MOST_ON_A_SIDE = 5;

/** A plane that is marked and named on the dial. */
interface MarkedPlane {
  readonly name: string;
  readonly details: string[];
  readonly tiltDeg: number;
  readonly azimuthDeg: number;
  readonly at: DialPoint;
  /** Null for the optimum. */
  readonly series: number | null;
}

/** The dial: yearly light on every fixed plane, the best one and each fixed mount. North is up. */
export const orientationChart = (comparison: Comparison): Chart => {
  const map = dialMap(comparison);
  const planes = markedPlanes(comparison);
  const title = headline(comparison);
  const finding = `${title}.${freedom(comparison, map.contours)}`;
  const altText = `Dial of yearly light on fixed planes: compass on the rim with north up, tilt from flat in the centre to upright at the rim, contour lines of loss. ${finding} ${planes.map((p) => `${p.name}: ${p.details.join(', ')}`).join('; ')}.`;
  const labels = placeLabels(planes);
  const avoid = [
    ...planes.map((p) => toPixels(p.at)),
    ...labels.flatMap((l) => [0.2, 0.4, 0.6, 0.8].map((s): DialPoint => [l.from[0] + s * (l.to[0] - l.from[0]), l.from[1] + s * (l.to[1] - l.from[1])])),
  ]; // biome-ignore format: along each leader
  return {
    name: 'orientation',
    title,
    finding,
    altText,
    spec: frame({
      title,
      subtitle:
        'Compass on the rim, tilt from flat in the centre to upright at the rim. Lines: yearly light lost against the best fixed plane, before shade. TOF: the share that is kept.',
      altText,
      left: LEFT,
      right: LEFT,
      height: 2 * DIAL_RADIUS,
      above: 44,
      below: 40,
      layers: [
        ...mapLayers(map),
        ...compass(),
        ...leaders(labels),
        ...tiltLabels(avoid),
        ...contourLabels(map.contours, avoid),
        ...marks(planes),
        ...labels.flatMap(labelLayers),
      ],
    }),
  };
};

const isFixed = (m: MountResult): m is MountResult & { tilt_deg: number; azimuth_deg: number } =>
  m.tilt_deg !== null && m.azimuth_deg !== null;

const markedPlanes = (comparison: Comparison): MarkedPlane[] => {
  const { tilt_deg, azimuth_deg } = comparison.best_orientation;
  const plane = (name: string, tiltDeg: number, azimuthDeg: number, tof: number | null, series: number | null) => ({
    name,
    tiltDeg,
    azimuthDeg,
    series,
    at: dialPoint(tiltDeg, azimuthDeg),
    details: [
      tiltDeg < 0.5 ? 'lying flat' : `${whole(tiltDeg)}° facing ${whole(wrap360(Math.round(azimuthDeg)))}°`,
      ...(tof === null ? [] : [`TOF ${fixed(tof, 2)}`]),
    ],
  }); // biome-ignore format: one record
  return [
    plane('best fixed plane', tilt_deg, azimuth_deg, null, null),
    ...comparison.mounts.flatMap((m, i) =>
      isFixed(m) ? [plane(labelOf(m), m.tilt_deg, m.azimuth_deg, m.orientation_factor, i)] : [],
    ),
  ];
};

const toPixels = ([x, y]: DialPoint): DialPoint => [
  DIAL_RADIUS + x * PX_PER_DEG,
  DIAL_RADIUS - y * PX_PER_DEG,
];

interface PlacedLabel {
  readonly plane: MarkedPlane;
  readonly lines: string[];
  readonly isLeft: boolean;
  readonly from: DialPoint;
  readonly to: DialPoint;
  readonly height: number;
}

/** Labels stand in a column on either side of the dial, nearest side first, never on one another. */
const placeLabels = (planes: readonly MarkedPlane[]): PlacedLabel[] => {
  const byX = [...planes].sort((a, b) => a.at[0] - b.at[0]);
  const west = byX.filter((p) => p.at[0] < -1e-6).length;
  const onLeft = Math.min(MOST_ON_A_SIDE, Math.max(byX.length - MOST_ON_A_SIDE, balanced(west, byX.length)));
  return [byX.slice(0, onLeft), byX.slice(onLeft)].flatMap((side, isRight) => {
    const lines = side.map((p) => wrap(p.name, LABEL_ROOM, LABEL_SIZE, 2, p.series === null));
    const heights = side.map((p, i) => lines[i].length * NAME_LINE + p.details.length * DETAIL_LINE + 10);
    const centres = spreadLabels(
      side.map((p) => toPixels(p.at)[1]),
      heights,
      -24,
      2 * DIAL_RADIUS + 24,
    );
    return side.map((plane, i) => ({
      plane,
      lines: lines[i],
      isLeft: isRight === 0,
      from: toPixels(plane.at),
      to: [isRight ? 2 * DIAL_RADIUS + LABEL_GAP - 5 : 5 - LABEL_GAP, centres[i]] as const,
      height: heights[i] - 10,
    }));
  });
};

/** Planes near the north-south line go wherever there is room: neither side takes over two thirds. */
const balanced = (west: number, count: number): number =>
  Math.min(Math.ceil((count * 2) / 3), Math.max(Math.floor(count / 3), west));

const at = (p: DialPoint) => ({ x: { value: forSpec(p[0]) }, y: { value: forSpec(p[1]) } });
const to = (p: DialPoint) => ({ x2: { value: forSpec(p[0]) }, y2: { value: forSpec(p[1]) } });

const leaders = (labels: readonly PlacedLabel[]): Layer[] =>
  [
    { color: PAPER, strokeWidth: 3, opacity: 0.6 },
    { color: INK, strokeWidth: 0.8 },
  ].flatMap((look) =>
    labels.map((l) => ({
      data: { values: [{ plane: l.plane.name }] },
      mark: { type: 'rule', ...look },
      encoding: { ...at(l.from), ...to(l.to) },
    })),
  );

const marks = (planes: readonly MarkedPlane[]): Layer[] =>
  [...planes]
    .sort((a, b) => Number(b.series === null) - Number(a.series === null))
    .flatMap((p) => {
      const data = {
        values: [
          { plane: p.name, tilt_deg: forSpec(p.tiltDeg), azimuth_deg: forSpec(p.azimuthDeg), east: forSpec(p.at[0]), north: forSpec(p.at[1]) },
        ],
      }; // biome-ignore format: one record
      const encoding = { x: dialAxis('east'), y: dialAxis('north') };
      if (p.series === null) {
        const ring = { type: 'point', shape: 'circle', size: 260, filled: false, opacity: 1 };
        return [
          { data, mark: { ...ring, color: PAPER, strokeWidth: 5 }, encoding },
          { data, mark: { ...ring, color: INK, strokeWidth: 2 }, encoding },
        ];
      }
      const { color, shape } = seriesStyle(p.series);
      return [
        { data, mark: { type: 'point', shape, size: 90, filled: true, opacity: 1, color, stroke: PAPER, strokeWidth: 1.5 }, encoding },
      ]; // biome-ignore format: one mark
    });

/** Name, then orientation and TOF, flush with the dial. */
const labelLayers = (label: PlacedLabel): Layer[] => {
  const { plane, lines, isLeft } = label;
  const x = label.to[0] + (isLeft ? -5 : 5);
  const top = label.to[1] - label.height / 2;
  const align = isLeft ? 'right' : 'left';
  const bottom = top + lines.length * NAME_LINE;
  return [
    textLayer([{ text: lines.join('\n') }], at([x, top + NAME_LINE / 2]), {
      align,
      lineHeight: NAME_LINE,
      fontWeight: plane.series === null ? 'bold' : 'normal',
    }),
    textLayer([{ text: plane.details.join('\n') }], at([x, bottom + DETAIL_LINE / 2]), {
      align,
      fontSize: DETAIL_SIZE,
      lineHeight: DETAIL_LINE,
      color: MUTED,
    }),
  ];
};

const compass = (): Layer[] => [
  textLayer(
    [
      { text: 'N', azimuth: 0 },
      { text: 'E', azimuth: 90 },
      { text: 'S', azimuth: 180 },
      { text: 'W', azimuth: 270 },
    ].map((c) => {
      const [east, north] = dialPoint(99, c.azimuth);
      return { ...c, east: forSpec(east), north: forSpec(north) };
    }),
    { x: dialAxis('east'), y: dialAxis('north') },
    { fontWeight: 'bold', fontSize: 13 },
  ),
];

/** Text over the map: paper behind, ink on top. */
const haloed = (text: string, p: DialPoint, fontSize: number): Layer[] => [
  textLayer([{ text }], at(p), {
    fontSize,
    stroke: PAPER,
    strokeWidth: 5,
    strokeJoin: 'round',
  }),
  textLayer([{ text }], at(p), { fontSize }),
];

/** How clear of its neighbours a short label is; from 1 on they do not touch. Words are wider than high. */
const clearance = (p: DialPoint, others: readonly DialPoint[]): number =>
  Math.min(2, ...others.map((o) => Math.max(Math.abs(p[0] - o[0]) / 44, Math.abs(p[1] - o[1]) / 17)));

/** Tilt along the spoke that is freest of marks. Pushes what it places onto `taken`. */
const tiltLabels = (taken: DialPoint[]): Layer[] => {
  const onSpoke = (azimuth: number) => [30, 60].map((tilt) => toPixels(dialPoint(tilt, azimuth)));
  const azimuth = highest([45, 135, 225, 315], (a) =>
    Math.min(...onSpoke(a).map((p) => clearance(p, taken))),
  );
  const places = onSpoke(azimuth);
  const layers = places.flatMap((p, i) => haloed(['tilt 30°', '60°'][i], p, 10));
  taken.push(...places);
  return layers;
};

/** Each contour is named at the vertex that is freest of marks, leaders and earlier labels; the outermost has the verb. */
const contourLabels = (contours: readonly LossContour[], taken: DialPoint[]): Layer[] =>
  contours.toReversed().flatMap(({ loss, lines }, i) => {
    const text = `${i === 0 ? 'loses ' : ''}${whole(loss * 100)}\u00A0%`;
    const half = textWidth(text, 11) / 2;
    const inside = lines
      .flat()
      .map(toPixels)
      .filter(([x, y]) => Math.hypot(Math.abs(x - DIAL_RADIUS) + half, y - DIAL_RADIUS) < DIAL_RADIUS - 8);
    if (inside.length === 0) return [];
    const place = highest(inside, (p) => clearance(p, taken));
    taken.push(place);
    return haloed(text, place, 11);
  });

const headline = (comparison: Comparison): string => {
  const { tilt_deg, azimuth_deg } = comparison.best_orientation;
  const best = `The best fixed plane is ${orientationWords(tilt_deg, azimuth_deg)}`;
  const known = comparison.mounts.filter((m) => isFixed(m) && m.orientation_factor !== null);
  if (known.length === 0) return best;
  const lost = (m: MountResult) => 1 - (m.orientation_factor ?? 1);
  const worst = highest(known, lost);
  if (lost(worst) >= 0.005) return `${best}; ${named(worst)} loses ${percentSize(lost(worst))}`;
  return `${best}; ${known.length > 1 ? 'every fixed mount' : named(worst)} keeps all but 0.5 % of its light`;
};

/** How much freedom there is: the tilts within the 5 % contour. */
const freedom = (
  { orientation_map, best_orientation }: Comparison,
  contours: readonly LossContour[],
): string => {
  const line = contours.find((c) => c.loss === 0.05)?.lines.flat() ?? [];
  if (line.length === 0) return '';
  const tilts = line.map(([x, y]) => Math.hypot(x, y));
  const [least, most] = [whole(Math.min(...tilts)), whole(Math.max(...tilts))];
  const flatKeeps = orientation_map.irradiation_kwh_m2[0][0] / best_orientation.irradiation_kwh_m2;
  return flatKeeps >= 0.95
    ? ` Up to ${least}° of tilt, whichever way a plane faces, it stays within 5 % of that.`
    : ` Tilts from ${least}° to ${most}° can stay within 5 % of that.`;
};
