import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { field } from 'geomag';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { wrap180 } from '../../src/shared/index.ts';
import {
  type CalendarDate,
  compareDeclinations,
  declinationAt,
  declinationUncertaintyDeg,
  declinationWords,
  parseCalendarDate,
  parseDeclination,
  yearlyChangeWords,
} from '../../src/survey/index.ts';
import { seeded, Worst } from '../shared/seeded.ts';
import { codesOf, problemsOf } from './refusals.ts';

/** The day in which a moment of the official tables lies: 2027.5 is noon of 2 July. */
const dayOf = (year: number): CalendarDate => {
  const whole = Math.floor(year + 1e-6);
  const [start, end] = [Date.UTC(whole, 0, 1), Date.UTC(whole + 1, 0, 1)];
  const day = new Date(start + (year - whole) * (end - start) + 1);
  return { year: day.getUTCFullYear(), month: day.getUTCMonth() + 1, day: day.getUTCDate() };
};
const at = (latitudeDeg: number, longitudeDeg: number, date: CalendarDate, elevationM = 0) =>
  declinationAt({ latitudeDeg, longitudeDeg, elevationM, date });
const MIDDLE_2026 = { year: 2026, month: 7, day: 2 };

afterEach(() => {
  vi.useRealTimers();
});

describe('declination by the World Magnetic Model', () => {
  test('agrees with the test values of the WMM2025 technical report (NOAA and BGS)', async () => {
    const rows = [
      [2025.0, 0, 80, 0, 6521.6, 145.9, 1.28],
      [2025.0, 0, 0, 120, 39677.8, -109.6, -0.16],
      [2025.0, 0, -80, 240, 6117.5, 15751.9, 68.78],
      [2025.0, 100, 80, 0, 6216.0, 92.4, 0.85],
      [2025.0, 100, 0, 120, 37688.6, -96.2, -0.15],
      [2025.0, 100, -80, 240, 5907.6, 14780.3, 68.21],
      [2027.5, 0, 80, 0, 6500.8, 294.5, 2.59],
      [2027.5, 0, 0, 120, 39701.6, -167.4, -0.24],
      [2027.5, 0, -80, 240, 6200.7, 15730.3, 68.49],
      [2027.5, 100, 80, 0, 6196.7, 233.8, 2.16],
      [2027.5, 100, 0, 120, 37711.5, -148.7, -0.23],
      [2027.5, 100, -80, 240, 5984.0, 14760.1, 67.93],
    ];
    const [angle, intensity] = [new Worst(), new Worst()];
    for (const [year, heightKm, lat, lon, north, east, expected] of rows) {
      const found = await at(lat, lon, dayOf(year), heightKm * 1000);
      expect(found.model).toBe('WMM2025');
      angle.note(found.declinationDeg - expected, `${year} ${lat} ${lon}`);
      intensity.note(found.horizontalNt - Math.hypot(north, east), `${year} ${lat} ${lon}`);
    }
    angle.print('WMM2025 rows, degrees');
    intensity.print('WMM2025 rows, nT');
    expect(angle.count).toBe(12);
    // The table has two decimals; noon in place of midnight adds under 0.001.
    expect(angle.size).toBeLessThan(0.0065);
    expect(intensity.size).toBeLessThan(0.3);
  });

  // The official values of three models travel with the library; its own sums are not what made them.
  const table = join(import.meta.dirname, '../../node_modules/geomagnetism/test/values.csv');
  test.skipIf(!existsSync(table))(
    'agrees with every official row of three models, and refuses those in the blackout zone',
    async () => {
      const rows = readFileSync(table, 'utf8').trim().split(/\r?\n/).slice(1);
      const worst = new Worst();
      const models = new Set<string>();
      let refused = 0;
      for (const row of rows) {
        const [year, heightKm, lat, lon, , , , horizontal, , , expected] = row.split(',').map(Number);
        if (horizontal < 2000) {
          expect(await codesOf(() => at(lat, lon, dayOf(year), heightKm * 1000))).toEqual(['magnetic-pole']);
          refused++;
          continue;
        }
        const found = await at(lat, lon, dayOf(year), heightKm * 1000);
        models.add(found.model);
        worst.note(wrap180(found.declinationDeg - expected), row.slice(0, 30));
      }
      worst.print(`official rows, degrees (${refused} in the blackout zone)`);
      expect([...models].sort()).toEqual(['WMM2015', 'WMM2020', 'WMM2025']);
      expect(worst.count + refused).toBe(rows.length);
      expect(worst.count).toBeGreaterThan(200);
      // Two decimals in the table, and up to half a day where a field near the caution zone turns by 1 degree a year.
      expect(worst.size).toBeLessThan(0.01);
    },
  );

  test('agrees at nine cities in the middle of 2026 with two other programs', async () => {
    // Worked out with two libraries, both of which pass the official rows.
    const cities = [
      ['Seattle', 47.61, -122.33, 14.91],
      ['Phoenix', 33.45, -112.07, 9.65],
      ['Boston', 42.36, -71.06, -13.95],
      ['Sydney', -33.87, 151.21, 12.82],
      ['Cape Town', -33.92, 18.42, -26.73],
      ['Berlin', 52.52, 13.4, 5.14],
      ['Nairobi', -1.29, 36.82, 0.28],
      ['Santiago', -33.45, -70.67, 0.16],
      ['Tokyo', 35.68, 139.69, -7.93],
    ] as const;
    const worst = new Worst();
    for (const [city, lat, lon, expected] of cities)
      worst.note((await at(lat, lon, MIDDLE_2026)).declinationDeg - expected, city);
    worst.print('cities, degrees');
    expect(worst.count).toBe(9);
    // The coordinates of the cities are to a few hundredths of a degree.
    expect(worst.size).toBeLessThan(0.03);
  });

  test('agrees below 60 degrees of latitude with an independent program of WMM2020, its clock set to 2022', async () => {
    vi.useFakeTimers({ toFake: ['Date'], now: Date.UTC(2022, 0, 1, 12) });
    const random = seeded(3);
    const worst = new Worst();
    for (let i = 0; i < 300; i++) {
      const [lat, lon] = [-60 + 120 * random(), -180 + 360 * random()];
      const found = await at(lat, lon, { year: 2022, month: 1, day: 1 }, 1000);
      expect(found.model).toBe('WMM2020');
      worst.note(found.declinationDeg - field(lat, lon, 1).declination, `${lat} ${lon}`);
    }
    worst.print('independent WMM2020, degrees');
    expect(worst.count).toBe(300);
    // Same model; the other rounds to 0.01 and counts days its own way.
    expect(worst.size).toBeLessThan(0.011);
  });

  test('changes over a year by its yearly change', async () => {
    for (const [lat, lon] of [
      [47.6, -122.3],
      [-33.9, 18.4],
      [65, 25],
      [-70, 40],
    ]) {
      const [start, middle, end] = await Promise.all(
        [2026, 2027, 2028].map((year) => at(lat, lon, { year, month: 1, day: 1 })),
      );
      // The rate itself drifts, by far less than a thousandth of a degree a year each year.
      expect((end.declinationDeg - start.declinationDeg) / 2).toBeCloseTo(middle.perYearDeg, 3);
    }
  });

  test('takes each day by the model of its years, up to the last day of 2029', async () => {
    const days = [
      ['2015-01-01', 'WMM2015'],
      ['2018-09-17', 'WMM2015'],
      ['2018-09-18', 'WMM2015v2'],
      ['2019-12-31', 'WMM2015v2'],
      ['2020-01-01', 'WMM2020'],
      ['2024-12-31', 'WMM2020'],
      ['2025-01-01', 'WMM2025'],
      ['2029-12-31', 'WMM2025'],
    ];
    for (const [day, model] of days) expect((await at(40, -105, parseCalendarDate(day))).model).toBe(model);
    const [before, after] = await Promise.all(
      ['2029-11-12', '2029-12-31'].map((day) => at(47, -122, parseCalendarDate(day))),
    );
    expect(after.declinationDeg - before.declinationDeg).toBeCloseTo((after.perYearDeg * 49) / 365, 4);
  });

  test('refuses a date outside the models and names the covered range', async () => {
    for (const day of ['2014-12-31', '2030-01-01', '1999-06-01']) {
      const [problem, ...others] = await problemsOf(() => at(40, -105, parseCalendarDate(day)));
      expect(others).toEqual([]);
      expect(problem).toMatchObject({ code: 'date-outside-model', found: day });
      expect(problem.expected).toContain('from 2015-01-01 to 2029-12-31');
      expect(problem.fix).toContain('16 E or 16 W');
    }
  });

  test('refuses both geographic poles and the surroundings of the magnetic ones, with the reason', async () => {
    for (const lat of [90, -90])
      expect(await codesOf(() => at(lat, 0, MIDDLE_2026))).toEqual(['geographic-pole']);
    // The dip poles of 2026 by WMM2025: about 85.7 N 138 E and 63.8 S 135 E; the zone is read from the field itself.
    for (const [lat, lon] of [
      [85.7, 138],
      [-63.8, 135],
    ]) {
      const [problem] = await problemsOf(() => at(lat, lon, MIDDLE_2026));
      expect(problem.code).toBe('magnetic-pole');
      expect(problem.expected).toContain('undefined at a magnetic pole');
    }
  });

  test('warns between 2000 and 6000 nT and nowhere else', async () => {
    const seen = { weak: 0, firm: 0, none: 0 };
    for (let lat = 60; lat < 90; lat += 2) {
      const found = await at(lat, -100, MIDDLE_2026).catch(() => null);
      if (!found) seen.none++;
      else if (found.horizontalNt < 6000) {
        seen.weak++;
        expect(found.findings.map(({ code }) => code)).toEqual(['weak-horizontal-field']);
      } else {
        seen.firm++;
        expect(found.findings).toEqual([]);
      }
    }
    expect(Math.min(seen.weak, seen.firm, seen.none)).toBeGreaterThan(0);
  });

  test('has the published uncertainty', async () => {
    // sqrt(0.26^2 + (5417 / H)^2) degrees, WMM2025 technical report, with the H of three places.
    expect(declinationUncertaintyDeg(23714)).toBeCloseTo(0.346, 3);
    expect(declinationUncertaintyDeg(18799)).toBeCloseTo(0.388, 3);
    expect(declinationUncertaintyDeg(10702)).toBeCloseTo(0.569, 3);
    expect((await at(-33.92, 18.42, MIDDLE_2026)).uncertaintyDeg).toBeCloseTo(0.57, 2);
    // WMM2020: sqrt(0.26^2 + (5625 / H)^2), from memory.
    const older = await at(33.45, -112.07, { year: 2022, month: 7, day: 2 });
    expect(older.uncertaintyDeg).toBeCloseTo(Math.hypot(0.26, 5625 / older.horizontalNt), 6);
  });

  test('does not read the clock', async () => {
    const now = await at(47.6, -122.3, MIDDLE_2026);
    vi.useFakeTimers({ toFake: ['Date'], now: Date.UTC(2041, 0, 1) });
    expect(await at(47.6, -122.3, MIDDLE_2026)).toEqual(now);
  });
});

