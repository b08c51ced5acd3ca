import { beforeAll, describe, expect, test } from 'vitest';
import { memoMarkdown, screenTable } from '../../src/report/index.ts';
import type { Comparison, MountResult } from '../../src/shared/index.ts';
import { compareMounts } from '../../src/study.ts';
import type { RawYear } from '../../src/weather/index.ts';
import { sampleYear, studyFrom } from '../support/sample.ts';

let raw: RawYear;
beforeAll(async () => {
  raw = await sampleYear();
});

const compare = async (tracker: string, year = raw): Promise<Comparison> =>
  compareMounts(
    await studyFrom(
      `weather: { file: x }\narray: { dc: 12, inverter: 10 }\nmounts:\n  - { id: g, kind: fixed-tilt }\n  - { id: t, ${tracker} }`,
    ),
    year,
  );
const SINGLE = 'kind: single-axis, rows: { gcr: 0.4 }';
const single = async (stow: string, year = raw): Promise<MountResult> =>
  (await compare(`${SINGLE}, stow: { ${stow} }`, year)).mounts[1];
const product = (m: MountResult) => m.stages.reduce((p, s) => p * s.efficiency, m.irradiation_kwh_m2);
const sum = (numbers: readonly number[]) => numbers.reduce((a, b) => a + b, 0);
const windy = (at: (h: number) => number): RawYear => ({
  ...raw,
  windMs: Float64Array.from({ length: 8760 }, (_, h) => at(h)),
});

describe('wind stow', () => {
  test.each([
    'gust: 15',
    'gust: 15, hold: 3 h',
    'gust: 12, release: 9, hold: 2, angle: 30, faces: west',
    'gust: 15, gust_factor: 1.8, angle: 60, faces: east',
  ])('multiplies to the energy, and its months to what it takes: %s', async (stow) => {
    const [m, without] = [await single(stow), (await compare(SINGLE)).mounts[1]];
    expect(product(m) / m.energy_kwh_per_kw).toBeCloseTo(1, 12);
    expect(m.irradiation_kwh_m2).toBe(without.irradiation_kwh_m2);
    const s = m.stow!;
    expect(s.hours).toBeGreaterThan(0);
    expect(s.daylight_hours).toBeLessThan(s.hours);
    expect(sum(s.lost_monthly_kwh_per_kw)).toBeCloseTo(s.lost_kwh_per_kw, 9);
    expect(s.lost_kwh_per_kw).toBeGreaterThan(0);
    expect(m.energy_kwh_per_kw).toBeCloseTo(without.energy_kwh_per_kw - s.lost_kwh_per_kw, 9);
    expect(m.stages.map((stage) => stage.name).slice(-2)).toEqual(['inverter ceiling', 'stow']);
  });

  test('comes before the drive and downtime, and what it takes is counted before both', async () => {
    const drive = 'drive: { own_use: 1 %, working: 90 %, stuck: flat }';
    const c = await compare(`${SINGLE}, ${drive}, stow: { gust: 15, hold: 3 }`);
    const [m, without] = [c.mounts[1], (await compare(`${SINGLE}, ${drive}`)).mounts[1]];
    expect(m.stages.map((stage) => stage.name).slice(-3)).toEqual(['stow', 'drive', 'downtime']);
    expect(product(m) / m.energy_kwh_per_kw).toBeCloseTo(1, 12);
    const taken = without.energy_kwh_per_kw - m.energy_kwh_per_kw;
    expect(taken / (m.stow!.lost_kwh_per_kw * 0.99 * 0.9)).toBeCloseTo(1, 9);
    // A dead tracker stands as it did.
    expect(m.downtime?.stuck_kwh_per_kw).toBe(without.downtime?.stuck_kwh_per_kw);
  });

  test('with a trigger that no gust reaches changes nothing but to count it', async () => {
    const [m, without] = [
      await single('gust: 110 m/s, hold: 24 h, angle: 30, faces: east'),
      (await compare(SINGLE)).mounts[1],
    ];
    expect(m.energy_kwh_per_kw).toBe(without.energy_kwh_per_kw);
    expect(m.energy_monthly_kwh_per_kw).toEqual(without.energy_monthly_kwh_per_kw);
    expect(m.stow).toMatchObject({ hours: 0, events: 0, longest_h: 0, lost_kwh_per_kw: 0 });
    expect(m.stages.find((s) => s.name === 'stow')?.efficiency).toBe(1);
  });

  test('all year flat delivers what a flat rack does, and all year turned what a rack so turned does', async () => {
    const storm = windy(() => 20);
    const flat = await single('gust: 15', storm);
    const turned = await single('gust: 15, angle: 40, faces: west', storm);
    const rack = async (keys: string) =>
      compareMounts(
        await studyFrom(
          `weather: { file: x }\narray: { dc: 12, inverter: 10 }\nmounts: [ { id: g, kind: fixed-tilt, ${keys} } ]`,
        ),
        storm,
      ).mounts[0].energy_kwh_per_kw;
    expect(flat.stow).toMatchObject({ hours: 8760, events: 1, longest_h: 8760, parked: 'flat' });
    expect(flat.energy_kwh_per_kw / (await rack('tilt: 0, azimuth: 180'))).toBeCloseTo(1, 9);
    expect(turned.stow?.parked).toBe('turned 40° to face west');
    expect(turned.energy_kwh_per_kw / (await rack('tilt: 40, azimuth: 270, rows: { gcr: 0.4 }'))).toBeCloseTo(
      1,
      9,
    );
    const mast = (await compare('kind: dual-axis, stow: { gust: 15, angle: 30 }', storm)).mounts[1];
    expect(mast.stow?.parked).toBe('tilted 30° to face south');
    expect(mast.energy_kwh_per_kw / (await rack('tilt: 30, azimuth: 180'))).toBeCloseTo(1, 9);
  });

  test('is counted hour by hour: one gusty noon a month with a hold of 3 h is 48 hours in 12 events', async () => {
    // The first hour of the afternoon of every month's tenth day gusts, all else is calm.
    const first = [0, 31, 59, 90, 120, 151, 181, 212, 243, 273, 304, 334];
    const gusty = windy((h) => (first.some((day) => h === (day + 9) * 24 + 12) ? 13 : 2));
    const [none, held] = [await single('gust: 18', gusty), await single('gust: 18, hold: 3 h', gusty)];
    expect(none.stow).toMatchObject({ hours: 12, daylight_hours: 12, events: 12, longest_h: 1 });
    expect(held.stow).toMatchObject({ hours: 48, daylight_hours: 48, events: 12, longest_h: 4 });
    // The afternoons turn away from lying flat, so the hold costs more than the trigger did.
    expect(held.stow!.lost_kwh_per_kw).toBeGreaterThan(2 * none.stow!.lost_kwh_per_kw);
    for (const month of held.stow!.lost_monthly_kwh_per_kw) expect(month).not.toBe(0);
  });

  test('costs more the longer the hold', async () => {
    const lost: number[] = [];
    for (const hold of [0, 1, 3, 6, 12])
      lost.push((await single(`gust: 15, hold: ${hold} h`)).stow!.lost_kwh_per_kw);
    for (let i = 1; i < lost.length; i++) expect(lost[i]).toBeGreaterThan(lost[i - 1]);
  });
});

