import type { MountResult } from '../shared/index.ts';
import { dialAxis, PX_PER_DEG } from './dial-map.ts';
import type { Layer } from './frame.ts';
import { forSpec } from './numbers.ts';
import { PAPER } from './palette.ts';
import { type DialPoint, dialPoint } from './polar-field.ts';

/** Degrees of azimuth between two points of an arc. */
const ARC_STEP_DEG = 3;

/**
 * Outline, on the dial, of the orientations that the reading errors allow: a sector of a ring, or the whole ring where
 * the azimuth may be anything; null without errors. An error that was not given counts as none, and tilt stays within
 * 0..90.
 */
export const errorBox = (m: MountResult): DialPoint[][] | null => {
  const { tilt_deg, azimuth_deg } = m;
  if (tilt_deg === null || azimuth_deg === null) return null;
  const tiltError = m.tilt_error_deg ?? 0;
  const azimuthError = Math.min(180, m.azimuth_error_deg ?? 0);
  if (!(tiltError > 0 || azimuthError > 0)) return null;
  const steps = Math.max(1, Math.ceil((2 * azimuthError) / ARC_STEP_DEG));
  const [inner, outer] = [Math.max(0, tilt_deg - tiltError), Math.min(90, tilt_deg + tiltError)].map((tilt) =>
    Array.from({ length: steps + 1 }, (_, i) =>
      dialPoint(tilt, azimuth_deg + azimuthError * ((2 * i) / steps - 1)),
    ),
  );
  return azimuthError === 180 ? [outer, inner] : [[...outer, ...inner.reverse(), outer[0]]];
};

/** Half the least extent of a box in pixels: a mark must not hide it. */
export const boxRoom = (box: readonly (readonly DialPoint[])[]): number => {
  const extent = (axis: 0 | 1) => {
    const values = box.flat().map((p) => p[axis]);
    return Math.max(...values) - Math.min(...values);
  };
  return (Math.min(extent(0), extent(1)) * PX_PER_DEG) / 2;
};

/** The outline in the mount's colour on a paler band that parts it from the map. */
export const boxLayers = (name: string, box: readonly (readonly DialPoint[])[], color: string): Layer[] => {
  const layer = (mark: Record<string, unknown>): Layer => ({
    data: {
      values: box.flatMap((line, outline) => line.map(([east, north], step) => ({ plane: name, outline, box_step: step, box_east: forSpec(east), box_north: forSpec(north) }))),
    },
    mark: { type: 'line', strokeJoin: 'miter', ...mark },
    encoding: { x: dialAxis('box_east'), y: dialAxis('box_north'), order: { field: 'box_step', type: 'quantitative' }, detail: { field: 'outline', type: 'nominal' } },
  }); // biome-ignore format: a layer
  return [layer({ color: PAPER, strokeWidth: 4, opacity: 0.85 }), layer({ color, strokeWidth: 1.6 })];
};
