import { beforeAll, expect, test } from 'vitest';
import { memoMarkdown, screenTable } from '../../src/report/index.ts';
import type { Comparison } from '../../src/shared/index.ts';
import { compareMounts } from '../../src/study.ts';
import type { RawYear } from '../../src/weather/index.ts';
import { sampleYear, studyFrom } from '../support/sample.ts';

let raw: RawYear;
beforeAll(async () => {
  raw = await sampleYear();
});

const compare = async (ground: string, tracker: string): Promise<Comparison> =>
  compareMounts(
    await studyFrom(
      `weather: { file: x }\narray: { dc: 12, inverter: 10 }\nlosses: { dirt: 2 %, cables: 1 % }\nmounts:\n` +
        `  - { id: g, kind: fixed-tilt, rows: { gcr: 0.4 }${ground} }\n` +
        `  - { id: t, kind: single-axis, rows: { gcr: 0.4 }, drive: { working: 95 %, stuck: average }, stow: { gust: 15 }${tracker} }`,
    ),
    raw,
  );
const SNOW = ', snow: { Jan: 20 %, Dec: 10 % }';

test('snow given by month is a stage of its own, and the stages still multiply', async () => {
  const [clear, under] = [await compare('', ''), await compare(SNOW, SNOW)];
  for (const [i, m] of under.mounts.entries()) {
    const product = m.stages.reduce((p, s) => p * s.efficiency, m.irradiation_kwh_m2);
    expect(product / m.energy_kwh_per_kw).toBeCloseTo(1, 9);
    expect(m.irradiation_kwh_m2).toBe(clear.mounts[i].irradiation_kwh_m2);
    const [now, before] = [m.energy_monthly_kwh_per_kw, clear.mounts[i].energy_monthly_kwh_per_kw];
    for (let month = 1; month < 11; month++) expect(now[month]).toBe(before[month]);
    // Light that snow takes may have been clipped anyway, so a month loses its share at most.
    for (const [month, share] of [[0, 0.2], [11, 0.1]] as const) {
      expect(now[month]).toBeGreaterThanOrEqual(before[month] * (1 - share) * (1 - 1e-12));
      expect(now[month]).toBeLessThan(before[month] * (1 - share / 2));
    } // biome-ignore format: short
    const stage = m.stages.findIndex((s) => s.name === 'snow');
    expect(m.stages[stage - 1].name).toBe('dirt');
    expect(m.snow?.taken_kwh_per_kw).toBeCloseTo(
      m.stages[stage - 1].kwh_per_kw_after - m.stages[stage].kwh_per_kw_after,
      9,
    );
    expect(clear.mounts[i].snow).toBeNull();
  }
});

test('the line of snow not counted goes where all mounts have it, and names those that lack it', async () => {
  const lines = async (ground: string, tracker: string) =>
    (await compare(ground, tracker)).not_counted.filter(({ what }) => what.startsWith('snow'));
  expect((await lines('', '')).map(({ what }) => what)).toEqual(['snow']);
  expect(await lines(SNOW, SNOW)).toEqual([]);
  expect(await lines(SNOW, '')).toEqual([
    {
      what: 'snow of t',
      effect: 'counted for g and not here, which flatters it; give snow for all 2 mounts',
    },
  ]);
});

test('a lead between mounts of which one has snow is not clear, and says why', async () => {
  const why = async (ground: string, tracker: string) => (await compare(ground, tracker)).advice.leads[0];
  const [alike, apart] = [await why(SNOW, SNOW), await why(SNOW, '')];
  expect(alike.why).not.toContain('snow');
  expect(apart.why).toContain('snow is counted for g and blank for t');
  expect(apart.confidence).not.toBe('clear');
});

test('the memo tells months, what snow takes, and the room below the lower edge', async () => {
  const c = await compare(`${SNOW}, lower_edge: 0.6 m`, ', snow: { Jul: 0 }');
  const memo = memoMarkdown(c, { version: '0', chartFiles: [], inputs: [] });
  const taken = c.mounts[0].snow!.taken_kwh_per_kw.toFixed(1);
  expect(memo).toContain(
    `g loses ${taken} kWh/kW a year to snow (Jan 20 %, Dec 10 %). Its lower edge is 0.6 m above ground; snow that piles up`,
  );
  expect(memo).toContain('t: none, as given.');
  expect(c.mounts[0].snow).toMatchObject({ lower_edge_m: 0.6 });
  expect(c.mounts[1].snow).toMatchObject({ lower_edge_m: null, taken_kwh_per_kw: 0 });
  expect(c.assumptions.map((a) => a.what)).toContain('snow on g, t');
  expect(screenTable(c)).not.toMatch(/undefined|NaN/);
});
