import { DIAL_RADIUS, PX_PER_DEG } from './dial-map.ts';
import { CHART_WIDTH, LABEL_SIZE, type Layer, MARGIN, textLayer } from './frame.ts';
import { forSpec } from './numbers.ts';
import { INK, MUTED, PAPER } from './palette.ts';
import type { DialPoint } from './polar-field.ts';
import { spreadLabels } from './spread.ts';
import { wrap } from './text.ts';

/** Pixels from the left edge of the chart to the dial, and from the dial to the right edge. */
export const DIAL_LEFT = CHART_WIDTH / 2 - DIAL_RADIUS;
/** Labels stand this far from the rim, clear of the compass letters. */
const LABEL_GAP = 34;
const LABEL_ROOM = DIAL_LEFT - LABEL_GAP - MARGIN;
const DETAIL_SIZE = 11;
const NAME_LINE = 15;
const DETAIL_LINE = 14;
const MOST_ON_A_SIDE = 5;

/** A plane that is marked and named on the dial. */
export interface MarkedPlane {
  readonly name: string;
  readonly details: string[];
  readonly tiltDeg: number;
  readonly azimuthDeg: number;
  readonly at: DialPoint;
  /** Outline of what the reading errors allow; null without them. */
  readonly box: DialPoint[][] | null;
  /** Null for the optimum. */
  readonly series: number | null;
}

/** A point of the dial in pixels of the plot. */
export const toPixels = ([x, y]: DialPoint): DialPoint => [
  DIAL_RADIUS + x * PX_PER_DEG,
  DIAL_RADIUS - y * PX_PER_DEG,
];

export interface PlacedLabel {
  readonly plane: MarkedPlane;
  readonly lines: string[];
  readonly isLeft: boolean;
  readonly from: DialPoint;
  readonly to: DialPoint;
  readonly height: number;
}

/** Labels stand in a column on either side of the dial, nearest side first, never on one another. */
export const placeLabels = (planes: readonly MarkedPlane[]): PlacedLabel[] => {
  const byX = [...planes].sort((a, b) => a.at[0] - b.at[0]);
  const west = byX.filter((p) => p.at[0] < -1e-6).length;
  const onLeft = Math.min(MOST_ON_A_SIDE, Math.max(byX.length - MOST_ON_A_SIDE, balanced(west, byX.length)));
  return [byX.slice(0, onLeft), byX.slice(onLeft)].flatMap((side, isRight) => {
    const lines = side.map((p) => wrap(p.name, LABEL_ROOM, LABEL_SIZE, 2, p.series === null));
    const heights = side.map((p, i) => lines[i].length * NAME_LINE + p.details.length * DETAIL_LINE + 10);
    const centres = spreadLabels(
      side.map((p) => toPixels(p.at)[1]),
      heights,
      -36,
      2 * DIAL_RADIUS + 36,
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

/** A fixed place in pixels. */
export const at = (p: DialPoint) => ({ x: { value: forSpec(p[0]) }, y: { value: forSpec(p[1]) } });
const to = (p: DialPoint) => ({ x2: { value: forSpec(p[0]) }, y2: { value: forSpec(p[1]) } });

/** Thin lines from each mark to its label, on a paler band that parts them from the map. */
export const leaders = (labels: readonly PlacedLabel[]): Layer[] =>
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

/** Name, then orientation and TOF, flush with the dial. */
export const labelLayers = (label: PlacedLabel): Layer[] => {
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
