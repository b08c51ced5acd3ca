import { beforeAll, expect, test } from 'vitest';
import { compareMounts, surveySite } from '../../src/study.ts';
import type { RawYear } from '../../src/weather/index.ts';
import { sampleYear, studyFrom } from '../support/sample.ts';

let raw: RawYear;
beforeAll(async () => {
  raw = await sampleYear();
});

test('a height so near its limit that the reading error of the tilt decides is too near to tell', async () => {
  // By hand: 0.6 + 3.66 sin 30 = 2.43 m; 3.66 cos 30 x 3 degrees = 0.166 m either way: 2.45 m lies within, 2.8 m does not.
  const heightLimit = async (limit: number) => {
    const study = await studyFrom(`
weather: { file: x }
mounts: [ { id: rack, kind: fixed-tilt, slope: { reading: 30 deg, error: 3 }, azimuth: 180, slant: 3.66, lower_edge: 0.6 } ]
wind: { limits: { height: ${limit} } }`);
    const survey = await surveySite(study, raw.place, () => Promise.reject(new Error('no file')));
    return compareMounts(study, raw, survey).mounts[0].limits[0];
  };
  expect((await heightLimit(2.45)).status).toBe('within_reading_error');
  expect((await heightLimit(2.8)).status).toBe('kept');
  expect((await heightLimit(2.2)).status).toBe('broken');
});
