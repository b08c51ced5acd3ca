import { nearest } from '../nearest.ts';
import { field, Refusal } from './field.ts';
import type { Range } from './range.ts';
import { inRange, numberAndRest, rangeForm, rangeWords } from './range.ts';

/** Text as written; YAML hands over an unquoted 2030 or true as a number or a truth value. */
const asText = (raw: unknown): string | null =>
  typeof raw === 'string' ? raw : typeof raw === 'number' || typeof raw === 'boolean' ? String(raw) : null;

export interface TextRule {
  /** With its article: `a column name`. */
  readonly what: string;
  readonly description: string;
  readonly example: string;
  readonly pattern?: RegExp;
  readonly longest?: number;
  readonly fix?: string;
}

export const text = ({ what, description, example, pattern, longest, fix }: TextRule) => {
  const form = {
    type: ['string', 'number', 'boolean'],
    minLength: 1,
    ...(longest === undefined ? {} : { maxLength: longest }),
    ...(pattern === undefined ? {} : { pattern: pattern.source }),
  };
  return field({ description, example, expected: what, form }, (raw) => {
    const found = asText(raw)?.trim();
    if (!found || found.length > (longest ?? Number.POSITIVE_INFINITY) || (pattern && !pattern.test(found)))
      throw new Refusal(what, fix ?? `Write for example ${example}.`);
    return found;
  });
};

/** One of a few words; a near miss is named. */
export const choice = <const T extends string>(options: readonly T[], description: string) => {
  const list = options.length === 1 ? options[0] : `${options.slice(0, -1).join(', ')} or ${options.at(-1)}`;
  return field({ description, example: options[0], expected: list, form: { enum: [...options] } }, (raw) => {
    const written = asText(raw)?.trim();
    const found = options.find((option) => option === written);
    if (found !== undefined) return found;
    const close = written === undefined ? null : nearest(written, options);
    throw new Refusal(list, close === null ? `Write one of them.` : `Did you mean ${close}?`);
  });
};

export const flag = (description: string) =>
  field(
    { description, example: 'true', expected: 'true or false', form: { type: 'boolean' } },
    (raw): boolean => {
      if (typeof raw === 'boolean') return raw;
      throw new Refusal('true or false', 'Write true or false, without quotes.');
    },
  );

/** An amount in the study's currency. */
export const money = (what: string, description: string, example: string) => {
  const expected = `${what}, 0 or more, as a bare number`;
  const form = {
    anyOf: [
      { type: 'number', minimum: 0 },
      { type: 'string', pattern: '^ *[0-9.]+ *$' },
    ],
  };
  return field({ description, example, expected, form }, (raw) => {
    const [amount, rest] = numberAndRest(raw, expected, `Write for example ${example}.`);
    if (rest !== '')
      throw new Refusal(expected, `Write the number alone; the currency goes under finance.currency.`);
    if (!(amount >= 0))
      throw new Refusal(expected, 'A cost cannot be negative; leave it blank if it is not known.');
    return amount;
  });
};

const YEARS = /^(?:y|yr|yrs|year|years|a)$/i;

export const readWhole = (raw: unknown, what: string, range: Range, example: string): number => {
  const expected = `${what}, a whole number${rangeWords(range)}`;
  const [amount, rest] = numberAndRest(raw, expected, `Write for example ${example}.`);
  if (!(rest === '' || YEARS.test(rest)) || !Number.isInteger(amount) || !inRange(amount, range))
    throw new Refusal(expected, `Write for example ${example}.`);
  return amount;
};

/** Whole years, with or without the word. */
export const wholeYears = (what: string, range: Range, description: string, example: string) =>
  field(
    {
      description,
      example,
      expected: `${what}, a whole number${rangeWords(range)}`,
      form: {
        anyOf: [
          { type: 'integer', ...rangeForm(range) },
          { type: 'string', pattern: '^ *[0-9]+' },
        ],
      },
    },
    (raw) => readWhole(raw, what, range, example),
  );

/** A plain number without a unit. */
export const bareNumber = (
  what: string,
  range: Range,
  description: string,
  example: string,
  fix?: string,
) => {
  const expected = `${what}, a bare number${rangeWords(range)}`;
  const form = {
    anyOf: [
      { type: 'number', ...rangeForm(range) },
      { type: 'string', pattern: '^ *[+-]?[0-9.]+ *$' },
    ],
  };
  return field({ description, example, expected, form }, (raw): number => {
    const advice = fix ?? `Write for example ${example}.`;
    const [amount, rest] = numberAndRest(raw, expected, advice);
    if (rest !== '' || !inRange(amount, range)) throw new Refusal(expected, advice);
    return amount;
  });
};
