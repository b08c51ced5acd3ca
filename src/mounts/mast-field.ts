/** A lower sun than this sine is taken at it: light from so low is weak, and no field is deeper than 100 collectors. */
const LOWEST_UP = 0.01;

/**
 * Share of a square collector on a mast that is shaded by its neighbours, 0..1, when all face alike and stand on a
 * level square grid aligned with north. Plain geometry, exact for collectors that have room to turn (GCR up to 0.5) and
 * face the sun, or face its azimuth at another elevation: the shadow of one ahead then lies lower by its distance
 * times up / cos(incidence). Where they cannot turn to the sun's azimuth the same is taken (assumption):
 * held 20 degrees off it, the mean shade is a hundredth of itself short of rays cast in space, at 40 degrees a tenth, at
 * 60 degrees a third.
 *
 * Seen from the sun, a collector nearer it hangs lower by its distance times the sine of the sun's height and aside by
 * its distance across; of the unit square it covers the lower part, from one side edge inwards. So taking neighbours
 * from the nearest on, what is still lit at the bottom is one gap, `left..right`, until it closes.
 * @param up direction cosines of the sun, above 0
 * @param gcr area of a collector over the ground of one mast
 * @param cosIncidence of the sun on the collectors, above 0
 */
export const mastFieldShade = (
  east: number,
  north: number,
  up: number,
  gcr: number,
  cosIncidence = 1,
): number => {
  const pitch = 1 / Math.sqrt(gcr);
  const level = Math.sqrt(east * east + north * north); // Math.hypot takes ten times as long
  const sine = Math.max(up, LOWEST_UP) / cosIncidence;
  // Neighbours stand `pitch` off or further and shade only while less than 1 aside.
  if (level === 0 || sine * sine * (pitch * pitch - 1) >= 1) return 0;
  // The grid looks alike from eight sides: turn the sun to where `ahead` is the greater component.
  const ahead = (pitch * Math.max(Math.abs(east), Math.abs(north))) / level;
  const beside = (pitch * Math.min(Math.abs(east), Math.abs(north))) / level;
  const slope = beside / ahead;
  let [left, right, shaded] = [0, 1, 0];
  // In each line of masts across, only the two on either side of the sun's direction can shade.
  let [leftLine, rightLine] = [1, 1];
  while (left < right) {
    const leftMast = Math.ceil(leftLine * slope);
    const rightMast = Math.ceil(rightLine * slope) - 1;
    const leftDistance = leftLine * ahead + leftMast * beside;
    const rightDistance = rightLine * ahead + rightMast * beside;
    const height = 1 - Math.min(leftDistance, rightDistance) * sine;
    if (height <= 0) break;
    if (leftDistance <= rightDistance) {
      const edge = Math.min(right, 1 + leftLine * beside - leftMast * ahead);
      if (edge > left) {
        shaded += (edge - left) * height;
        left = edge;
      }
      leftLine++;
    } else {
      const edge = Math.max(left, rightLine * beside - rightMast * ahead);
      if (edge < right) {
        shaded += (right - edge) * height;
        right = edge;
      }
      rightLine++;
    }
  }
  return shaded;
};
