/** Scale height of the atmosphere's pressure, m (7.4 to 8.4 km are in use; only the order matters here). */
const SCALE_HEIGHT_M = 8434;
/** Above the mean clear sky of the formula: dry air and bright cloud. trackworth's choice; see test/weather/clock.test.ts. */
const MARGIN = 1.1;

/**
 * What a clear sky gives at most on the horizontal, W/m2, at a low sun: 1098 cos z exp(-0.057 / cos z), Haurwitz 1945,
 * Insolation in relation to cloudiness and cloud density, Journal of Meteorology 2, 154-166, widened by a tenth. The
 * exponent, extinction along the way through the air, shrinks with the air above the site.
 *
 * @param cosZenith 0..1; 0 gives 0
 * @param elevationM above sea level
 */
export const clearSkyLimitWm2 = (cosZenith: number, elevationM: number): number =>
  cosZenith <= 0
    ? 0
    : MARGIN * 1098 * cosZenith * Math.exp((-0.057 * Math.exp(-elevationM / SCALE_HEIGHT_M)) / cosZenith);
