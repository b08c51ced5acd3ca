import { type Comparison, toSignificant } from '../shared/index.ts';

const DIGITS = 10;

/**
 * A copy with every number at 10 significant digits. Throws on what JSON would turn into null or drop in silence:
 * NaN, infinities and undefined are faults of trackworth, never a missing value.
 */
const rounded = (value: unknown, path: string): unknown => {
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new Error(`A fault in trackworth: the result ${path} is ${value}.`);
    return toSignificant(value, DIGITS) + 0;
  }
  if (value === null || typeof value === 'string' || typeof value === 'boolean') return value;
  if (Array.isArray(value)) return value.map((item, i) => rounded(item, `${path}[${i}]`));
  if (typeof value === 'object')
    return Object.fromEntries(
      Object.entries(value).map(([key, item]) => [key, rounded(item, path ? `${path}.${key}` : key)]),
    );
  throw new Error(`A fault in trackworth: the result ${path} is ${typeof value}.`);
};

/**
 * The results file: the contract of `Comparison` as JSON, keys in the order of the contract's making, numbers at 10
 * significant digits, a line end at the end. Throws an `Error` naming the place where a number is not finite.
 */
export const resultsJson = (c: Comparison): string => `${JSON.stringify(rounded(c, ''), null, 2)}\n`;
