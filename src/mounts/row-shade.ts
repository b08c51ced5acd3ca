/**
 * Share of a plane that the next row shades, 0..1, for long rows of equal height and pitch. With the sun's vector cut
 * across the rows, (forward, up), the shaded share of a fixed plane of slant L and pitch P is
 *
 *     1 - P sin(ap) / (L sin(ap + tilt)),   ap the profile angle: tan(ap) = up / forward,
 *
 * and since sin(ap + tilt) is in the same ratio to cos(incidence) as sin(ap) to up, this is 1 - up / (GCR cos i)
 * without any angle. Anderson & Mikofski 2020 (NREL/TP-5K00-76626, eq. 32) give the same for trackers.
 * @param up height of the sun above the plane through the rows' axes, as a direction cosine: on level ground its `up`
 * @param cosIncidence of the sun on the shaded plane, above 0
 */
export const rowShade = (up: number, cosIncidence: number, gcr: number): number => {
  const shaded = 1 - up / (gcr * cosIncidence);
  return shaded > 0 ? Math.min(shaded, 1) : 0;
};
