import { join } from 'node:path';
import { expect, test } from 'vitest';
import type { Comparison } from '../../src/index.ts';
import { describeWithWeather, realYearNames } from '../support/real-years.ts';
import { command, put, simplestStudy, tempFolder } from './support.ts';

const compare = async (weather: string, more = ''): Promise<Comparison> => {
  const file = join(process.env.TRACKWORTH_WEATHER_DIR as string, weather);
  const cwd = put(tempFolder(), { 'study.yaml': simplestStudy(file, more) });
  const { code, out, err } = await command(cwd, 'compare', 'study.yaml', '--json');
  expect([code, err]).toEqual([0, '']);
  return JSON.parse(out);
};

/** What holds wherever the sun shines. */
const expectSane = (c: Comparison): void => {
  expect(c.weather.findings.filter((f) => f.severity === 'block')).toEqual([]);
  expect(c.mounts).toHaveLength(2);
  const [ground, tracker] = c.mounts;
  for (const m of [ground, tracker]) {
    expect(m.energy_kwh_per_kw).toBeGreaterThan(300);
    // Cold modules give more than their rating: at Barrow a twelfth more.
    expect(m.energy_kwh_per_kw).toBeLessThan(1.1 * m.irradiation_kwh_m2);
  }
  // The best fixed plane collects at least what a level one does.
  expect(ground.irradiation_kwh_m2).toBeGreaterThan(0.999 * c.weather.ghi_kwh_m2);
  expect(ground.gain_over_reference).toBe(0);
};

describeWithWeather('the simplest study on real years, through the command line', () => {
  test('runs on every year there is', async () => {
    const names = realYearNames();
    expect(names.length).toBeGreaterThanOrEqual(10);
    for (const name of names) expectSane(await compare(name));
  }, 120_000);

  // Ranges: practice, computed elsewhere for unshaded mounts and for rows at GCR 0.4 (10 % at Boulder and Miami
  // backtracked against an unshaded rack, 18 % and more unshaded); half again as wide on both sides.
  test.each([
    ['CO-Boulder.tmy2.gz', 0.05, 0.27],
    ['AZ-Phoenix.tmy2.gz', 0.08, 0.34],
    ['FL-Miami.tmy2.gz', 0.05, 0.29],
  ])('%s: a tracker in rows gains between %d and %d over the rack', async (name, low, high) => {
    const [, tracker] = (await compare(name)).mounts;
    expect(tracker.gain_over_reference).toBeGreaterThan(low);
    expect(tracker.gain_over_reference).toBeLessThan(high);
  });

  test('in the north the best rack faces the south, steeper towards the pole', async () => {
    const tilts: number[] = [];
    for (const name of [
      'PI-Guam.tmy2.gz',
      'FL-Miami.tmy2.gz',
      'CO-Boulder.tmy2.gz',
      'AK-Fairbanks.tmy2.gz',
    ]) {
      const { best_orientation: best } = await compare(name);
      expect(Math.abs(best.azimuth_deg - 180)).toBeLessThan(45);
      tilts.push(best.tilt_deg);
    }
    expect(tilts).toEqual(tilts.toSorted((a, b) => a - b));
  });

  test('beyond the polar circle months without sun are zero, and the year still adds up', async () => {
    const { mounts } = await compare('700260.tmy3.gz');
    for (const m of mounts) {
      expect(m.irradiation_monthly_kwh_m2[11]).toBeLessThan(2);
      expect(m.worst_month.kwh_per_kw_day).toBeLessThan(0.1);
      expect(m.irradiation_monthly_kwh_m2.reduce((a, b) => a + b)).toBeCloseTo(m.irradiation_kwh_m2, 4);
    }
  });

  test('a place moved to the southern hemisphere turns the best rack to the north', async () => {
    // Boulder's hours under the sun of 40 S: the light is not that of a real place, so its clock and sums are not
    // judged; the beam that the file recorded now comes from the north.
    const { best_orientation: best, site } = await compare(
      'CO-Boulder.tmy2.gz',
      'site: { latitude: -40.0167 }\n',
    );
    expect(site.latitude_deg).toBe(-40.0167);
    expect(Math.min(best.azimuth_deg, 360 - best.azimuth_deg)).toBeLessThan(45);
  });
});
