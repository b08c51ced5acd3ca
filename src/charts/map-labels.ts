import { DIAL_RADIUS, dialAxis, type LossContour } from './dial-map.ts';
import { type Layer, textLayer } from './frame.ts';
import { forSpec, whole } from './numbers.ts';
import { PAPER } from './palette.ts';
import { at, toPixels } from './plane-labels.ts';
import { type DialPoint, dialPoint } from './polar-field.ts';
import { textWidth } from './text.ts';
import { highest } from './words.ts';

/** The four points outside the rim. */
export const compass = (): Layer[] => [
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
export const tiltLabels = (taken: DialPoint[]): Layer[] => {
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
export const contourLabels = (contours: readonly LossContour[], taken: DialPoint[]): Layer[] =>
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
