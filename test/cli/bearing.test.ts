import { describe, expect, test } from 'vitest';
import { parseLatLon } from '../../src/cli/bearing-request.ts';
import { command, tempFolder } from './support.ts';

const bearing = async (...args: string[]) => {
  const { code, out, err } = await command(tempFolder(), 'bearing', ...args);
  expect([code, err]).toEqual([0, '']);
  return out;
};
const facts = async (...args: string[]) => JSON.parse(await bearing(...args, '--json'));

describe('bearing turns magnetic to true and back, with the sum written out', () => {
  // Common practice, no source: the sums that are taught for the field.
  test.each([
    [['150', '--declination', '16 E'], '150 + 16 E = 166 true, south-south-east'],
    [['180', '--to', 'magnetic', '--declination', '17.5 E'], '180 true - 17.5 E = 162.5 magnetic'],
    [['135', '--declination', '13 W'], '135 - 13 W = 122 true, east-south-east'],
    [['180', '--to', 'magnetic', '--declination', '7 W'], '180 true + 7 W = 187 magnetic'],
    [['350', '--declination', '16E'], '350 + 16 E = 366 = 6 true, north'],
  ])('%j gives %s', async (args, first) => {
    expect((await bearing(...args)).split('\n')[0]).toBe(first);
  });

  test('by the model it shows the declination with its side, its change, its uncertainty, model and date', async () => {
    const out = await bearing('150', '--at', '45.6,-121.2', '--dated', '2026-05-01');
    const flowing = out.replace(/\s+/g, ' ');
    expect(out).toMatch(/^150 \+ 14\.\d+ E = 164\.\d+ true, south-south-east$/m);
    expect(flowing).toMatch(/14\.\d+ degrees east at 45\.60 N 121\.20 W on 2026-05-01, by WMM2025/);
    expect(flowing).toMatch(/0\.\d+ degrees a year toward west/);
    expect(flowing).toMatch(/Uncertainty 0\.\d+ degrees, one standard deviation/);
    for (const words of ['Iron', 'phone', 'do not apply it again']) expect(out).toContain(words);
    expect(Math.max(...out.split('\n').map((line) => line.length))).toBeLessThanOrEqual(100);
  });

  test.each([[['--at=-33.9,18.4']], [['--at', '-33.9,18.4']]])(
    'a point in the south is written %j',
    async (at) => {
      const f = await facts('180', ...at, '--dated', '2026-07-02');
      expect([f.latitude_deg, f.longitude_deg]).toEqual([-33.9, 18.4]);
      // WMM2025 at Cape Town (33.92 S 18.42 E) in the middle of 2026 by two independent programs: -26.73.
      expect(f.declination_deg).toBeGreaterThan(-26.73 - 0.1);
      expect(f.declination_deg).toBeLessThan(-26.73 + 0.1);
      expect(f.true_deg).toBeCloseTo(180 + f.declination_deg, 6);
      expect(f.declination_words).toMatch(/ degrees west$/);
    },
  );

  test('there and back is where it began, across north too', async () => {
    const model = ['--at', '64.8,-147.7', '--dated', '2020-02-29'];
    for (const degrees of ['0', '0.5', '150', '350', '360']) {
      const { true_deg, model: name } = await facts(degrees, ...model);
      expect(name).toBe('WMM2020');
      const back = await facts(String(true_deg), '--to', 'magnetic', ...model);
      expect(Math.abs(((back.magnetic_deg - Number(degrees) + 540) % 360) - 180)).toBeLessThan(1e-6);
    }
  });

  test('--json has the keys of the contract, and null where a declination by hand has no model', async () => {
    const byModel = await facts('150', '--at', '45.6,-121.2', '--dated', '2026-05-01');
    const byHand = await facts('150', '--declination', '16 E');
    for (const f of [byModel, byHand])
      expect(Object.keys(f)).toEqual(
        expect.arrayContaining([
          'declination_deg',
          'declination_per_year_deg',
          'declination_uncertainty_deg',
          'magnetic_deg',
          'true_deg',
          'model',
        ]),
      );
    expect(byModel.model).toBe('WMM2025');
    expect(byModel.declination_per_year_deg).toBeLessThan(0);
    // The error model published with WMM2025 gives 0.26 at least, and this far from the poles under 0.6.
    expect(byModel.declination_uncertainty_deg).toBeGreaterThan(0.26);
    expect(byModel.declination_uncertainty_deg).toBeLessThan(0.6);
    expect([byHand.declination_deg, byHand.magnetic_deg, byHand.true_deg]).toEqual([16, 150, 166]);
    expect([byHand.model, byHand.declination_per_year_deg, byHand.declination_uncertainty_deg]).toEqual([
      null,
      null,
      null,
    ]);
  });
});

