import { field, orWord, Refusal } from './field.ts';
import { numberOrText } from './quantity.ts';
import type { Range } from './range.ts';
import { fromPercent, inRange, numberAndRest, rangeWords } from './range.ts';

export interface ShareRule {
  /** With its article: `a yearly rate`. */
  readonly what: string;
  /** As a fraction. */
  readonly range: Range;
  readonly example: string;
  readonly description: string;
}

const PER_CENT = /^(?:%|per ?cent|pct)(?: ?(?:\/|per) ?(?:a|y|yr|year))?$/i;
const asPercent = (x: number): string => `${Number((x * 100).toPrecision(12))} %`;

/** `6 %`, `0.06` or `0.5 %/yr` to a fraction. A bare number above 1 can only be meant as per cent, so it is refused. */
export const readShare = (raw: unknown, { what, range, example }: ShareRule): number => {
  const expected = `${what},${rangeWords(range, asPercent)}`;
  const [amount, written] = numberAndRest(raw, expected, `Write for example ${example}.`);
  if (written === '' && amount > 1)
    throw new Refusal(expected, `Write ${amount} % if per cent is meant; a bare number is a fraction of 1.`);
  if (written !== '' && !PER_CENT.test(written))
    throw new Refusal(expected, `"${written}" is no unit for it; write for example ${example}.`);
  const value = written === '' ? amount : fromPercent(amount);
  if (inRange(value, range)) return value;
  const bare = written === '' && amount > 0 && inRange(fromPercent(amount), range);
  throw new Refusal(
    expected,
    bare
      ? `${amount} is ${asPercent(amount)}; write ${amount} % if that is meant.`
      : `Write for example ${example}.`,
  );
};

export const share = (rule: ShareRule) =>
  field(
    {
      description: rule.description,
      example: rule.example,
      expected: `${rule.what},${rangeWords(rule.range, asPercent)}`,
      form: numberOrText(rule.range),
    },
    (raw) => readShare(raw, rule),
  );

/** A share, or the one word given. */
export const shareOr = <const W extends string>(rule: ShareRule, word: W) =>
  field(
    {
      description: rule.description,
      example: rule.example,
      expected: `${rule.what},${rangeWords(rule.range, asPercent)}, or ${word}`,
      form: numberOrText(rule.range, word),
    },
    (raw): number | W => orWord(raw, word, () => readShare(raw, rule)),
  );
