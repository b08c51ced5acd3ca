import { expect, test } from 'vitest';
import { compareMounts, surveySite } from '../../src/study.ts';
import { sampleStudy, sampleYear } from '../support/sample.ts';

test("the sun's paths have one point every ten minutes, so that counting them counts time", async () => {
  const [study, raw] = [await sampleStudy(), await sampleYear()];
  const survey = await surveySite(study, raw.place, () => Promise.reject(new Error('no file')));
  const paths = compareMounts(study, raw, survey).skyline!.sun_paths;
  // Length of the day at 40.1 N without refraction, 2 acos(-tan(lat) tan(declination)) / 15: 14.83, 12.05 and 9.17 hours.
  const hours = { '21 June': 14.83, '21 March': 12.05, '21 December': 9.17 } as Record<string, number>;
  expect(paths).toHaveLength(3);
  for (const { name, elevations_deg } of paths)
    expect(Math.abs(elevations_deg.length / 6 - hours[name])).toBeLessThan(0.25); // a step at either end
});