describe('a declination entered by hand', () => {
  test('is read with its side, as maps print it', () => {
    const forms: [string, number][] = [
      ['16 E', 16],
      ['16E', 16],
      ['16.5° E', 16.5],
      ['16 deg east', 16],
      ['13 W', -13],
      ['13W', -13],
      ['7 west', -7],
      ["16°30' E", 16.5],
      ['16° 30’ W', -16.5],
      ['0 W', 0],
      ['180 E', 180],
      [' 17.5  e ', 17.5],
    ];
    for (const [text, expected] of forms) expect(parseDeclination(text), text).toBe(expected);
  });

  test('is refused without its side, and the message offers both', async () => {
    for (const raw of ['16', 16, '-16', '+16', -16]) {
      const [problem] = await problemsOf(() => parseDeclination(raw));
      expect(problem.code).toBe('wrong-declination');
      expect(problem.fix).toContain('Write 16 E or 16 W');
    }
  });

  test('is refused as anything else: watts, a sign and a side, a third side, over 180', async () => {
    const wrong = [
      '13 kW',
      '13 N',
      '-16 E',
      '181 E',
      '16,5 E',
      "16°60' E",
      'E',
      'E 16',
      '',
      null,
      {},
      true,
      '16 E W',
    ];
    for (const raw of wrong)
      expect(await codesOf(() => parseDeclination(raw)), String(raw)).toEqual(['wrong-declination']);
  });

  test('is compared with the model, and an exchanged side is named', async () => {
    const boston = await at(42.36, -71.06, MIDDLE_2026);
    expect(compareDeclinations(-14.5, boston)).toBeNull();
    expect(compareDeclinations(14, boston)?.fix).toContain('exchanged');
    expect(compareDeclinations(-19, boston)).toMatchObject({ code: 'odd-declination', severity: 'warning' });
    expect(compareDeclinations(-19, boston)?.fix).not.toContain('exchanged');
  });

  test('is told in words', () => {
    expect(declinationWords(14.91)).toBe('14.9 degrees east');
    expect(declinationWords(-13)).toBe('13 degrees west');
    expect(declinationWords(-0.01)).toBe('0 degrees');
    expect(yearlyChangeWords(-0.1235)).toBe('0.12 degrees a year toward west');
    expect(yearlyChangeWords(0.001)).toBe('no change to speak of');
  });
});

test('a date is a day that exists, written year-month-day', async () => {
  expect(parseCalendarDate('2028-02-29')).toEqual({ year: 2028, month: 2, day: 29 });
  const wrong = [
    '2026-02-29',
    '2026-13-01',
    '2026-00-10',
    '01.05.2026',
    '2026-5-1',
    '',
    2026,
    null,
    '2026-05-01T10:00',
  ];
  for (const raw of wrong) expect(await codesOf(() => parseCalendarDate(raw))).toEqual(['wrong-date']);
});
