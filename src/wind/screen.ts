import type { MountWind } from '../shared/index.ts';
import { type EdgeGeometry, highestEdge } from './highest-edge.ts';
import { checkLimits, type LimitResult } from './limits.ts';
import type { WindSpec } from './spec.ts';
import { velocityPressure } from './velocity-pressure.ts';

/**
 * Wind screening of one mount: where its highest edge is, the pressure there, and whether it keeps its limit.
 * @param readingErrorM how far the edge may be out, either way, because an angle was read with an error
 */
export const screenWind = (
  geometry: EdgeGeometry,
  wind: WindSpec | null,
  readingErrorM = 0,
): { wind: MountWind; limits: LimitResult[] } => {
  const edge = highestEdge(geometry);
  const designGustMs = wind?.designGustMs ?? null;
  const exposure = wind?.exposure ?? null;
  const pressure =
    edge.aboveGroundM === null || designGustMs === null || exposure === null
      ? null
      : velocityPressure({ designGustMs, exposure, heightM: edge.aboveGroundM });
  return {
    wind: {
      highest_edge_m: edge.aboveGroundM,
      roof_projection_m: edge.aboveRoofM,
      velocity_pressure_pa: pressure?.pressurePa ?? null,
      kz: pressure?.kz ?? null,
      missing: [...edge.missing],
    },
    limits: checkLimits(geometry.arrangement, edge, wind?.limits ?? null, readingErrorM),
  };
};
