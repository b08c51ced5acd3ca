import { readFileSync } from 'node:fs';
import { gzipSync } from 'node:zlib';
import { expect, test } from 'vitest';
import { command, put, SAMPLE_WEATHER, simplestStudy, tempFolder } from './support.ts';

const sample = readFileSync(SAMPLE_WEATHER, 'utf8');

test('weather shows place, components, sums by month, every finding, and what to do next, in 100 columns', async () => {
  const cwd = put(tempFolder(), { 'orlin.epw': sample });
  const { code, out, err } = await command(cwd, 'weather', 'orlin.epw');
  expect([code, err]).toEqual([0, '']);
  expect(out).toMatch(/^orlin\.epw {3}EPW/);
  expect(out).toContain('40.10 N 104.92 W, 1 600 m above sea level, standard time UTC-7 h.');
  expect(out).toContain('Nothing found that speaks against this year.');
  // The sums that sample-data/README.md states: 1,678, 1,978 and 574 kWh/m2.
  for (const [name, year] of [
    ['GHI', '1 678'],
    ['DNI', '1 978'],
    ['DHI', '574'],
  ] as const)
    expect(out).toMatch(new RegExp(`^ {2}${name} .*(\\s+\\d+){12} +${year}$`, 'm'));
  const { findings } = JSON.parse((await command(cwd, 'weather', 'orlin.epw', '--json')).out);
  expect(findings.length).toBeGreaterThan(2);
  const flowing = out.replace(/\s+/g, ' ');
  for (const { text } of findings) expect(flowing).toContain(text);
  expect(Math.max(...out.split('\n').map((line) => line.length))).toBeLessThanOrEqual(100);
});

test('weather --json carries the sums, the clock and the closure as numbers', async () => {
  const cwd = put(tempFolder(), { 'orlin.epw.gz': gzipSync(sample) });
  const { code, out } = await command(cwd, 'weather', 'orlin.epw.gz', '--json');
  expect(code).toBe(0);
  const facts = JSON.parse(out);
  expect(facts.schema).toBe('trackworth-weather-1');
  expect(facts.components).toEqual({ ghi: 'given', dni: 'given', dhi: 'given', split_from_global: false });
  for (const key of ['ghi', 'dni', 'dhi']) {
    const months: number[] = facts[`${key}_monthly_kwh_m2`];
    expect(months).toHaveLength(12);
    expect(months.reduce((a, b) => a + b)).toBeCloseTo(facts[`${key}_kwh_m2`], 5);
  }
  expect(Math.abs(facts.time_shift_min)).toBeLessThan(5);
  expect(facts.closure.rms_w_m2).toBeLessThan(1);
  expect(facts.wind_10m_ms.mean).toBeCloseTo(3.8, 1);
});

test('an hour on the clock is found and blocks, whether the offset or the label is wrong', async () => {
  const cwd = put(tempFolder(), { 'orlin.epw': sample });
  for (const [args, shift] of [
    [['--utc-offset', '-6'], 60],
    [['--utc-offset', '-8'], -60],
    [['--label', 'start'], -60],
  ] as const) {
    const { code, out } = await command(cwd, 'weather', 'orlin.epw', ...args, '--json');
    expect(code).toBe(0);
    const facts = JSON.parse(out);
    // Half a step of the label is 30 minutes: less than half of it may be missed.
    expect(Math.abs(facts.time_shift_min - shift)).toBeLessThan(10);
    expect(facts.findings[0].severity).toBe('block');
    expect((await command(cwd, 'weather', 'orlin.epw', ...args)).out).toContain('DO NOT rest a choice');
  }
});

test('a study stands for its weather, with the clock that it sets right', async () => {
  const wrong = simplestStudy('orlin.epw', 'site: { utc_offset: -6 }\n');
  const cwd = put(tempFolder(), {
    'orlin.epw': sample,
    'wrong.yaml': wrong,
    'right.yaml': wrong.replace('"orlin.epw" }', '"orlin.epw", add_minutes: 60 }'),
  });
  const severity = async (study: string) =>
    JSON.parse((await command(cwd, 'weather', study, '--json')).out).findings[0].severity;
  expect(await severity('wrong.yaml')).toBe('block');
  expect(await severity('right.yaml')).not.toBe('block');
});

test('a plain table is read through the study that names its columns', async () => {
  const rows = sample
    .split('\n')
    .slice(8, 8768)
    .map((line) => line.split(','));
  const time = (i: number) => new Date(Date.UTC(2021, 0, 1) + i * 3_600_000).toISOString().slice(0, 16);
  const csv = ['when;global', ...rows.map((cells, i) => `${time(i)};${cells[13]}`)].join('\n');
  const table =
    'weather: { file: year.csv, label: start, table: { time: when, ghi: global } }\n' +
    'site: { latitude: 40.1, longitude: -104.92, elevation: 1600, utc_offset: -7 }\nmounts: [ { id: a, kind: fixed-tilt } ]\n';
  const cwd = put(tempFolder(), { 'year.csv': csv, 'study.yaml': table });
  const { code, out } = await command(cwd, 'weather', 'study.yaml');
  expect(code).toBe(0);
  expect(out).toContain('only global light is in the file');
  expect(out).toMatch(/GHI global.* 1 678$/m);
  // the study, not the bare table, which says nothing of its columns
  expect(out).toMatch(/^Next +trackworth compare study\.yaml$/m);
  expect((await command(cwd, 'compare', 'study.yaml', '--no-charts')).code).toBe(0);
});

test('schema prints a JSON Schema with the keys of a study', async () => {
  const { code, out } = await command(tempFolder(), 'schema');
  expect(code).toBe(0);
  const schema = JSON.parse(out);
  expect(Object.keys(schema.properties)).toEqual(
    expect.arrayContaining(['title', 'weather', 'site', 'array', 'mounts']),
  );
  expect(schema.required.sort()).toEqual(['mounts', 'weather']);
});
