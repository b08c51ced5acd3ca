import { beforeAll, describe, expect, test } from 'vitest';
import { type Comparison, type MountResult, wrap180 } from '../../src/shared/index.ts';
import { compareMounts, surveySite } from '../../src/study.ts';
import type { RawYear } from '../../src/weather/index.ts';
import { movedBy, sampleStudy, sampleYear, studyFrom } from '../support/sample.ts';

let raw: RawYear;
let sample: Comparison;
beforeAll(async () => {
  raw = await sampleYear();
  const study = await sampleStudy();
  sample = compareMounts(study, raw, await surveySite(study, raw.place, noFile));
});

/** The sample's skyline is written in the study. */
const noFile = () => Promise.reject(new Error('no file is read here'));

const mount = (c: Comparison, id: string) => c.mounts.find((m) => m.id === id) as MountResult;
const sum = (numbers: readonly number[]) => numbers.reduce((a, b) => a + b, 0);
const compare = async (text: string, year = raw) => compareMounts(await studyFrom(text), year);

describe('the sums of every mount close', () => {
  test('beam, sky and ground add up to the irradiation, and the months to the year', () => {
    expect(sample.mounts).toHaveLength(4);
    for (const m of sample.mounts) {
      expect(m.beam_kwh_m2 + m.sky_diffuse_kwh_m2 + m.ground_reflected_kwh_m2).toBeCloseTo(
        m.irradiation_kwh_m2,
        8,
      );
      expect(sum(m.irradiation_monthly_kwh_m2)).toBeCloseTo(m.irradiation_kwh_m2, 8);
      expect(sum(m.energy_monthly_kwh_per_kw)).toBeCloseTo(m.energy_kwh_per_kw, 8);
      expect(m.energy_kwh).toBeCloseTo(m.energy_kwh_per_kw * m.dc_kw, 8);
    }
  });

  test('the product of the stages times the irradiation is the energy', () => {
    for (const m of sample.mounts) {
      const product = m.stages.reduce((p, s) => p * s.efficiency, m.irradiation_kwh_m2);
      expect(product / m.energy_kwh_per_kw).toBeCloseTo(1, 12);
      const least = Math.min(...m.stages.map((s) => s.efficiency));
      expect(m.stages.find((s) => s.name === m.weakest_stage)?.efficiency).toBe(least);
    }
  });

  test('only counted stages are listed: a blank loss has no stage and stands under not counted', async () => {
    const c = await compare(
      'weather: { file: x }\nmounts: [ { id: a, kind: fixed-tilt }, { id: t, kind: single-axis } ]',
    );
    expect(mount(c, 'a').stages.map((s) => s.name)).toEqual(['incidence', 'heat']);
    const blanks = c.not_counted.map((n) => n.what);
    for (const what of [
      'array.inverter', 'losses.dirt', 'losses.module_spread', 'losses.cables', 'losses.conversion',
      'mounts.t.drive.working', 'mounts.t.drive.own_use', 'mounts.a.cost', 'mounts.t.cost', 'site.skyline',
    ]) expect(blanks).toContain(what); // biome-ignore format: one list
    for (const { what, effect } of c.not_counted)
      if (!what.endsWith('.cost')) expect(effect, what).toMatch(/\d/);
  });
});

describe('the reference', () => {
  const three = `
weather: { file: x }
mounts:
  - { id: roof, kind: roof-plane, tilt: 20, azimuth: 150 }
  - { id: steep, kind: fixed-tilt, tilt: 70 }
  - { id: good, kind: fixed-tilt }
  - { id: turn, kind: single-axis }`;

  test('is the ground rack that delivers most, and its own gain is exactly 0', async () => {
    const c = await compare(three);
    expect(c.reference_id).toBe('good');
    expect(mount(c, 'good').gain_over_reference).toBe(0);
    const expected = mount(c, 'turn').energy_kwh_per_kw / mount(c, 'good').energy_kwh_per_kw - 1;
    expect(mount(c, 'turn').gain_over_reference).toBeCloseTo(expected, 12);
  });

  test('is the mount that compare_with names', async () => {
    expect((await compare(`${three}\ncompare_with: roof`)).reference_id).toBe('roof');
  });

  test('is the first fixed mount where there is no ground rack', async () => {
    const c = await compare(
      'weather: { file: x }\nmounts: [ { id: t, kind: dual-axis }, { id: r, kind: roof-plane, tilt: 20, azimuth: 90 } ]',
    );
    expect(c.reference_id).toBe('r');
  });
});

