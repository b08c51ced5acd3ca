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

const SPARE = 'rows: { gcr: 0.4 }';
const compare = async (mounts: string): Promise<Comparison> =>
  compareMounts(
    await studyFrom(
      `weather: { file: x }\narray: { dc: 12, inverter: 10 }\nlosses: { dirt: 2 % }\nmounts:\n${mounts}`,
    ),
    raw,
  );
const one = async (kind: string, drive: string, keys = ''): Promise<MountResult> =>
  (await compare(`  - { id: g, kind: fixed-tilt }\n  - { id: t, kind: ${kind}${keys}, drive: { ${drive} } }`))
    .mounts[1];
const single = (drive: string) => one('single-axis', drive, `, ${SPARE}`);
const fixed = async (keys: string): Promise<number> =>
  (await compare(`  - { id: g, kind: fixed-tilt, ${keys} }`)).mounts[0].energy_kwh_per_kw;
const product = (m: MountResult) => m.stages.reduce((p, s) => p * s.efficiency, m.irradiation_kwh_m2);

describe('a tracker that is down', () => {
  test.each([
    ['stuck: flat', 'flat'],
    ['stuck: average', 'where it stopped, mean over every moment of daylight'],
    ['stuck: { turn: 45, faces: east }', 'turned 45° to face east'],
    ['stuck: { turn: 45, faces: west }', 'turned 45° to face west'],
  ])('multiplies to the energy, and delivers its share of both: %s', async (stuck, words) => {
    const up = await single('own_use: 0.5 %');
    const m = await single(`own_use: 0.5 %, working: 90 %, ${stuck}`);
    const dead = m.downtime!;
    expect(dead.stuck).toBe(words);
    expect(product(m) / m.energy_kwh_per_kw).toBeCloseTo(1, 12);
    expect(m.irradiation_kwh_m2).toBe(up.irradiation_kwh_m2);
    const expected = 0.9 * up.energy_kwh_per_kw + 0.1 * dead.stuck_kwh_per_kw;
    expect(m.energy_kwh_per_kw / expected).toBeCloseTo(1, 12);
    expect(dead.kept_while_stuck).toBeCloseTo(dead.stuck_kwh_per_kw / up.energy_kwh_per_kw, 12);
    expect(dead.kept_while_stuck).toBeGreaterThan(0.5);
    expect(dead.kept_while_stuck).toBeLessThan(1);
    expect(m.stages.at(-1)).toMatchObject({
      name: 'downtime',
      source: `given share of time working; stuck ${words} else`,
    });
    expect(m.visits_per_year).toBeNull();
  });

  test('for good at a given angle delivers what a fixed rack of that angle does', async () => {
    const turned = await single('working: 0 %, stuck: { turn: 40, faces: east }');
    const rack = await fixed(`tilt: 40, azimuth: 90, ${SPARE}`);
    // Their wind is taken at the same height, so that they are cooled alike.
    expect(turned.energy_kwh_per_kw / rack).toBeCloseTo(1, 9);
    const mast = await one('dual-axis', 'working: 0 %, stuck: { tilt: 30, azimuth: 135 }');
    expect(mast.downtime?.stuck).toBe('tilted 30° to face south-east (135°)');
    expect(mast.energy_kwh_per_kw / (await fixed('tilt: 30, azimuth: 135'))).toBeCloseTo(1, 9);
  });

  test('stopped at random, keeps less than at the best of its turns and more than at the worst', async () => {
    const kept = async (stuck: string) => (await single(`working: 97 %, ${stuck}`)).downtime!.stuck_kwh_per_kw;
    const [average, flat, east] = [await kept('stuck: average'), await kept('stuck: flat'), await kept('stuck: { turn: 60, faces: east }')];
    expect(average).toBeLessThan(flat);
    expect(average).toBeGreaterThan(east);
  }); // biome-ignore format: short

  test('is listed as not counted where blank, has no figures then, and the example is still flat', async () => {
    const c = await compare(
      '  - { id: g, kind: fixed-tilt }\n  - { id: t, kind: single-axis, drive: { visits: 2 } }',
    );
    expect(c.mounts[1].downtime).toBeNull();
    expect(c.mounts[1].visits_per_year).toBe(2);
    const effects = Object.fromEntries(c.not_counted.map(({ what, effect }) => [what, effect]));
    expect(effects['mounts.t.drive.working']).toMatch(/stuck flat would cost t \d/);
    expect(effects['mounts.t.drive.visits']).toMatch(/^2 visits a year are listed, not priced/);
    expect(screenTable(c)).toContain('Downtime        t: 2 repair visits a year, listed and not priced.');
  });

  test('is told on screen and in the memo, with what it keeps', async () => {
    const c = await compare(
      '  - { id: g, kind: fixed-tilt }\n  - { id: t, kind: single-axis, drive: { working: 97.5 %, stuck: average, visits: 1 } }',
    );
    const { stuck_kwh_per_kw: kwh, kept_while_stuck: kept } = c.mounts[1].downtime!;
    const words = `it is stuck where it stopped, mean over every moment of daylight: ${Math.floor(kwh / 1000)} `;
    expect(screenTable(c).replace(/\s+/g, ' ')).toContain(`t works 97.5 % of the time; else ${words}`);
    const memo = memoMarkdown(c, { version: '0', chartFiles: [], inputs: [] });
    expect(memo).toContain('### Downtime');
    expect(memo).toContain(
      `${(kept! * 100).toFixed(1)} % of what it delivers working; 1 repair visit a year`,
    );
    expect(c.assumptions.map((a) => a.what)).toContain('downtime of t');
  });
});
