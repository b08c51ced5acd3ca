import { beforeAll, expect, test } from 'vitest';
import { cautionsFor } from '../../src/advice/cautions.ts';
import { memoMarkdown } from '../../src/report/index.ts';
import { compareMounts, planeFacts } from '../../src/study.ts';
import type { RawYear } from '../../src/weather/index.ts';
import { EXTRAS } from '../report/invented.ts';
import { sampleYear, studyFrom } from '../support/sample.ts';

let raw: RawYear;
beforeAll(async () => {
  raw = await sampleYear();
});
const study = (...mounts: string[]) =>
  studyFrom(
    `weather: { file: x }\nmounts:\n  - { id: rack, kind: fixed-tilt }\n${mounts.map((keys) => `  - { ${keys} }\n`).join('')}`,
  );
const compare = async (...mounts: string[]) => compareMounts(await study(...mounts), raw);

test('a turntable at its best tilt collects more than at any other, and stands in every output as one', async () => {
  const c = await compare(
    'id: table, kind: turntable, slant: 4, axis_height: 2',
    ...[20, 40, 50, 60, 80].map((tilt) => `id: t${tilt}, kind: turntable, tilt: ${tilt}`),
    'id: mast, kind: dual-axis',
  );
  const [rack, best] = c.mounts;
  const others = c.mounts.slice(2, 7);
  const mast = c.mounts[7];
  for (const other of others) expect(best.irradiation_kwh_m2).toBeGreaterThan(other.irradiation_kwh_m2);
  expect(best.irradiation_kwh_m2).toBeGreaterThan(rack.irradiation_kwh_m2);
  expect(best.irradiation_kwh_m2).toBeLessThan(mast.irradiation_kwh_m2);
  const tilt = best.tilt_deg!;
  expect(tilt).toBeGreaterThan(30);
  expect(best).toMatchObject({ kind: 'turntable', azimuth_deg: null, orientation_factor: null, tsrf: null });
  expect(best.tilt_basis).toBe('best: most unshaded light of the year, turning');
  expect(others[0].tilt_basis).toBe('given');
  expect(best.rows).toBe(`alone at ${Number(tilt.toFixed(1))}° tilt`);
  // 2 m to the axis, half of 4 m above it at the tilt.
  expect(best.wind.highest_edge_m).toBeCloseTo(2 + 2 * Math.sin((tilt * Math.PI) / 180), 9);
  expect(
    best.stages.reduce((p, s) => p * s.efficiency, best.irradiation_kwh_m2) / best.energy_kwh_per_kw,
  ).toBeCloseTo(1, 12);
  const memo = memoMarkdown(c, EXTRAS);
  expect(memo).toMatch(
    /\| table \| turntable \| turns about an upright axis at [\d.]+° tilt \| alone at [\d.]+° tilt/,
  );
  const blanks = c.not_counted.map(({ what }) => what);
  expect(blanks).toContain('mounts.table.drive.working');
  expect(blanks).not.toContain('wind stow of table');
  expect(c.advice.doubts.join(' ')).toContain('table is counted as a lone mast');
  expect(cautionsFor(['turntable']).join(' ')).toContain('Moving parts');
  expect(c.comparisons.same_energy.map((s) => s.tracker_id)).toContain('table');
  await expect(async () => planeFacts(await study('id: t, kind: turntable'), raw, 't')).rejects.toThrow();
});

test('a dead turntable is a fixed plane to the equator at its tilt, a mast that cannot lie flat one at its flattest', async () => {
  const dead = (stuck: string) => `drive: { working: 0, stuck: ${stuck} }`;
  const c = await compare(
    `id: t, kind: turntable, tilt: 50, ${dead('equator')}`,
    'id: f, kind: fixed-tilt, tilt: 50, azimuth: 180',
    `id: e, kind: turntable, tilt: 50, turns: { from: 40, to: 140 }, ${dead('equator')}`,
    'id: g, kind: fixed-tilt, tilt: 50, azimuth: 140',
    `id: m, kind: dual-axis, elevation: { highest: 60 }, ${dead('flat')}`,
    'id: h, kind: fixed-tilt, tilt: 30, azimuth: 180',
    `id: n, kind: dual-axis, ${dead('flat')}`,
    'id: i, kind: fixed-tilt, tilt: 0, azimuth: 180',
  );
  const energy = c.mounts.slice(1).map((m) => m.energy_kwh_per_kw);
  for (const i of [0, 2, 4, 6]) expect(energy[i] / energy[i + 1]).toBeCloseTo(1, 9);
  expect(c.mounts[1].stages.find(({ name }) => name === 'downtime')?.source).toContain('facing the equator');
});

test('a mast that cannot lie flat parks as flat as it goes, and a turntable has repair visits', async () => {
  const c = await compare(
    'id: m, kind: dual-axis, elevation: { highest: 60 }, stow: { gust: 0.01 }, drive: { working: 50 %, stuck: flat }',
    'id: s, kind: dual-axis, elevation: { highest: 60 }, stow: { gust: 0.01, angle: 30 }, drive: { working: 50 %, stuck: { tilt: 30, azimuth: 180 } }',
    'id: t, kind: turntable, tilt: 50, drive: { working: 90 %, stuck: equator, visits: 2 }',
  );
  const [m, s, t] = c.mounts.slice(1);
  expect(m.stow?.parked).toBe('as flat as it goes');
  expect(m.downtime?.stuck).toBe('as flat as it goes');
  expect(s.stow?.parked).toBe('tilted 30° to face south');
  expect(m.energy_kwh_per_kw / s.energy_kwh_per_kw).toBeCloseTo(1, 9);
  expect(t.visits_per_year).toBe(2);
  expect(t.downtime?.stuck).toBe('facing the equator');
  expect(t.stow).toBeNull();
});

test('limits of a mast cost energy, more the narrower they are, and are printed', async () => {
  const c = await compare(
    'id: free, kind: dual-axis, rows: { gcr: 0.2 }, slant: 4, axis_height: 3',
    'id: all, kind: dual-axis, rows: { gcr: 0.2 }, slant: 4, axis_height: 3, elevation: { lowest: 0, highest: 90 }',
    'id: low, kind: dual-axis, rows: { gcr: 0.2 }, slant: 4, axis_height: 3, elevation: { lowest: 30 }',
    'id: half, kind: dual-axis, rows: { gcr: 0.2 }, elevation: { lowest: 30 }, turns: { from: 90, to: 270 }',
    'id: third, kind: dual-axis, rows: { gcr: 0.2 }, elevation: { lowest: 30 }, turns: { from: 120, to: 240 }',
  );
  const [free, all, low, half, third] = c.mounts.slice(1);
  expect(all.energy_kwh_per_kw / free.energy_kwh_per_kw).toBeCloseTo(1, 9);
  const light = [free, low, half, third].map((m) => m.irradiation_kwh_m2);
  expect(light).toEqual([...light].sort((a, b) => b - a));
  expect(new Set(light).size).toBe(4);
  expect([free.wind.highest_edge_m, low.wind.highest_edge_m]).toEqual([
    expect.closeTo(5, 9),
    expect.closeTo(3 + Math.sqrt(3), 9), // 3 + 2 sin 60
  ]);
  const reach = (id: string) => c.assumptions.find(({ what }) => what === `reach of ${id}`)?.value;
  expect(reach('free')).toBeUndefined();
  expect(reach('low')).toBe('faces elevation 30 to 90 degrees, as near to the sun as that allows');
  expect(reach('half')).toMatch(
    /^faces azimuth 90 to 270 and elevation 30 to 90 degrees.*as if all faced the azimuth/,
  );
});
