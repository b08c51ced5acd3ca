/** Height above ground at which weather files give wind, by the convention of the World Meteorological Organization. */
export const REFERENCE_HEIGHT_M = 10;

/** The one-seventh power law of open, level ground; rougher ground has a larger exponent. */
export const OPEN_GROUND_EXPONENT = 1 / 7;

/**
 * Mean wind at `heightM` (above ground, 0 and up) over the mean wind at 10 m: (z / 10)^exponent. For the hourly
 * means of a weather file, to cool modules; not for gusts. Source: J. F. Manwell, J. G. McGowan & A. L. Rogers,
 * Wind Energy Explained (2009), power law profile, with the one-seventh exponent.
 */
export const powerLawFactor = (heightM: number, exponent = OPEN_GROUND_EXPONENT): number =>
  (heightM / REFERENCE_HEIGHT_M) ** exponent;

/** Mean wind at `heightM`, m/s, from the mean wind at 10 m. */
export const windAtHeight = (speed10mMs: number, heightM: number, exponent = OPEN_GROUND_EXPONENT): number =>
  speed10mMs * powerLawFactor(heightM, exponent);
