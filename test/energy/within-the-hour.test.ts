import { expect, test } from 'vitest';
import { type ChainSpec, deliver, OPEN_RACK, planeViews } from '../../src/energy/index.ts';
import {
  axisTiltOnSlope,
  type Pointing,
  pointDualAxis,
  pointFixed,
  pointSingleAxis,
  pointTurntable,
} from '../../src/mounts/index.ts';
import type { Place } from '../../src/shared/index.ts';
import { orientationMap, type SkyHours, skyOverHours } from '../../src/sky/index.ts';
import { SAMPLES_PER_HOUR, type SunHours, sunOverHours } from '../../src/sun/index.ts';
import { everyDay, inventedSky } from '../shared/invented-sky.ts';
import { Worst } from '../shared/seeded.ts';
import { describeWithWeather, realYear } from '../support/real-years.ts';

/** Half a minute either way: sixty samples, the one-minute integration that the issue asks to be compared with. */
const BY_THE_MINUTE = 60;
/** 0.1 %. */
const TOLERANCE = 1e-3;

const spec = (temperatureC: Float64Array | null, windMs: Float64Array | null): ChainSpec => ({
  ambient: { temperatureC, windMs },
  heatLoss: OPEN_RACK,
  windFactor: 0.8,
  heatPerK: -0.0035,
  losses: { dirt: 0.02, moduleSpread: 0.01, cables: 0.015, conversion: 0.035 },
  ceilingKwPerKw: 10 / 12,
  snow: null,
  drive: null,
});

/** Of `mountsOf`. */
const MOUNTS = 11;
type Mounts = Record<string, (sun: SunHours) => Pointing>;
const mountsOf = (tiltDeg: number, azimuthDeg: number, latitudeDeg: number): Mounts => {
  const axis = (axisTiltDeg: number, lowSun: 'backtrack' | 'shade') => (sun: SunHours) =>
    pointSingleAxis(sun, {
      kind: 'single-axis',
      axisAzimuthDeg: latitudeDeg >= 0 ? 180 : 0,
      axisTiltDeg,
      swingDeg: 60,
      rows: { gcr: 0.4, lowSun },
    });
  return {
    'flush roof 3:12': (sun) => pointFixed(sun, 14.036, latitudeDeg >= 0 ? 166 : 14, null),
    'best fixed plane in rows': (sun) => pointFixed(sun, tiltDeg, azimuthDeg, 0.45),
    'upright, facing east': (sun) => pointFixed(sun, 90, 90, null),
    'single axis, true tracking': axis(0, 'shade'),
    'single axis, backtracking': axis(0, 'backtrack'),
    'tilted axis, backtracking': axis(20, 'backtrack'),
    'sloping ground, backtracking': (sun) =>
      pointSingleAxis(sun, {
        kind: 'single-axis',
        axisAzimuthDeg: 180,
        axisTiltDeg: axisTiltOnSlope(8, 230, 180),
        swingDeg: 60,
        rows: { gcr: 0.4, lowSun: 'backtrack' },
        ground: { slopeDeg: 8, fallsTowardDeg: 230 },
      }),
    'lone mast': (sun) => pointDualAxis(sun, { kind: 'dual-axis', rows: null }),
    'field of masts': (sun) => pointDualAxis(sun, { kind: 'dual-axis', rows: { gcr: 0.2, lowSun: 'shade' } }),
    'mast with limits': (sun) =>
      pointDualAxis(sun, {
        kind: 'dual-axis',
        rows: { gcr: 0.2, lowSun: 'shade' },
        turns: { fromDeg: 90, toDeg: 270 },
        elevation: { lowestDeg: 15, highestDeg: 80 },
      }),
    turntable: (sun) =>
      pointTurntable(sun, { kind: 'turntable', planeTiltDeg: 50, rows: { gcr: 0.2, lowSun: 'shade' } }),
  };
};

const compareSamples = (
  place: Place,
  calendarYear: ArrayLike<number>,
  offsetMin: number,
  skyOf: (sun: SunHours) => SkyHours,
  chain: ChainSpec,
  worst: { light: Worst; energy: Worst },
  name: string,
) => {
  const [few, many] = [SAMPLES_PER_HOUR, BY_THE_MINUTE].map((samples) =>
    sunOverHours(place, calendarYear, offsetMin, samples),
  );
  // One sky for both: what is compared is the integration of the plane's views over the hour.
  const sky = skyOf(few);
  const { best } = orientationMap(few, sky, place.latitudeDeg);
  const mounts = mountsOf(best.tiltDeg, best.azimuthDeg, place.latitudeDeg);
  for (const [mount, point] of Object.entries(mounts)) {
    const [a, b] = [few, many].map((sun) => deliver(sky, planeViews(sun, point(sun)), chain));
    worst.light.note(a.irradiationKwhM2 / b.irradiationKwhM2 - 1, `${mount}, ${name}`);
    worst.energy.note(a.energyKwhPerKw / b.energyKwhPerKw - 1, `${mount}, ${name}`);
  }
};

test('four samples an hour give every mount its year within 0.1 % of one-minute integration', {
  timeout: 60_000,
}, () => {
  const worst = { light: new Worst(), energy: new Worst() };
  for (const latitude of [40, -33, 5, 63]) {
    const year = inventedSky(latitude, 100 + latitude);
    const skyOf = (sun: SunHours) => skyOverHours(sun, year.radiation, 0.2, 'perez');
    const chain = spec(year.temperatureC, year.windMs);
    compareSamples(year.place, everyDay(2019), 0, skyOf, chain, worst, `latitude ${latitude}`);
  }
  worst.light.print('light, 4 against 60 samples an hour, relative');
  worst.energy.print('energy, 4 against 60 samples an hour, relative');
  expect(worst.light.count).toBe(4 * MOUNTS);
  expect(worst.light.size).toBeLessThan(TOLERANCE);
  expect(worst.energy.size).toBeLessThan(TOLERANCE);
});

describeWithWeather('on real years', () => {
  test('four samples an hour do so too, from Alaska to Guam', { timeout: 60_000 }, async () => {
    const worst = { light: new Worst(), energy: new Worst() };
    const names = [
      'CO-Boulder.tmy2.gz',
      'AK-Fairbanks.tmy2.gz',
      'PI-Guam.tmy2.gz',
      '725650.tmy3.gz',
      '700260.tmy3.gz',
    ];
    for (const name of names) {
      const year = await realYear(name);
      const skyOf = (sun: SunHours) => skyOverHours(sun, year, 0.2, 'perez');
      const chain = spec(year.temperatureC, year.windMs);
      compareSamples(year.place, year.calendarYear, year.offsetMin, skyOf, chain, worst, name);
    }
    worst.light.print('light on real years, 4 against 60 samples an hour, relative');
    worst.energy.print('energy on real years, 4 against 60 samples an hour, relative');
    expect(worst.light.count).toBe(names.length * MOUNTS);
    expect(worst.light.size).toBeLessThan(TOLERANCE);
    expect(worst.energy.size).toBeLessThan(TOLERANCE);
  });
});
