import type { Comparison, MountResult } from '../shared/index.ts';
import { wrap360 } from '../shared/index.ts';
import { DIAL_RADIUS, dialAxis, dialMap, type LossContour, mapLayers } from './dial-map.ts';
import { boxLayers, boxRoom, errorBox } from './error-box.ts';
import { type Chart, frame, type Layer } from './frame.ts';
import { compass, contourLabels, tiltLabels } from './map-labels.ts';
import { fixed, forSpec, percentSize, whole } from './numbers.ts';
import { INK, PAPER, seriesStyle } from './palette.ts';
import { DIAL_LEFT, labelLayers, leaders, type MarkedPlane, placeLabels, toPixels } from './plane-labels.ts';
import { type DialPoint, dialPoint } from './polar-field.ts';
import { highest, labelOf, named, orientationWords } from './words.ts';

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
      subtitle: `Compass on the rim, tilt from flat in the centre to upright at the rim. Lines: yearly light lost against the best fixed plane, before shade. TOF: the share that is kept.${planes.some((p) => p.box) ? ' Outlined: what the reading errors allow.' : ''}`,
      altText,
      left: DIAL_LEFT,
      right: DIAL_LEFT,
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
  const plane = (name: string, tiltDeg: number, azimuthDeg: number, more: readonly string[]) => ({
    name,
    tiltDeg,
    azimuthDeg,
    at: dialPoint(tiltDeg, azimuthDeg),
    details: [
      tiltDeg < 0.5 ? 'lying flat' : `${whole(tiltDeg)}° facing ${whole(wrap360(Math.round(azimuthDeg)))}°`,
      ...more,
    ],
  });
  return [
    { ...plane('best fixed plane', tilt_deg, azimuth_deg, []), box: null, series: null },
    ...comparison.mounts.flatMap((m, i) =>
      isFixed(m)
        ? [{ ...plane(labelOf(m), m.tilt_deg, m.azimuth_deg, factorWords(m)), box: errorBox(m), series: i }]
        : [],
    ),
  ];
};

/** `TOF 0.94`, and on a line of its own the band of the reading errors: `(0.92 to 0.95)`. */
const factorWords = ({ orientation_factor: tof, orientation_factor_band: band }: MountResult): string[] => {
  if (tof === null) return [];
  const range = band === null ? [] : [`(${fixed(band.low, 2)} to ${fixed(band.high, 2)})`];
  return [`TOF ${fixed(tof, 2)}`, ...range];
};

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
      // A reading error is often smaller than a mark: then the mark shrinks so that the outline stays in sight.
      const small = p.box !== null && boxRoom(p.box) < 12;
      const size = small ? 8 : 90;
      return [
        ...(p.box ? boxLayers(p.name, p.box, color) : []),
        { data, mark: { type: 'point', shape, size, filled: true, opacity: 1, color, stroke: PAPER, strokeWidth: small ? 0 : 1.5 }, encoding },
      ]; // biome-ignore format: one mark
    });

const headline = (comparison: Comparison): string => {
  const { tilt_deg, azimuth_deg, irradiation_kwh_m2 } = comparison.best_orientation;
  if (!(irradiation_kwh_m2 > 0)) return 'No light falls on any fixed plane in this year';
  const best = `The best fixed plane is ${orientationWords(tilt_deg, azimuth_deg)}`;
  const known = comparison.mounts.filter((m) => isFixed(m) && m.orientation_factor !== null);
  if (known.length === 0) return best;
  const lost = (m: MountResult) => 1 - (m.orientation_factor ?? 1);
  const worst = highest(known, lost);
  if (lost(worst) >= 0.005) return `${best}; ${named(worst)} loses ${percentSize(lost(worst))}`;
  return `${best}; ${known.length > 1 ? 'every fixed mount' : named(worst)} keeps all but ${percentSize(0.005)} of its light`;
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
