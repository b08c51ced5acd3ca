import { HOURS, type Place } from '../../src/shared/index.ts';
import { relativeAirMass, type SunHours, sunOverHours } from '../../src/sun/index.ts';
import { seeded } from './seeded.ts';

export const everyDay = (year: number): number[] => new Array<number>(365).fill(year);

/** A place on the clock of its sun. */
export const placeAt = (latitudeDeg: number): Place => ({
  latitudeDeg,
  longitudeDeg: 0,
  elevationM: 0,
  utcOffsetH: 0,
});

export interface InventedSky {
  readonly place: Place;
  readonly sun: SunHours;
  readonly radiation: { ghi: Float64Array; dni: Float64Array; dhi: Float64Array };
  readonly temperatureC: Float64Array;
  readonly windMs: Float64Array;
}

/**
 * An invented year for tests: clear-sky beam 1361 * 0.7^(m^0.678) (Meinel & Meinel 1976), dimmed by a seeded
 * cloudiness for each day and hour, diffuse light that grows with the clouds, and fog on some mornings, so that
 * east and west differ. Closure holds: global is direct times the hour's mean cosine of zenith plus diffuse.
 */
export const inventedSky = (
  latitudeDeg: number,
  seed: number,
  samplesPerHour?: number,
  calendarYear = 2019,
): InventedSky => {
  const place = placeAt(latitudeDeg);
  const sun = sunOverHours(place, everyDay(calendarYear), 0, samplesPerHour);
  // Brightness comes from the four-sample sun whatever the caller integrates with, so that only the plane's views differ.
  const bright = sunOverHours(place, everyDay(calendarYear));
  const random = seeded(seed);
  const column = () => new Float64Array(HOURS);
  const radiation = { ghi: column(), dni: column(), dhi: column() };
  const [temperatureC, windMs] = [column(), column()];
  for (let day = 0; day < 365; day++) {
    const cloudOfDay = random();
    const foggy = random() < 0.3;
    for (let hour = 0; hour < 24; hour++) {
      const h = day * 24 + hour;
      const clear = Math.max(0, Math.min(1, 1.3 - cloudOfDay * (0.6 + 1.2 * random())));
      const beamLeft = foggy && hour < 11 ? 0 : clear * clear;
      temperatureC[h] =
        12 - 12 * Math.cos((2 * Math.PI * (day - 20)) / 365) + 5 * Math.sin((hour - 9) / 3.82);
      windMs[h] = 6 * random();
      const cosZenith = bright.cosZenith[h];
      if (cosZenith <= 0) continue;
      const clearBeam = 1361 * 0.7 ** (relativeAirMass((Math.acos(cosZenith) * 180) / Math.PI) ** 0.678);
      radiation.dni[h] = clearBeam * beamLeft * bright.sunlit[h];
      radiation.dhi[h] = bright.sunlit[h] * (0.1 * clearBeam + 0.3 * clearBeam * (1 - beamLeft) * cosZenith);
      radiation.ghi[h] = radiation.dni[h] * cosZenith + radiation.dhi[h];
    }
  }
  return { place, sun, radiation, temperatureC, windMs };
};
