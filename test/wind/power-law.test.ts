import fc from 'fast-check';
import { expect, test } from 'vitest';
import { powerLawFactor, windAtHeight } from '../../src/wind/index.ts';

test('5 m/s at 10 m is 3.973 m/s at 2 m, and 3.624 over rougher ground', () => {
  // worked out independently by script, check values section 7.1
  expect(windAtHeight(5, 2)).toBeCloseTo(3.973, 3);
  expect(windAtHeight(5, 2, 0.2)).toBeCloseTo(3.624, 3);
});

test('the factor is 1 at 10 m, 0 at the ground, and rises with height', () => {
  expect(powerLawFactor(10)).toBe(1);
  expect(powerLawFactor(0)).toBe(0);
  const height = fc.double({ min: 0.01, max: 200, noNaN: true });
  fc.assert(
    fc.property(height, height, (a, b) => {
      fc.pre(a < b);
      expect(powerLawFactor(a)).toBeLessThanOrEqual(powerLawFactor(b));
      expect(windAtHeight(7, a)).toBeCloseTo(7 * powerLawFactor(a), 12);
    }),
  );
});
