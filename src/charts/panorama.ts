import type { Direction } from './azimuth-window.ts';
import { LABEL_SIZE, type Layer, textLayer } from './frame.ts';
import { elevationOf, sunStretches } from './hidden-sun.ts';
import { type LineLabel, type Pixel, placeOnLines } from './line-labels.ts';
import { forSpec } from './numbers.ts';
import { HAIRLINE, HILL, INK, MUTED, PAPER, SUN_PATH } from './palette.ts';
import { oneLine, shorten } from './text.ts';
import { highest } from './words.ts';

interface PanoramaLine {
  readonly name: string;
  /** Cut at the borders of the panorama. */
  readonly pieces: readonly (readonly Direction[])[];
}

export interface Panorama {
  readonly width: number;
  readonly height: number;
  /** Azimuth at the left edge. */
  readonly start: number;
  /** Name of the profile that is filled and named. */
  readonly worst: string;
  readonly profiles: readonly PanoramaLine[];
  /** `label` is what stands on the line. */
  readonly paths: readonly (PanoramaLine & { readonly label: string })[];
}

/** A round number of degrees above all that is drawn, so that the highest label has room. */
const topOf = ({ profiles, paths }: Panorama): number => {
  const all = [...profiles, ...paths].flatMap((l) => l.pieces.flat().map((p) => p.elevationDeg));
  return Math.min(90, 5 * Math.ceil((Math.max(8, ...all) * 1.06) / 5));
};

/** Sun's paths behind, dashed where the skyline hides them, the skyline in front, names on their lines. */
export const panoramaLayers = (panorama: Panorama): Layer[] => {
  const top = topOf(panorama);
  const axes = axesOf(panorama.start, top);
  const worst = panorama.profiles.find((p) => p.name === panorama.worst) ?? panorama.profiles[0];
  const elevationAt = elevationOf(worst.pieces);
  const stretches = (hidden: boolean): PanoramaLine[] =>
    panorama.paths
      .map(({ name, pieces }) => ({
        name,
        pieces: pieces
          .flatMap((piece) => sunStretches(piece, elevationAt))
          .filter((stretch) => stretch.hidden === hidden)
          .map(({ points }) => points),
      }))
      .filter(({ pieces }) => pieces.length > 0);
  const line = (l: PanoramaLine, mark: Record<string, unknown>): Layer => ({
    data: { values: rowsOf(l) },
    mark: { type: 'line', strokeCap: 'round', strokeJoin: 'round', ...mark },
    encoding: { ...axes, order: { field: 'step', type: 'quantitative' }, detail: { field: 'piece', type: 'nominal' } },
  }); // biome-ignore format: one encoding
  return [
    ...stretches(false).map((p) => line(p, { color: SUN_PATH, strokeWidth: 2 })),
    hill(worst, axes),
    ...stretches(true).map((p) => line(p, { color: SUN_PATH, strokeWidth: 2, strokeDash: [2, 5] })),
    ...panorama.profiles.filter((p) => p !== worst).map((p) => line(p, { color: MUTED, strokeWidth: 1 })),
    line(worst, { color: INK, strokeWidth: 2 }),
    ...labels(panorama, worst, top),
  ];
};

/** An upright edge is two points at one azimuth: stacking, which areas do unasked, would add them up. */
const hill = (l: PanoramaLine, axes: ReturnType<typeof axesOf>): Layer => ({
  data: { values: rowsOf(l) },
  mark: { type: 'area', color: HILL, opacity: 0.72, line: false },
  encoding: {
    ...axes,
    y: { ...axes.y, stack: null },
    y2: { datum: 0 },
    detail: { field: 'piece', type: 'nominal' },
  },
});

const rowsOf = ({ name, pieces }: PanoramaLine) =>
  pieces.flatMap((points, piece) =>
    points.map((p, step) => ({
      name: oneLine(name),
      piece,
      step,
      azimuth_deg: forSpec(p.azimuthDeg),
      elevation_deg: forSpec(p.elevationDeg),
    })),
  );

