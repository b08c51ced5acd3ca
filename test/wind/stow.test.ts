import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { GUST_FACTOR, stowHours } from '../../src/wind/index.ts';

const rule = { gustMs: 18, gustFactor: 1.5, releaseMs: null, holdH: 0 };
/** Parked hours as marks: # parked, . at work. */
const marks = (wind: readonly number[], over: Partial<Parameters<typeof stowHours>[1]> = {}): string =>
  [...stowHours(Float64Array.from(wind), { ...rule, ...over }).stowed].map((s) => (s ? '#' : '.')).join('');

// Worked out by hand: with factor 1.5 and a gust of 18 m/s a tracker parks from an hourly mean of 12 m/s.
const WIND = [3, 11.9, 12, 13, 8, 5, 5, 5, 14, 9, 8, 3, 3, 3, 3, 3];

describe('parked hours of a wind series with known events', () => {
  test('parks from the trigger on and works again at once, without release or hold', () => {
    expect(marks(WIND)).toBe('..##....#.......');
  });

  test('a release keeps it parked while gusts are between release and trigger', () => {
    // Release 12 m/s of gust is 8 m/s of mean: 8 x 1.5 is not below it.
    expect(marks(WIND, { releaseMs: 12 })).toBe('..###...###.....');
  });

  test.each([
    [1, '..###...##......'],
    [3, '..#####.####....'],
    [2.5, '..#####.####....'],
    [4, '..###########...'],
    [24, '..##############'],
  ])('a hold of %d h adds so many calm hours, begun ones whole', (holdH, expected) => {
    expect(marks(WIND, { holdH })).toBe(expected);
  });

  test('wind that rises over the release again starts the hold anew', () => {
    expect(marks([12, 2, 9, 2, 2, 2, 2, 2], { releaseMs: 12, holdH: 2 })).toBe('#####...');
    expect(marks([12, 2, 7, 2, 2, 2, 2, 2], { releaseMs: 12, holdH: 2 })).toBe('###.....');
    // Between release and trigger is no reason to park.
    expect(marks([9, 11, 9], { releaseMs: 12, holdH: 2 })).toBe('...');
  });

  test('counts hours, events and the longest', () => {
    const found = stowHours(Float64Array.from(WIND), { ...rule, holdH: 3 });
    expect(found).toMatchObject({ hours: 9, events: 2, longestH: 5 });
    expect(stowHours(Float64Array.from([20, 20]), rule)).toMatchObject({ hours: 2, events: 1, longestH: 2 });
  });

  test('the factor is 1.5 where it is blank', () => {
    expect(GUST_FACTOR).toBe(1.5);
    expect(marks(WIND, { gustFactor: null })).toBe(marks(WIND));
    expect(marks(WIND, { gustFactor: 1 })).toBe('................');
  });
});

describe('over any wind', () => {
  const winds = fc.array(fc.double({ min: 0, max: 30, noNaN: true }), { minLength: 1, maxLength: 200 });
  const rules = fc.record({
    gustMs: fc.double({ min: 5, max: 40, noNaN: true }),
    gustFactor: fc.double({ min: 1, max: 2, noNaN: true }),
    share: fc.double({ min: 0.1, max: 1, noNaN: true }),
    holdH: fc.integer({ min: 0, max: 12 }),
  });
  const hoursOf = (wind: number[], r: { gustMs: number; gustFactor: number; share: number; holdH: number }) =>
    stowHours(Float64Array.from(wind), { ...r, releaseMs: r.gustMs * r.share });

  test('never parks with a trigger that no gust reaches', () => {
    fc.assert(
      fc.property(winds, rules, (wind, r) => {
        const never = hoursOf(wind, { ...r, gustMs: Number.POSITIVE_INFINITY });
        expect(never).toMatchObject({ hours: 0, events: 0, longestH: 0 });
      }),
    );
  });

  test('is parked in every hour that reaches the trigger, and longer with a longer hold or a lower release', () => {
    fc.assert(
      fc.property(winds, rules, (wind, r) => {
        const one = hoursOf(wind, r);
        const longer = hoursOf(wind, { ...r, holdH: r.holdH + 1 });
        const lower = hoursOf(wind, { ...r, share: r.share / 2 });
        for (let h = 0; h < wind.length; h++) {
          if (wind[h] * r.gustFactor >= r.gustMs) expect(one.stowed[h]).toBe(1);
          expect(longer.stowed[h]).toBeGreaterThanOrEqual(one.stowed[h]);
          expect(lower.stowed[h]).toBeGreaterThanOrEqual(one.stowed[h]);
        }
        expect(one.stowed.reduce((a, b) => a + b, 0)).toBe(one.hours);
        const spells = [...one.stowed]
          .join('')
          .split(/0+/)
          .filter((run) => run !== '');
        expect(spells).toHaveLength(one.events);
        expect(Math.max(0, ...spells.map((run) => run.length))).toBe(one.longestH);
      }),
    );
  });
});
