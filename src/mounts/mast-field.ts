/** Columns into which a square collector is cut to add up overlapping shadows; 24 keeps the shade within 2 %. */
const COLUMNS = 24;
const REACH = 2;

/**
 * Share of a square collector on a mast that is shaded by its neighbours, 0..1, when all face the sun and stand on a
 * level square grid aligned with north. Seen from the sun, the nearer collector stands lower by its distance times
 * the sine of the sun's height, so every shadow rises from the lower edge; where shadows overlap the higher counts.
 * Plain geometry; neighbours up to two masts away.
 * @param up direction cosines of the sun, above 0
 * @param gcr area of a collector over the ground of one mast
 */
export const mastFieldShade = (east: number, north: number, up: number, gcr: number): number => {
  const pitch = 1 / Math.sqrt(gcr);
  const level = Math.hypot(east, north);
  if (level === 0) return 0;
  const [e, n] = [east / level, north / level];
  const covered = new Float64Array(COLUMNS);
  for (let i = -REACH; i <= REACH; i++) {
    for (let j = -REACH; j <= REACH; j++) {
      const towards = pitch * (i * e + j * n);
      if (towards <= 0) continue;
      const height = 1 - towards * up;
      const aside = pitch * (i * n - j * e);
      if (height <= 0 || Math.abs(aside) >= 1) continue;
      for (let column = 0; column < COLUMNS; column++) {
        const x = (column + 0.5) / COLUMNS;
        if (x > aside && x < 1 + aside && height > covered[column]) covered[column] = height;
      }
    }
  }
  return covered.reduce((sum, height) => sum + height, 0) / COLUMNS;
};
