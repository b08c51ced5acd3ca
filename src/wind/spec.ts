/** What a study says about wind. Speeds m/s, lengths m. */
export type Exposure = 'B' | 'C' | 'D';

export interface WindLimits {
  /** Greatest projection above the roof surface, m; null: not checked. */
  readonly roofProjectionM: number | null;
  /** Greatest height of the highest edge above ground, m; null: not checked. */
  readonly heightM: number | null;
}

/** When a tracker parks in wind, and how. Gusts are at 10 m; what a study leaves blank is null. */
export interface StowSpec {
  /** It parks when the gust reaches this. */
  readonly gustMs: number;
  /** Gust over hourly mean; null: {@link GUST_FACTOR}. */
  readonly gustFactor: number | null;
  /** It goes back to work once gusts have stayed below this; null: `gustMs`. */
  readonly releaseMs: number | null;
  /** For so many hours. */
  readonly holdH: number;
  /** From flat: a signed turn about a single axis (positive as for pointing), a tilt towards the equator on a mast. */
  readonly angleDeg: number;
}

export interface WindSpec {
  /** 3-second gust at 10 m from the code's map (not the wind of a weather file), m/s. */
  readonly designGustMs: number | null;
  /** No default: blank is not counted. */
  readonly exposure: Exposure | null;
  readonly limits: WindLimits;
}
