import { join } from 'node:path';
import { expect, test } from 'vitest';
import type { PlaneReport } from '../../src/cli/plane-facts.ts';
import { describeWithWeather } from '../support/real-years.ts';
import { command, tempFolder } from './support.ts';

const plane = async (year: string, tilt: string): Promise<PlaneReport> => {
  const file = join(process.env.TRACKWORTH_WEATHER_DIR as string, year);
  const options = ['--weather', file, '--tilt', tilt, '--bearing', '180', '--true', '--json'];
  const { code, out, err } = await command(tempFolder(), 'plane', ...options);
  expect([code, err]).toEqual([0, '']);
  return JSON.parse(out);
};

describeWithWeather('planes on real years', () => {
  test('the best plane of Seattle lies west of south, that of Boulder east of south', async () => {
    // Foggy mornings on Puget Sound, afternoon storms below the Rockies.
    const seattle = (await plane('WA-Seattle.tmy2.gz', '30')).best_orientation.azimuth_deg;
    const boulder = (await plane('CO-Boulder.tmy2.gz', '30')).best_orientation.azimuth_deg;
    expect(seattle).toBeGreaterThan(182);
    expect(seattle).toBeLessThan(210);
    expect(boulder).toBeLessThan(178);
    expect(boulder).toBeGreaterThan(150);
  });

  // Common practice, no source: read off the map of a place west of a wet coastal range, due south; hence 0.025.
  test.each([
    ['30', 1.0],
    ['3:12', 0.955],
    ['2:12', 0.95],
  ])('at Seattle, due south at %s, TOF is about %f', async (tilt, expected) => {
    const { orientation_factor } = await plane('WA-Seattle.tmy2.gz', tilt);
    expect(Math.abs(orientation_factor - expected)).toBeLessThan(0.025);
  });
});