describe('what the bearing was taken along', () => {
  test('a bearing taken looking at the roof is turned about', async () => {
    const f = await facts('346', '--declination', '16 E', '--taken', 'looking_at');
    expect([f.true_deg, f.azimuth_deg, f.faces]).toEqual([2, 182, 'south']);
    expect(await bearing('346', '--declination', '16 E', '--taken', 'looking_at')).toContain(
      'the plane faces 182 true, south',
    );
  });

  test('a ridge is turned to its downslope side, by word or by a point of the compass', async () => {
    const ridge = ['240', '--declination', '13 W', '--taken', 'along_ridge', '--downslope'];
    for (const side of ['left', 'south', 'SE']) expect((await facts(...ridge, side)).azimuth_deg).toBe(137);
    expect((await facts(...ridge, 'right')).azimuth_deg).toBe(317);
  });

  test('two readings are averaged across north, and iron is named where they do not fit', async () => {
    const good = await facts('359', '--back', '181', '--declination', '0 E');
    expect([good.magnetic_deg, good.true_deg, good.findings]).toEqual([0, 0, []]);
    const bad = await facts('10', '--back', '196', '--declination', '16 E');
    expect([bad.magnetic_deg, bad.true_deg]).toEqual([13, 29]);
    expect(bad.findings.map(({ code }: { code: string }) => code)).toEqual(['bearings-disagree']);
    expect(await bearing('10', '--back', '196', '--declination', '16 E')).toContain('local iron');
  });
});

test('a declination by hand is held against the model where place and date allow, and serves where they do not', async () => {
  const odd = await facts('150', '--declination', '16 W', '--at', '45.6,-121.2', '--dated', '2026-05-01');
  expect(odd.findings.map(({ code }: { code: string }) => code)).toEqual(['odd-declination']);
  const old = await facts('150', '--declination', '18 E', '--at', '45.6,-121.2', '--dated', '1998-05-01');
  expect([old.true_deg, old.findings, old.model]).toEqual([168, [], null]);
});

test('the same command gives the same answer whatever the clock says: the date is part of it', async () => {
  const at = ['--at', '45.6,-121.2'];
  const [then, now] = [
    await facts('150', ...at, '--dated', '2016-05-01'),
    await facts('150', ...at, '--dated', '2026-05-01'),
  ];
  expect(then.model).toBe('WMM2015');
  // Ten years of about a tenth of a degree.
  expect(then.declination_deg - now.declination_deg).toBeGreaterThan(0.7);
});

test('a place is two numbers with a comma, a semicolon or a space between', () => {
  for (const text of ['45.6,-121.2', ' 45.6 , -121.2 ', '45.6;-121.2', '+45.6 -121.2'])
    expect(parseLatLon(text)).toEqual({ latitudeDeg: 45.6, longitudeDeg: -121.2 });
  for (const text of ['45.6', '45.6,', '45.6,west', '95,95', '45,1e2', '', '1,2,3'])
    expect(() => parseLatLon(text), text).toThrow();
});
