import { expect, test } from 'vitest';
import { limitsInWords, limitWords } from '../../src/report/limit-words.ts';
import { programmeLimits } from '../../src/study/orientation.ts';
import { inventedSurveyed } from './invented.ts';

test('the shortfall of a programme is told in points', () => {
  // 75 - 71.2 = 3.8; 0.712 * (1 - 0.05) = 67.64 %, 68 - 67.64 = 0.36.
  const programme = { minimumTof: 0.75, minimumTsrf: 0.68 };
  const limits = programmeLimits(programme, 0.712, null, 0.05);
  expect(limits.map((l) => limitWords(l))).toEqual(['TOF below by 3.8 points', 'TSRF below by 0.4 points']);
  expect(limits.map((l) => limitWords(l, true))).toEqual([
    'TOF BELOW by 3.8 points',
    'TSRF BELOW by 0.4 points',
  ]);
  const [near] = programmeLimits(programme, 0.712, { low: 0.69, high: 0.76 }, 0);
  expect(limitWords(near)).toBe('TOF too near to tell');
  const [hair] = programmeLimits(programme, 0.74999, null, 0);
  expect(limitWords(hair)).toBe('TOF below by under 0.1 points');
  expect(limitWords({ ...limits[0], value: null })).toBe('TOF below');
});

test('the worst limit comes first, and a study without limits says so', () => {
  const [ground, roof] = inventedSurveyed().mounts;
  expect(limitsInWords(roof)).toBe('TOF below by 3.8 points, TSRF too near to tell, roof projection within');
  expect(limitsInWords({ ...ground, limits: [] })).toBe('no limit given');
});
