import type { Convert, Unit } from '../convert.ts';
import { KIND_OF_UNIT } from '../convert.ts';
import { field, Refusal } from './field.ts';
import type { Range } from './range.ts';
import { FEET_AND_INCHES, inRange, numberAndRest, plainText, rangeForm, rangeWords } from './range.ts';

export interface QuantityRule {
  /** With its article: `a length`. */
  readonly what: string;
  /** A bare number is in this unit, and so is the result. */
  readonly unit: Unit;
  readonly range: Range;
  readonly example: string;
  readonly description: string;
  /** What to do about a wrong value; else the example is named. */
  readonly fix?: string;
}

const UNIT_EXAMPLES: Record<(typeof KIND_OF_UNIT)[Unit], string> = {
  power: 'W, kW or MW',
  length: 'm, cm, mm, in or ft',
  speed: 'm/s, km/h, mph or kn',
  angle: 'deg or rad',
  time: 'min or h',
};
const UNIT_WORDS: Partial<Record<Unit, string>> = { deg: 'degrees', min: 'minutes', h: 'hours' };

/** The words of a quantity field for messages. */
export const quantityWords = ({ what, unit, range }: Omit<QuantityRule, 'description'>): string =>
  `${what} in ${UNIT_WORDS[unit] ?? unit}${rangeWords(range)}`;

/** A number in the documented unit, or text with any unit of its kind, to the documented unit. */
export const readQuantity = (
  raw: unknown,
  rule: Omit<QuantityRule, 'description'>,
  convert: Convert,
): number => {
  const { unit, example, range } = rule;
  const fix = rule.fix ?? `Write for example ${example}.`;
  const expected = quantityWords(rule);
  const feet = unit === 'm' && typeof raw === 'string' ? FEET_AND_INCHES.exec(plainText(raw)) : null;
  const [amount, written] = feet
    ? [Number(feet[1]) * 12 + Number(feet[2]), 'in']
    : numberAndRest(raw, expected, fix);
  const value = written === '' ? amount : convert(amount, written, unit);
  if (value === null) {
    const units = UNIT_EXAMPLES[KIND_OF_UNIT[unit]];
    throw new Refusal(expected, `"${written}" is no unit for it here; use ${units}, for example ${example}.`);
  }
  if (!inRange(value, range)) throw new Refusal(expected, fix);
  return value;
};

/** A number, text that holds one, or the one word given: what an editor can check of a quantity. */
export const numberOrText = (range: Range, word?: string): Record<string, unknown> => ({
  anyOf: [
    { type: 'number', ...rangeForm(range) },
    { type: 'string', pattern: '[0-9]' },
    ...(word === undefined ? [] : [{ const: word }]),
  ],
});

export const quantity = (convert: Convert, rule: QuantityRule) =>
  field(
    {
      description: rule.description,
      example: rule.example,
      expected: quantityWords(rule),
      form: numberOrText(rule.range),
    },
    (raw) => readQuantity(raw, rule, convert),
  );
