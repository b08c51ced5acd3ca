import { toSignificant } from '../shared/index.ts';

const DIGITS = 10;

/** JSON with numbers at 10 significant digits, as in the results file. */
export const factsJson = (facts: object): string =>
  `${JSON.stringify(facts, (_, value) => (typeof value === 'number' ? toSignificant(value, DIGITS) + 0 : value), 2)}\n`;
