import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  decimalsFor,
  formatDaily,
  formatGain,
  formatNumber,
  formatPercent,
  formatPlace,
  formatSigned,
  formatUpTo,
  UNKNOWN,
} from '../../src/report/numbers.ts';

test('thousands are spaced and decimals keep their point', () => {
  expect(formatNumber(1600)).toBe('1 600');
  expect(formatNumber(1234567.891, 2)).toBe('1 234 567.89');
  expect(formatNumber(-12345.6, 1)).toBe('-12 345.6');
  expect(formatNumber(999.5)).toBe('1 000');
  expect(formatNumber(12)).toBe('12');
});

test('what is not known prints as a dash, and a true zero as 0', () => {
  expect([
    formatNumber(null),
    formatPercent(null),
    formatGain(null),
    formatSigned(null),
    formatUpTo(null),
  ]).toEqual(Array(5).fill(UNKNOWN));
  expect([formatNumber(0), formatPercent(0), formatGain(0), formatSigned(0)]).toEqual([
    '0',
    '0.0 %',
    '0.0 %',
    '0',
  ]);
});

test('gains carry their sign, unless they round to zero', () => {
  expect(formatGain(0.1234)).toBe('+12.3 %');
  expect(formatGain(-0.08)).toBe('-8.0 %');
  expect(formatGain(0.0001)).toBe('0.0 %');
  expect(formatGain(-0.0001)).toBe('0.0 %');
  expect(formatSigned(400)).toBe('+400');
  expect(formatSigned(-0.2)).toBe('0');
});

test('closing zeros go only behind a point', () => {
  expect([formatUpTo(12.04), formatUpTo(10), formatUpTo(100), formatUpTo(0.5), formatUpTo(1200)]).toEqual([
    '12.04', '10', '100', '0.5', '1 200',
  ]); // biome-ignore format: one row of answers
});

test('a column shows three significant digits of its greatest value', () => {
  expect(decimalsFor([0.109, 0.0912])).toBe(3);
  expect(decimalsFor([1.52])).toBe(2);
  expect(decimalsFor([15.2, null])).toBe(1);
  expect(decimalsFor([152, 0.1])).toBe(0);
  expect(decimalsFor([null])).toBe(0);
});

test('a day of polar night keeps a digit to compare', () => {
  expect([formatDaily(3.456), formatDaily(0.0489), formatDaily(0)]).toEqual(['3.46', '0.049', '0.00']);
});

test('places carry letters for their hemispheres', () => {
  expect(formatPlace(40.1, -104.92)).toBe('40.10 N 104.92 W');
  expect(formatPlace(-33.2, 20.55)).toBe('33.20 S 20.55 E');
});

test('a printed number reads back as the number, within its rounding', () => {
  fc.assert(
    fc.property(
      fc.double({ min: -1e12, max: 1e12, noNaN: true }),
      fc.integer({ min: 0, max: 4 }),
      (x, decimals) => {
        const back = Number(formatNumber(x, decimals).replaceAll(' ', ''));
        expect(Math.abs(back - x)).toBeLessThanOrEqual(0.5 * 10 ** -decimals + Math.abs(x) * 1e-15);
        expect(Object.is(back, -0)).toBe(false);
      },
    ),
  );
});