describe('the clock', () => {
  const study = (weather: string) => `
weather: { file: x${weather} }
mounts: [ { id: ground, kind: fixed-tilt }, { id: tracker, kind: single-axis } ]`;

  test('of the clean sample fits the sun and blocks nothing', async () => {
    const c = await compare(study(''));
    expect(Math.abs(c.weather.time_shift_min ?? 99)).toBeLessThan(10);
    expect(c.weather.findings.filter((f) => f.severity !== 'note')).toEqual([]);
    expect(c.advice.choice).not.toBeNull();
  });

  test.each([1, -1])(
    'off by %i hour withholds the recommendation and still prints the numbers',
    async (hours) => {
      const c = await compare(study(''), movedBy(raw, hours));
      expect(c.advice.choice).toBeNull();
      expect(c.advice.confidence).toBeNull();
      expect(c.weather.time_shift_min).toBeGreaterThan(-60 * hours - 20);
      expect(c.weather.time_shift_min).toBeLessThan(-60 * hours + 20);
      expect(c.weather.findings.some((f) => f.severity === 'block')).toBe(true);
      expect(mount(c, 'tracker').energy_kwh_per_kw).toBeGreaterThan(500);
    },
  );

  test('put right by add_minutes gives the clean answer back', async () => {
    const clean = await compare(study(''));
    const mended = await compare(study(', add_minutes: -60'), movedBy(raw, 1));
    expect(mended.advice.choice).toBe(clean.advice.choice);
    // The year wraps at New Year's midnight, in the dark: every sum is the same to rounding.
    expect(
      mount(mended, 'tracker').irradiation_kwh_m2 / mount(clean, 'tracker').irradiation_kwh_m2,
    ).toBeCloseTo(1, 4);
  });

  test('accepted as it is recommends, and keeps the finding as a warning', async () => {
    const c = await compare(study(', accept_clock: true'), movedBy(raw, 1));
    expect(c.advice.choice).not.toBeNull();
    const finding = c.weather.findings.find((f) => f.code === 'clock-shift');
    expect(finding?.severity).toBe('warning');
    expect(finding?.text).toMatch(/The study accepts the clock as it is\.$/);
    // what the study has done already is not asked of it again
    expect(finding?.fix).not.toMatch(/accept_clock: true/);
  });
});

describe('places', () => {
  test('the mirrored site south of the equator gives the mirrored answer', async () => {
    const text = (site: string) => `
site: { ${site} }
weather: { file: x }
mounts: [ { id: ground, kind: fixed-tilt }, { id: tracker, kind: single-axis, rows: { gcr: 0.4 } } ]`;
    const place = (latitudeDeg: number): RawYear => ({ ...raw, place: { ...raw.place, latitudeDeg } });
    const north = await compare(text(''), place(40));
    // Half a year turns winter into summer; the sun's distance and the equation of time are not mirrored: 2 %.
    const south = await compare(text(''), movedBy(place(-40), 182 * 24));
    const fromNorth = Math.abs(wrap180(south.best_orientation.azimuth_deg));
    expect(fromNorth).toBeLessThan(30);
    expect(Math.abs(south.best_orientation.tilt_deg - north.best_orientation.tilt_deg)).toBeLessThan(3);
    expect(mount(south, 'tracker').gain_over_reference).toBeCloseTo(
      mount(north, 'tracker').gain_over_reference,
      1,
    );
    expect(south.advice.choice).toBe(north.advice.choice);
  });
});

describe('the array', () => {
  const study = (array: string) =>
    `weather: { file: x }\n${array}\nmounts: [ { id: ground, kind: fixed-tilt, rows: { gcr: 0.5 } }, { id: t, kind: dual-axis } ]`;

  test('is 1 kW without an array, and a ceiling that is not given is not counted', async () => {
    const c = await compare(study(''));
    expect([c.array.dc_kw, c.array.ac_kw, c.array.modules]).toEqual([1, null, null]);
    expect(mount(c, 'ground').land_m2).toBeNull();
  });

  test('comes in whole modules, nearest to the rating asked for', async () => {
    const c = await compare(
      study('array: { dc: 12 kW, inverter: 10 kW, module: { power: 430, length: 1.76, width: 1.13 } }'),
    );
    expect([c.array.modules, c.array.dc_kw]).toEqual([28, 12.04]); // 12000 / 430 = 27.9
    expect(mount(c, 'ground').land_m2).toBeCloseTo((28 * 1.76 * 1.13) / 0.5, 9);
  });

  test('a smaller inverter takes more from a tracker than from a rack, and the fixed array instead may be out of reach', async () => {
    const c = await compare(study('array: { dc: 12, inverter: 6 }'));
    const ceiling = (id: string) =>
      mount(c, id).stages.find((s) => s.name === 'inverter ceiling')?.efficiency ?? 1;
    expect(ceiling('t')).toBeLessThan(ceiling('ground'));
    const [same] = c.comparisons.same_energy;
    expect(same.tracker_id).toBe('t');
    if (same.reachable) expect(same.energy_kwh).toBeGreaterThanOrEqual(same.target_kwh * (1 - 1e-6));
    else expect(same.energy_kwh).toBeLessThan(same.target_kwh);
  });
});

test('a global-only year is split, flagged and doubted', async () => {
  const nothing = new Float64Array(8760).fill(Number.NaN);
  const globalOnly: RawYear = {
    ...raw, dni: nothing, dhi: nothing, origin: { ghi: 'given', dni: 'missing', dhi: 'missing' },
  }; // biome-ignore format: one record
  const c = await compare(
    'weather: { file: x }\nmounts: [ { id: g, kind: fixed-tilt }, { id: t, kind: single-axis } ]',
    globalOnly,
  );
  expect(c.weather.dni_kwh_m2).toBeGreaterThan(500);
  expect(c.advice.doubts.join(' ')).toMatch(/split from global/);
  expect(c.weather.findings.some((f) => f.code === 'global-only')).toBe(true);
});

test('an albedo asked of a file that has none is an error, not a silent 0.2', async () => {
  const study = await studyFrom(
    'weather: { file: x }\nsky: { albedo: file }\nmounts: [ { id: g, kind: fixed-tilt } ]',
  );
  expect(() => compareMounts(study, { ...raw, albedo: null })).toThrow(
    /sky\.albedo.*none in the weather file/,
  );
});

test('the comparison changes nothing that it was given', async () => {
  const study = await sampleStudy();
  const before = [raw.ghi.slice(), raw.dni.slice(), JSON.stringify(study)];
  compareMounts(study, raw, await surveySite(study, raw.place, noFile));
  expect([raw.ghi, raw.dni, JSON.stringify(study)]).toEqual(before);
});
