import { expect, test } from 'vitest';
import { HOURS, yearlySum } from '../../src/shared/index.ts';
import { planeIrradiation, skyOverHours } from '../../src/sky/index.ts';
import { relativeAirMass, sunOverHours } from '../../src/sun/index.ts';
import { everyDay, placeAt } from '../shared/invented-sky.ts';

/** Hour means of a clear sky that is the same before and after noon, from sixty samples an hour. */
const clearHours = (latitude: number) => {
  const sun = sunOverHours(placeAt(latitude), everyDay(2025), 0, 60);
  const column = () => new Float64Array(HOURS);
  const radiation = { ghi: column(), dni: column(), dhi: column() };
  for (let h = 0; h < HOURS; h++) {
    const count = sun.first[h + 1] - sun.first[h];
    for (let s = sun.first[h]; s < sun.first[h + 1]; s++) {
      const direct = 1361 * 0.7 ** (relativeAirMass((Math.acos(sun.up[s]) * 180) / Math.PI) ** 0.678);
      const share = sun.sunlit[h] / count;
      radiation.dni[h] += direct * share;
      radiation.dhi[h] += 0.1 * direct * share;
      radiation.ghi[h] += direct * (sun.up[s] + 0.1) * share;
    }
  }
  return radiation;
};

test.each([35, -35, 55])(
  'planes that face east and west receive the same under a symmetric sky at %d',
  (latitude) => {
    const radiation = clearHours(latitude);
    const split = (offsetMin: number, tilt: number) => {
      const sun = sunOverHours(placeAt(latitude), everyDay(2025), offsetMin);
      const sky = skyOverHours(sun, radiation, 0.2, 'isotropic');
      return planeIrradiation(sun, sky, tilt, 90) / planeIrradiation(sun, sky, tilt, 270) - 1;
    };
    // The equation of time averages out over the year to 0.3 minutes or so.
    expect(Math.abs(split(0, 30))).toBeLessThan(0.003);
    expect(Math.abs(split(0, 90))).toBeLessThan(0.005);
    // Half an hour of error in the clock, the sun at the label of the hour, splits them by several per cent and by sign.
    expect(Math.abs(split(30, 30))).toBeGreaterThan(0.05);
    expect(split(30, 30) * split(-30, 30)).toBeLessThan(0);
  },
);

test('four samples an hour return the level light that the hours were made from', () => {
  const radiation = clearHours(35);
  const sun = sunOverHours(placeAt(35), everyDay(2025));
  const sky = skyOverHours(sun, radiation, 0.2, 'isotropic');
  const level = planeIrradiation(sun, sky, 0, 0) / (yearlySum(radiation.ghi) / 1000) - 1;
  console.log(`level light from hour means of beam, relative: ${level.toExponential(2)}`);
  // A mean beam times a mean cosine misses that both are low together at the ends of the day.
  expect(Math.abs(level)).toBeLessThan(0.005);
});
