import type { SunHours } from '../sun/index.ts';

/**
 * Where a plane points and what its neighbours take, for every sample of the sun. One shape for every kind of
 * mount, fixed or tracking: to add a kind, fill one of these.
 */
export interface Pointing {
  /** Cosine of the angle of incidence; below 0 the sun is behind the plane. */
  readonly cosIncidence: Float64Array;
  readonly cosTilt: Float64Array;
  readonly sinTilt: Float64Array;
  /** The way the plane faces in one sample, true azimuth 0..360; asked only where a skyline hides part of the sky. */
  readonly azimuthDegAt: (sample: number) => number;
  /** Set where there are rows. */
  readonly neighbours: Neighbours | null;
}

/** What the other rows take from a plane, per sample; shares 0..1. */
export interface Neighbours {
  /** Share of the plane in their shade. */
  readonly shaded: Float64Array;
  /** Share of the open plane's view of the sky that they leave. */
  readonly skyLeft: Float64Array;
  /** Share of the open plane's view of the ground that they leave. */
  readonly groundLeft: Float64Array;
}

/**
 * Columns to fill. Fresh memory costs more than the arithmetic here, so a caller that is done with a pointing of the
 * same sun may hand it over as `used`; its columns are then written over.
 */
export const emptyPointing = (
  sun: SunHours,
  withRows: boolean,
  azimuthDegAt: Pointing['azimuthDegAt'],
  used: Pointing | null = null,
): Pointing => {
  const column = () => new Float64Array(sun.up.length);
  const { cosIncidence, cosTilt, sinTilt } = used ?? {
    cosIncidence: column(),
    cosTilt: column(),
    sinTilt: column(),
  };
  const neighbours = withRows
    ? (used?.neighbours ?? { shaded: column(), skyLeft: column(), groundLeft: column() })
    : null;
  return { cosIncidence, cosTilt, sinTilt, azimuthDegAt, neighbours };
};