const EVERY = 30;

const axesOf = (start: number, top: number) => ({
  x: {
    field: 'azimuth_deg',
    type: 'quantitative',
    scale: { domain: [start, start + 360], nice: false, zero: false },
    axis: {
      title: 'true azimuth',
      titlePadding: 10,
      grid: true,
      values: Array.from({ length: 360 / EVERY + 1 }, (_, i) => start + i * EVERY),
      // Compass letters at the quarters; azimuths west of a left edge at south run below 0.
      labelExpr: `format((datum.value + 360) % 360, 'd') + '°' + ((datum.value + 360) % 90 == 0 ? ' ' + ['N', 'E', 'S', 'W'][((datum.value + 360) % 360) / 90] : '')`,
    },
  },
  y: {
    field: 'elevation_deg',
    type: 'quantitative',
    scale: { domain: [0, top], nice: false },
    axis: {
      title: 'elevation above level',
      titlePadding: 8,
      grid: true,
      gridColor: HAIRLINE,
      values: elevationTicks(top),
      labelExpr: "format(datum.value, 'd') + '°'",
    },
  },
});

const elevationTicks = (top: number): number[] => {
  const step = top > 45 ? 15 : top > 20 ? 10 : 5;
  return Array.from({ length: Math.floor(top / step) + 1 }, (_, i) => i * step);
};

const WORST_ROOM = 210;
/** Pixels between the points along which a label may stand. */
const SAMPLE_PX = 6;

const labels = (panorama: Panorama, worst: PanoramaLine, top: number): Layer[] => {
  const { width, height, start } = panorama;
  const toPixel = (p: Direction): Pixel => [
    ((p.azimuthDeg - start) / 360) * width,
    height * (1 - p.elevationDeg / top),
  ];
  const sampled = (l: PanoramaLine): Pixel[] => l.pieces.flatMap((piece) => dense(piece.map(toPixel)));
  const labelOfLine = (l: PanoramaLine, text: string): LineLabel => {
    const line = sampled(l);
    return { text, line, near: highest(line, (p) => -p[1]) };
  };
  const several = panorama.profiles.length > 1;
  const worstName = shorten(`worst point: ${oneLine(worst.name) || 'unnamed'}`, WORST_ROOM, LABEL_SIZE);
  // The longest name first, while there is most room.
  const wanted = [
    ...(several ? [labelOfLine(worst, worstName)] : []),
    ...panorama.paths.filter((p) => p.pieces.length > 0).map((p) => labelOfLine(p, p.label)),
  ];
  const rest = panorama.profiles.filter((p) => p !== worst || !several).map(sampled);
  const boxes = placeOnLines(wanted, [...wanted.map((w) => w.line), ...rest], LABEL_SIZE, {
    left: 2,
    right: width - 2,
    top: -18,
    bottom: height - 1,
  });
  return boxes.flatMap((box, i) => {
    const place = { x: { value: forSpec(box.x) }, y: { value: forSpec(box.y) } };
    const values = [{ text: wanted[i].text }];
    return [
      textLayer(values, place, { stroke: PAPER, strokeWidth: 4, strokeJoin: 'round' }),
      textLayer(values, place),
    ];
  });
};

/** A polyline with points at least every few pixels. */
const dense = (line: readonly Pixel[]): Pixel[] =>
  line.flatMap((to, i) => {
    if (i === 0) return [to];
    const from = line[i - 1];
    const steps = Math.max(1, Math.ceil(Math.hypot(to[0] - from[0], to[1] - from[1]) / SAMPLE_PX));
    return Array.from({ length: steps }, (_, s): Pixel => {
      const along = (s + 1) / steps;
      return [from[0] + along * (to[0] - from[0]), from[1] + along * (to[1] - from[1])];
    });
  });
