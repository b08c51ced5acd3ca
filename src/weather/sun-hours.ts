/** The sun over the 8,760 hours of a year, as weather needs it. The caller works it out: `sun` lies above this folder. */
export interface SunHours {
  /** Mean cosine of the zenith over the sunlit part of each hour; 0 in hours without sun. */
  readonly cosZenith: Float64Array;
  /** Share of each hour that the sun is up, 0..1. */
  readonly sunlit: Float64Array;
  /** Extraterrestrial normal irradiance, W/m2. */
  readonly extraterrestrialWm2: Float64Array;
}