describe('where wind is not known', () => {
  test('stow is not counted, with a warning, and never zero', async () => {
    const c = await compare(`${SINGLE}, stow: { gust: 15 }`, { ...raw, windMs: null });
    expect(c.mounts[1].stow).toBeNull();
    expect(c.mounts[1].stages.map((s) => s.name)).not.toContain('stow');
    const finding = c.weather.findings.find((f) => f.code === 'stow-without-wind');
    expect(finding).toMatchObject({ severity: 'warning' });
    expect(c.not_counted).toContainEqual({
      what: 'wind stow of t',
      effect: 'given, but the weather file has no wind: not counted, which is not zero',
    });
    expect(screenTable(c)).toMatch(/^Warning .*no wind/m);
  });
});

describe('what is told of stow', () => {
  test('the line of what it would cost stands only where it is blank', async () => {
    const lines = async (tracker: string) => (await compare(tracker)).not_counted.map((n) => n.what);
    expect(await lines(SINGLE)).toContain('wind stow of t');
    expect(await lines(`${SINGLE}, stow: { gust: 18 }`)).not.toContain('wind stow of t');
  });

  test('screen and memo say when it parks, how long and what that takes; the assumption is named', async () => {
    const c = await compare(`${SINGLE}, stow: { gust: 15, release: 12, hold: 3 h }`);
    const s = c.mounts[1].stow!;
    const words =
      `t parks flat when hourly wind x 1.5 reaches 15 m/s, until it has been below 12 m/s for 3 h: ${s.hours} hours ` +
      `(${s.daylight_hours} with daylight) in ${s.events} spells, the longest ${s.longest_h} h. ` +
      `That takes ${s.lost_kwh_per_kw.toFixed(1)} kWh/kW a year.`;
    const screen = screenTable(c);
    expect(screen.replace(/\s+/g, ' ')).toContain(`Stow ${words}`);
    expect(screen).toContain('Wind            Wind figures are screening only');
    const memo = memoMarkdown(c, { version: '0', chartFiles: [], inputs: [] });
    expect(memo).toContain('### Wind stow');
    expect(memo).toMatch(new RegExp(`\\| Jan +\\| +${s.lost_monthly_kwh_per_kw[0].toFixed(2)} \\|`));
    expect(c.assumptions.find((a) => a.what === 'stow of t')?.source).toMatch(/^assumption: .*gust_factor/);
  });
});
