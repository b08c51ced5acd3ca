import { expect, test } from 'vitest';
import { type Pointing, pointDualAxis, pointFixed, pointSingleAxis } from '../../src/mounts/index.ts';
import type { SkyHours } from '../../src/sky/index.ts';
import { Worst } from '../shared/seeded.ts';
import { openLight, type TextbookSun, textbookSky, textbookSun } from '../shared/textbook-sky.ts';

const DEG = Math.PI / 180;
const MINUTES = 60;

/** No air at all: direct light 1361 (1 + 0.033 cos(360 n/365)), nothing else. */
const airless = (sun: TextbookSun, eccentric = true): SkyHours => {
  const none = new Float64Array(sun.cosZenith.length);
  const direct = sun.cosZenith.map((c, i) =>
    c > 0 ? 1361 * (eccentric ? 1 + 0.033 * Math.cos((360 * sun.dayOfYear[i] * DEG) / 365) : 1) : 0,
  );
  return {
    model: 'isotropic',
    direct,
    circumsolar: none,
    isotropic: none,
    horizon: none,
    steep: none,
    ground: none,
  };
};

const oneAxis = (sun: TextbookSun, axisAzimuthDeg: number, axisTiltDeg: number, swingDeg = 90): Pointing =>
  pointSingleAxis(sun, { kind: 'single-axis', axisAzimuthDeg, axisTiltDeg, swingDeg, rows: null });
const dualAxis = (sun: TextbookSun): Pointing => pointDualAxis(sun, { kind: 'dual-axis', rows: null });

test('without air the six mounts of five latitudes receive what geometry says', { timeout: 60_000 }, () => {
  // By the minute in another program (Python), kWh/m2: level, tilt = latitude, level axis north-south, level axis
  // east-west, axis tilted at latitude, dual axis.
  const table = [
    [0, 3637.7, 3637.7, 5714.1, 4109.2, 5714.1, 5961.2],
    [20, 3425.3, 3626.6, 5541.6, 4105.9, 5705.1, 5951.6],
    [35, 3023.2, 3596, 5228.6, 4102.3, 5696.6, 5942.5],
    [50, 2459.5, 3512.6, 4807.3, 4095.8, 5683.6, 5928.6],
    [65, 1840.8, 3144.3, 4358.2, 4072.2, 5651.8, 5894.6],
  ];
  const worst = new Worst();
  for (const [latitude, ...expected] of table) {
    const sun = textbookSun(latitude, MINUTES);
    const sky = airless(sun);
    [
      pointFixed(sun, 0, 180, null),
      pointFixed(sun, latitude, 180, null),
      oneAxis(sun, 180, 0),
      oneAxis(sun, 90, 0),
      oneAxis(sun, 180, latitude, 180),
      dualAxis(sun),
    ].forEach((pointing, i) => {
      worst.note(openLight(sun, sky, pointing, MINUTES) / expected[i] - 1, `mount ${i} at ${latitude}`);
    });
  }
  worst.print('airless years, relative');
  expect(worst.count).toBe(30);
  expect(worst.size).toBeLessThan(1e-4); // one decimal of 1,800 to 6,000 is printed; the minutes differ by rounding
});

/** Complete elliptic integral of the second kind, parameter m, by the midpoint rule (exact for periodic functions). */
const ellipticE = (m: number): number => {
  const steps = 2000;
  let sum = 0;
  for (let i = 0; i < steps; i++)
    sum += Math.sqrt(1 - m * Math.sin((((i + 0.5) / steps) * Math.PI) / 2) ** 2);
  return (sum * Math.PI) / 2 / steps;
};

test('at the equinox a dual axis receives pi/2 of the plane tilted at latitude, a level axis E(sin^2 latitude)', () => {
  // Abramowitz & Stegun, table 17.1 gives the integral; the three figures beside are from another program (Python).
  const figures = [
    [0, 1.570796],
    [35, 1.432291],
    [50, 1.305539],
  ];
  for (const [latitude, ratio] of figures) {
    const sun = textbookSun(latitude, MINUTES, () => 0, 1);
    const sky = airless(sun, false);
    const fixed = openLight(sun, sky, pointFixed(sun, latitude, 180, null));
    expect(ellipticE(Math.sin(latitude * DEG) ** 2)).toBeCloseTo(ratio, 6);
    // 720 midpoints: the sum of cosines is off by (pi/720)^2/24, under a millionth.
    expect(openLight(sun, sky, oneAxis(sun, 180, 0)) / fixed).toBeCloseTo(ratio, 5);
    expect(openLight(sun, sky, dualAxis(sun)) / fixed).toBeCloseTo(Math.PI / 2, 5);
  }
});

test('an axis parallel to the earth’s keeps the sun at the declination from its plane, all day and every day', () => {
  const sun = textbookSun(35);
  const { cosIncidence } = oneAxis(sun, 180, 35, 180);
  for (let step = 0, s = 0; step < sun.dayOfYear.length; step++) {
    if (sun.first[step + 1] === sun.first[step]) continue;
    const declination = 23.45 * Math.sin(((360 * (284 + sun.dayOfYear[step])) / 365) * DEG);
    expect(Math.abs(cosIncidence[s++] - Math.cos(declination * DEG))).toBeLessThan(1e-12);
  }
});

test('by the minute, the clear textbook year at latitude 35 gives the tabled truth', {
  timeout: 60_000,
}, () => {
  // Hour means from 1-minute data in another program (Python), kWh/m2. Cosines are clamped at 0.
  const sun = textbookSun(35, MINUTES);
  const sky = textbookSky(sun, 'clear');
  const worst = new Worst();
  const planes: [string, Pointing, number][] = [
    ['30 south', pointFixed(sun, 30, 180, null), 2433],
    ['30 east', pointFixed(sun, 30, 90, null), 1974.6],
    ['30 west', pointFixed(sun, 30, 270, null), 1974.6],
    ['90 east', pointFixed(sun, 90, 90, null), 1202.4],
    ['90 west', pointFixed(sun, 90, 270, null), 1202.4],
    ['one axis, swing 60', oneAxis(sun, 180, 0, 60), 2991.2],
    ['dual axis', dualAxis(sun), 3390.2],
    ['level', pointFixed(sun, 0, 0, null), 2136.8],
  ];
  for (const [name, pointing, expected] of planes)
    worst.note(openLight(sun, sky, pointing, MINUTES) / expected - 1, name);
  worst.print('minute truth of the clear textbook year, relative');
  expect(worst.count).toBe(8);
  expect(worst.size).toBeLessThan(1e-4);
});
