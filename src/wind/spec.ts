/** What a study says about wind. Speeds m/s, lengths m. */
export type Exposure = 'B' | 'C' | 'D';

export interface WindLimits {
  /** Greatest projection above the roof surface, m; null: not checked. */
  readonly roofProjectionM: number | null;
  /** Greatest height of the highest edge above ground, m; null: not checked. */
  readonly heightM: number | null;
}

export interface WindSpec {
  /** 3-second gust at 10 m from the code's map (not the wind of a weather file), m/s. */
  readonly designGustMs: number | null;
  /** No default: blank is not counted. */
  readonly exposure: Exposure | null;
  readonly limits: WindLimits;
}
