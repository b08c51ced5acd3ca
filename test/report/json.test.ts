import { expect, test } from 'vitest';
import { resultsJson } from '../../src/report/index.ts';
import { invented, VARIANTS } from './invented.ts';

/** Every number of a value with its path. */
const numbersOf = (value: unknown, path = ''): [string, number][] => {
  if (typeof value === 'number') return [[path, value]];
  if (value === null || typeof value !== 'object') return [];
  return Object.entries(value).flatMap(([key, item]) => numbersOf(item, `${path}.${key}`));
};

test.each(VARIANTS)('the file reads back as the results at ten significant digits: %s', (_, make) => {
  const c = make();
  const back = JSON.parse(resultsJson(c));
  const [ours, theirs] = [numbersOf(c), numbersOf(back)];
  expect(theirs.map(([path]) => path)).toEqual(ours.map(([path]) => path));
  expect(ours.length).toBeGreaterThan(100);
  for (const [i, [path, x]] of ours.entries()) {
    expect(Math.abs(theirs[i][1] - x), path).toBeLessThanOrEqual(Math.abs(x) * 5.0001e-10);
    expect(Number(theirs[i][1].toPrecision(10))).toBe(theirs[i][1]);
  }
});

test('keys, their order, nulls and text are kept, and the file ends in a line end', () => {
  const c = invented();
  const text = resultsJson(c);
  const back = JSON.parse(text);
  expect(Object.keys(back)).toEqual(Object.keys(c));
  expect(Object.keys(back.mounts[0])).toEqual(Object.keys(c.mounts[0]));
  expect(back.comparisons.same_money).toBeNull();
  expect(back.mounts[2].tilt_deg).toBeNull();
  expect(text.endsWith('}\n')).toBe(true);
  expect(resultsJson(invented())).toBe(text);
});

test.each([Number.NaN, Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY])(
  '%s is refused, with its place',
  (bad) => {
    const c = invented();
    c.mounts[1].wind.kz = bad;
    expect(() => resultsJson(c)).toThrow(/mounts\[1\]\.wind\.kz/);
  },
);

test('an undefined result is refused, since JSON would drop it in silence', () => {
  const c = { ...invented(), currency: undefined as unknown as string };
  expect(() => resultsJson(c)).toThrow(/currency/);
});

test('negative zero is written as 0', () => {
  const c = invented();
  c.mounts[0].gain_over_reference = -0;
  expect(Object.is(JSON.parse(resultsJson(c)).mounts[0].gain_over_reference, 0)).toBe(true);
});
