import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import type { Comparison } from '../../src/index.ts';
import { command, inventory, put, simplestStudy, tempFolder } from './support.ts';

/** The keys that are promised to readers of the JSON. They may grow in number; none may go or change its name. */
const TOP = [
  'schema', 'title', 'currency', 'reference_id', 'site', 'weather', 'best_orientation', 'mounts', 'comparisons',
  'not_counted', 'advice', 'assumptions',
]; // biome-ignore format: as in the contract
const WITHIN: Record<string, string[]> = {
  site: ['latitude_deg', 'longitude_deg', 'elevation_m', 'utc_offset_h'],
  weather: ['source', 'ghi_kwh_m2', 'dni_kwh_m2', 'dhi_kwh_m2', 'time_shift_min', 'findings'],
  best_orientation: ['tilt_deg', 'azimuth_deg', 'irradiation_kwh_m2'],
  comparisons: ['same_money', 'same_energy', 'same_land', 'own_best'],
  advice: ['choice', 'confidence', 'reasons', 'switch_points', 'doubts', 'cautions'],
};
const MOUNT = [
  'id', 'kind', 'label', 'tilt_deg', 'azimuth_deg', 'tilt_basis', 'orientation_factor', 'irradiation_kwh_m2',
  'irradiation_monthly_kwh_m2', 'beam_kwh_m2', 'sky_diffuse_kwh_m2', 'ground_reflected_kwh_m2',
  'gain_over_reference', 'dc_kw', 'ac_kw', 'modules', 'land_m2', 'energy_kwh', 'energy_kwh_per_kw', 'worst_month',
  'stages', 'weakest_stage', 'capital_per_kw', 'lcoe_per_kwh', 'lcoe_at_rates', 'break_even_premium_per_kw', 'wind',
  'limits',
]; // biome-ignore format: as in the contract

const json = async (...args: string[]): Promise<Comparison> => {
  const { code, out, err } = await command(tempFolder(), 'compare', ...args, '--json');
  expect([code, err]).toEqual([0, '']);
  return JSON.parse(out);
};

describe('compare --json', () => {
  test('prints the keys of the contract, for the sample and for the simplest study', async () => {
    const simplest = join(put(tempFolder(), { 'study.yaml': simplestStudy() }), 'study.yaml');
    for (const c of [await json('--demo'), await json(simplest)]) {
      expect(Object.keys(c)).toEqual(expect.arrayContaining(TOP));
      for (const [key, keys] of Object.entries(WITHIN))
        expect(Object.keys(c[key as keyof Comparison] as object)).toEqual(expect.arrayContaining(keys));
      expect(c.mounts.length).toBeGreaterThanOrEqual(2);
      for (const mount of c.mounts) {
        expect(Object.keys(mount)).toEqual(expect.arrayContaining(MOUNT));
        expect(mount.irradiation_monthly_kwh_m2).toHaveLength(12);
      }
    }
  });

  test('adds up: light by source, months, and the product of the stages', async () => {
    const { mounts } = await json('--demo');
    expect(mounts.map((m) => m.id)).toEqual(['roof', 'ground', 'tracker', 'mast']);
    for (const m of mounts) {
      const parts = m.beam_kwh_m2 + m.sky_diffuse_kwh_m2 + m.ground_reflected_kwh_m2;
      const months = m.irradiation_monthly_kwh_m2.reduce((a, b) => a + b);
      const chain = m.stages.reduce((kwh, { efficiency }) => kwh * efficiency, m.irradiation_kwh_m2);
      // The file carries 10 significant digits; a chain of ten such numbers is good to about 1e-9.
      expect(parts / m.irradiation_kwh_m2).toBeCloseTo(1, 8);
      expect(months / m.irradiation_kwh_m2).toBeCloseTo(1, 8);
      expect(chain / m.energy_kwh_per_kw).toBeCloseTo(1, 8);
    }
  });

  test('writes no report of its own accord', async () => {
    const cwd = put(tempFolder(), { 'study.yaml': simplestStudy() });
    const before = inventory(cwd);
    expect((await command(cwd, 'compare', 'study.yaml', '--json')).code).toBe(0);
    expect(inventory(cwd)).toEqual(before);
  });

  test('with --out prints the very bytes of results.json, and says on the side where the report is', async () => {
    const cwd = put(tempFolder(), { 'study.yaml': simplestStudy() });
    const { code, out, err } = await command(
      cwd,
      'compare',
      'study.yaml',
      '--json',
      '--no-charts',
      '--out',
      'r',
    );
    expect([code, err]).toEqual([0, 'Report written: r/memo.md\n']);
    expect(readFileSync(join(cwd, 'r/results.json'), 'utf8')).toBe(out);
  });

  test('is the same from whatever folder it is run', async () => {
    const cwd = put(tempFolder(), {
      'deep/study.yaml': simplestStudy('../year.epw'),
      'year.epw': readFileSync(join(import.meta.dirname, '../../sample-data/orlin.epw')),
    });
    const outer = await command(cwd, 'compare', 'deep/study.yaml', '--json');
    const inner = await command(join(cwd, 'deep'), 'compare', 'study.yaml', '--json');
    expect(outer.code).toBe(0);
    expect(inner).toEqual(outer);
    expect(JSON.parse(outer.out).weather.source).toBe('../year.epw');
  });

  test('of a year with a clock an hour off chooses nothing, and still gives its numbers with exit code 0', async () => {
    const wrong = 'site: { utc_offset: -6 }\n';
    const cwd = put(tempFolder(), { 'study.yaml': simplestStudy(undefined, wrong) });
    const { code, out } = await command(cwd, 'compare', 'study.yaml', '--json');
    const c: Comparison = JSON.parse(out);
    expect(code).toBe(0);
    expect(c.advice.choice).toBeNull();
    expect(c.weather.findings.map((f) => f.severity)).toContain('block');
    expect(c.weather.time_shift_min).toBeGreaterThan(45);
    expect(c.mounts.every((m) => m.energy_kwh_per_kw > 1000)).toBe(true);
  });
});
