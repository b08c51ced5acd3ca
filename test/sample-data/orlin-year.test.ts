import { readFileSync } from 'node:fs';
import { Body, Equator, Horizon, Observer } from 'astronomy-engine';
import { beforeAll, expect, test } from 'vitest';
import { epwText } from '../../sample-data/maker/epw.ts';
import {
  CALENDAR_YEAR,
  makeSampleYear,
  ORLIN_BENCH,
  type SampleYear,
  SEED,
} from '../../sample-data/maker/sample-year.ts';
import { DAYS, HOURS, monthlySums, yearlySum } from '../../src/shared/index.ts';
import { orientationMap, skyOverHours } from '../../src/sky/index.ts';
import { sunOverHours } from '../../src/sun/index.ts';

const FILE = new URL('../../sample-data/orlin.epw', import.meta.url);
let file: string;
let year: SampleYear;
/** Sine of the unrefracted height of the sun `minutes` after the start of each hour, from astronomy-engine. */
let sinHeightAt: (h: number, minutes: number) => number;

beforeAll(() => {
  file = readFileSync(FILE, 'utf8');
  year = makeSampleYear(SEED);
  const observer = new Observer(ORLIN_BENCH.latitudeDeg, ORLIN_BENCH.longitudeDeg, ORLIN_BENCH.elevationM);
  const start = Date.UTC(CALENDAR_YEAR, 0, 1) - ORLIN_BENCH.utcOffsetH * 3_600_000;
  sinHeightAt = (h, minutes) => {
    const time = new Date(start + h * 3_600_000 + minutes * 60_000);
    const { ra, dec } = Equator(Body.Sun, time, observer, true, true);
    return Math.sin((Horizon(time, observer, ra, dec).altitude * Math.PI) / 180);
  };
});

test('rebuilding the year in memory gives the committed file, byte for byte', () => {
  // Where this fails after a change of the model: npx tsx sample-data/make-sample.ts, and look at the difference.
  expect(epwText(year) === file).toBe(true);
});

test('the file says that it is invented, names no station and stays small', () => {
  const head = file.split('\n').slice(0, 8).join('\n');
  expect(head).toMatch(
    /^LOCATION,Orlin Bench,invented place,,invented data,000000,40\.10,-104\.92,-7\.0,1600\.0\n/,
  );
  expect(head).toMatch(/\nCOMMENTS 1,INVENTED DATA/);
  expect(file.length).toBeLessThan(900_000);
});

test('the file has 8,760 rows of 35 fields, hours 1 to 24 of every date of the year in order', () => {
  const rows = file.trimEnd().split('\n').slice(8);
  expect(rows.length).toBe(HOURS);
  rows.forEach((row, h) => {
    const fields = row.split(',');
    const date = new Date(Date.UTC(CALENDAR_YEAR, 0, 1) + Math.floor(h / 24) * 86_400_000);
    expect(fields.length).toBe(35);
    expect(fields.slice(0, 4).map(Number)).toEqual([
      CALENDAR_YEAR,
      date.getUTCMonth() + 1,
      date.getUTCDate(),
      (h % 24) + 1,
    ]);
  });
});

test('global light is beam on the level plus diffuse, with the sun of an independent library', () => {
  // Five midpoints against the exact mean of a cosine over 15 degrees: within 0.03 %; the rest is rounding to whole watts.
  let [compared, worst] = [0, 0];
  for (let h = 0; h < HOURS; h++) {
    if (sinHeightAt(h, 0) <= 0 || sinHeightAt(h, 60) <= 0) continue;
    const cosZenith = [6, 18, 30, 42, 54].reduce((sum, m) => sum + sinHeightAt(h, m) / 5, 0);
    worst = Math.max(worst, Math.abs(year.ghi[h] - year.dni[h] * cosZenith - year.dhi[h]));
    compared++;
  }
  console.log(`closure: ${compared} hours, worst ${worst.toFixed(2)} W/m2`);
  expect(compared).toBeGreaterThan(3900);
  expect(worst).toBeLessThan(1);
});

test('night is dark and day is light', () => {
  let [dark, light] = [0, 0];
  for (let h = 0; h < HOURS; h++) {
    const heights = [0, 30, 60].map((m) => sinHeightAt(h, m));
    if (Math.max(...heights) < 0) {
      expect([year.ghi[h], year.dni[h], year.dhi[h]]).toEqual([0, 0, 0]);
      dark++;
    } else if (Math.min(...heights) > 0.1) {
      expect(year.ghi[h]).toBeGreaterThan(10);
      light++;
    }
  }
  expect(dark).toBeGreaterThan(3900);
  expect(light).toBeGreaterThan(3300);
});

test('for any seed diffuse never exceeds global, and no light exceeds what arrives above the air', () => {
  const sun = sunOverHours(ORLIN_BENCH, new Int16Array(DAYS).fill(CALENDAR_YEAR));
  const seeds = [1, 2, SEED, 99, 123456];
  for (const seed of seeds) {
    const { ghi, dni, dhi, windMs } = makeSampleYear(seed);
    const faults = ghi.reduce((n, g, h) => {
      const above = sun.extraterrestrialWm2[h] * sun.sunlit[h];
      const fits =
        g >= dhi[h] && dhi[h] >= 0 && dni[h] >= 0 && dni[h] <= above && g <= above * sun.cosZenith[h] + 0.5;
      return fits && windMs[h] >= 0 ? n : n + 1;
    }, 0);
    expect(faults).toBe(0);
  }
  const firstDays = seeds.map((seed) => makeSampleYear(seed).ghi.slice(0, 240).join());
  expect(new Set(firstDays).size).toBe(seeds.length);
});

