import { beforeAll, expect, test } from 'vitest';
import { memoMarkdown } from '../../src/report/index.ts';
import { limitWords } from '../../src/report/limit-words.ts';
import { compareMounts, surveySite } from '../../src/study.ts';
import type { RawYear } from '../../src/weather/index.ts';
import { EXTRAS } from '../report/invented.ts';
import { sampleYear, studyFrom } from '../support/sample.ts';

/** Any place will do: nothing here is magnetic. */
const PLACE = { latitudeDeg: 40, longitudeDeg: -105, elevationM: 1600, utcOffsetH: -7 };

let raw: RawYear;
beforeAll(async () => {
  raw = await sampleYear();
});
const compare = async (...trackers: string[]) =>
  compareMounts(
    await studyFrom(
      `weather: { file: x }\nmounts:\n  - { id: rack, kind: fixed-tilt, rows: { gcr: 0.45 } }\n` +
        trackers
          .map((keys, i) => `  - { id: t${i}, kind: single-axis, rows: { gcr: 0.4 }, ${keys} }\n`)
          .join(''),
    ),
    raw,
  );

test('a slope steeper across the axis than its maker allows puts the tracker aside, and says by how much', async () => {
  // 20 % falling 30 degrees off the axis: 17.3 % along, 10 % across (plain geometry).
  const ground = 'ground: { slope: 20 %, falls_toward: 210 }';
  const c = await compare(
    `${ground}, slope_limits: { along: 18 %, across: 8 % }`,
    `${ground}, slope_limits: { across: 10.1 % }`,
    'slope_limits: { along: 15 % }',
    ground,
  );
  const ofSlope = c.mounts.map((m) => m.limits.filter(({ name }) => name.startsWith('slope ')));
  expect(ofSlope.map((limits) => limits.map(({ status }) => status))).toEqual([
    [],
    ['kept', 'broken'],
    ['kept'],
    ['not_checked'],
    [],
  ]);
  const [along, across] = ofSlope[1];
  expect(along).toMatchObject({ bound: 'most', excess_m: null });
  expect([along.value, along.asked, across.value, across.asked]).toEqual(
    [0.1732, 0.18, 0.1, 0.08].map((x) => expect.closeTo(x, 4)),
  );
  expect(limitWords(across)).toBe('slope across the axis exceeds by 2.0 points');
  expect(c.advice.excluded).toEqual([
    { id: 't0', why: 'slope across the axis 10 % where at most 8 % is allowed' },
  ]);
  const memo = memoMarkdown(c, EXTRAS);
  expect(memo).toContain('t0: slope across the axis 10 % where at most 8 % is allowed.');
  expect(memo).not.toMatch(/slope across the axis exceeds by [\d.]+ m\b/);
});

test('ground that falls towards the sun lifts the energy, ground that falls away takes from it, and both are named', async () => {
  const c = await compare(
    'label: level',
    'ground: { slope: 0, falls_toward: 90 }',
    'ground: { slope: 12 %, falls_toward: 180 }',
    'ground: { slope: 12 %, falls_toward: 0 }',
    'ground: { slope: 12 %, falls_toward: 90 }',
  );
  const [level, none, south, north, east] = c.mounts.slice(1).map((m) => m.energy_kwh_per_kw);
  expect(none).toBeCloseTo(level, 9);
  expect(south).toBeGreaterThan(level * 1.01);
  expect(north).toBeLessThan(level * 0.99);
  expect(Math.abs(east / level - 1)).toBeLessThan(0.02); // what the morning wins the evening loses
  const says = (what: string) => c.assumptions.find((a) => a.what === what)?.value ?? '';
  expect(says('trackers')).toBe('point exactly; level ground for t0');
  expect(says('ground of t2')).toMatch(
    /falling 6.84 degrees towards 180: axis tilt 6.84, cross-axis slope 0 /,
  );
  expect(says('ground of t3')).toMatch(/axis tilt -6.84/);
  expect(says('ground of t4')).toMatch(/axis tilt 0, cross-axis slope -6.84 /);
  expect(c.mounts[5].stages.find((s) => s.name === 'rows')?.source).toContain('Anderson & Mikofski 2020');
});

test('a dead tracker on a tilted axis lies along the axis, not level', async () => {
  const c = await compare(
    'axis: { tilt: 20 }, drive: { working: 0 %, stuck: flat }',
    'axis: { tilt: 20 }, swing: 0',
    'drive: { working: 0 %, stuck: flat }',
  );
  const [dead, still, level] = c.mounts.slice(1).map((m) => m.energy_kwh_per_kw);
  expect(dead).toBeCloseTo(still, 9);
  expect(dead).toBeGreaterThan(level * 1.05);
});

test('lying flat under an overcast sky changes overcast hours alone, and gains under an even sky', async () => {
  // Ten clear days, then only thick cloud: every hour of light after them is overcast.
  const clouded = {
    ...raw,
    dni: raw.dni.map((dni, h) => (h < 240 ? dni : 0)),
    ghi: raw.ghi.map((ghi, h) => (h < 240 ? ghi : 0.25 * ghi)),
    dhi: raw.dhi.map((dhi, h) => (h < 240 ? dhi : 0.25 * raw.ghi[h])),
  };
  const study = (model: string) =>
    studyFrom(`weather: { file: x }
sky: { model: ${model} }
site: { skyline: [ { name: a, points: [ [90, 20], [200, 20], [210, 0], [80, 0] ] }, { name: b, points: [ [90, 5], [200, 5], [210, 0], [80, 0] ] } ] }
mounts:
  - { id: t, kind: single-axis, axis: { tilt: 5 }, rows: { gcr: 0.4 } }
  - { id: c, kind: single-axis, axis: { tilt: 5 }, rows: { gcr: 0.4 }, cloudy: flat }
  - { id: f, kind: single-axis, axis: { tilt: 5 }, rows: { gcr: 0.4 }, swing: 0 }
  - { id: d, kind: single-axis, axis: { tilt: 5 }, rows: { gcr: 0.4 }, cloudy: track }
`);
  for (const model of ['isotropic', 'perez']) {
    const s = await study(model);
    const survey = await surveySite(s, PLACE, async () => '');
    const c = compareMounts(s, clouded, survey);
    const [tracking, cloudy, flat, off] = c.mounts;
    expect(off.energy_kwh_per_kw).toBe(tracking.energy_kwh_per_kw);
    expect(cloudy.energy_kwh_per_kw).toBeGreaterThan(tracking.energy_kwh_per_kw);
    // From February on there is only cloud: it is the tracker that never moves.
    for (let m = 1; m < 12; m++) {
      expect(cloudy.energy_monthly_kwh_per_kw[m]).toBeCloseTo(flat.energy_monthly_kwh_per_kw[m], 9);
      expect(cloudy.shading_monthly[m]).toBeCloseTo(flat.shading_monthly[m]!, 9);
    }
    expect(cloudy.energy_monthly_kwh_per_kw[0]).toBeGreaterThan(flat.energy_monthly_kwh_per_kw[0]);
    expect(cloudy.worst_point).toBe('a');
    expect(cloudy.stages.map(({ name }) => name)).toEqual(tracking.stages.map(({ name }) => name));
    expect(c.assumptions.find(({ what }) => what === 'overcast sky for c')?.value).toMatch(
      /^flat in the \d{4} hours/,
    );
  }
});