test('the yearly sums are those of a sunny, dry continental site', () => {
  const [ghi, dhi] = [yearlySum(year.ghi) / 1000, yearlySum(year.dhi) / 1000];
  console.log(`Orlin Bench: GHI ${ghi.toFixed(0)} kWh/m2, diffuse share ${(dhi / ghi).toFixed(3)}`);
  expect(ghi).toBeGreaterThan(1600);
  expect(ghi).toBeLessThan(1750);
  expect(dhi / ghi).toBeGreaterThan(0.3);
  expect(dhi / ghi).toBeLessThan(0.4);
});

test('the seasons are where they belong', () => {
  const perDay = monthlySums(year.ghi).map(
    (sum, m) => sum / (1000 * new Date(Date.UTC(2021, m + 1, 0)).getUTCDate()),
  );
  // Common practice, no source: mid-latitude horizontal light in midsummer is 2.5 to 4.5 times midwinter's.
  expect(Math.min(...perDay)).toBe(perDay[11]);
  expect(Math.max(...perDay) / perDay[11]).toBeGreaterThan(2.5);
  expect(Math.max(...perDay) / perDay[11]).toBeLessThan(4.5);
  expect([5, 6]).toContain(perDay.indexOf(Math.max(...perDay)));
  const warmth = monthlySums(year.temperatureC).map(
    (sum, m) => sum / (24 * new Date(Date.UTC(2021, m + 1, 0)).getUTCDate()),
  );
  expect(Math.max(...warmth)).toBe(warmth[6]);
  expect(Math.max(warmth[0], warmth[1], warmth[11])).toBeLessThan(4);
  expect(Math.min(...year.temperatureC)).toBeGreaterThan(-25);
  expect(Math.max(...year.temperatureC)).toBeLessThan(40);
});

test('afternoons are warmer and windier than nights, and a few hours are gusty', () => {
  const meanAt = (column: Float64Array, hourOfDay: number) =>
    column.reduce((sum, x, h) => (h % 24 === hourOfDay ? sum + x / DAYS : sum), 0);
  const byHour = Array.from({ length: 24 }, (_, hour) => meanAt(year.temperatureC, hour));
  expect(byHour.indexOf(Math.max(...byHour))).toBeGreaterThanOrEqual(13);
  expect(byHour.indexOf(Math.max(...byHour))).toBeLessThanOrEqual(16);
  expect(meanAt(year.windMs, 15)).toBeGreaterThan(1.3 * meanAt(year.windMs, 3));
  const mean = yearlySum(year.windMs) / HOURS;
  const deviation = Math.sqrt(year.windMs.reduce((s, v) => s + (v - mean) ** 2, 0) / HOURS);
  expect(mean).toBeGreaterThan(3);
  expect(mean).toBeLessThan(5);
  // From memory: Justus et al. 1978, Journal of Applied Meteorology 17, 350-353: Weibull shape k = (deviation / mean)^-1.086; winds have 1.5 to 2.5.
  expect((deviation / mean) ** -1.086).toBeGreaterThan(1.4);
  expect((deviation / mean) ** -1.086).toBeLessThan(2.5);
  expect(year.windMs.filter((v) => v > 15).length).toBeGreaterThan(5);
});

test('morning fog leans winter beam to the afternoon, and summer afternoons do not undo it', () => {
  const sun = sunOverHours(ORLIN_BENCH, new Int16Array(DAYS).fill(CALENDAR_YEAR));
  // The sun is in the east before solar noon, whatever the clock says.
  const ratio = (from: number, to: number) => {
    let [morning, afternoon] = [0, 0];
    for (let h = from * 24; h < to * 24; h++) {
      for (let s = sun.first[h]; s < sun.first[h + 1]; s++) {
        const beam = (year.dni[h] * sun.up[s]) / (sun.first[h + 1] - sun.first[h]);
        if (sun.east[s] > 0) morning += beam;
        else afternoon += beam;
      }
    }
    return morning / afternoon;
  };
  expect(ratio(0, 90)).toBeLessThan(0.85);
  expect(ratio(151, 243)).toBeGreaterThan(0.95);
  expect(ratio(0, DAYS)).toBeLessThan(0.97);
});

test('the best fixed plane leans a few degrees west of south under the Perez sky', () => {
  const sun = sunOverHours(ORLIN_BENCH, new Int16Array(DAYS).fill(CALENDAR_YEAR));
  const { best } = orientationMap(sun, skyOverHours(sun, year, 0.2, 'perez'), ORLIN_BENCH.latitudeDeg);
  console.log(
    `best fixed plane: tilt ${best.tiltDeg}, azimuth ${best.azimuthDeg}, ${best.irradiationKwhM2.toFixed(0)} kWh/m2`,
  );
  expect(best.azimuthDeg).toBeGreaterThan(184);
  expect(best.azimuthDeg).toBeLessThan(192);
  expect(best.tiltDeg).toBeGreaterThan(33);
  expect(best.tiltDeg).toBeLessThan(38);
});
