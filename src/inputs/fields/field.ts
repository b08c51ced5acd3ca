import * as z from 'zod/mini';

/** Thrown by a field's reader: what it wanted, and what the user should write instead. */
export class Refusal extends Error {
  readonly expected: string;
  readonly fix: string;

  constructor(expected: string, fix: string) {
    super(expected);
    this.expected = expected;
    this.fix = fix;
  }
}

/** What editors show and check: JSON Schema keywords, filed beside the zod schema that they describe. */
export const hints = z.registry<Record<string, unknown>>();

export interface FieldText {
  /** One sentence: what it is, its unit, what a blank means. */
  readonly description: string;
  /** A right value, as it would stand in a study. */
  readonly example: string;
  /** What was expected, in words that follow `expected`. */
  readonly expected: string;
  /** The input form in JSON Schema keywords. */
  readonly form: Record<string, unknown>;
}

/**
 * One field of a study: `read` takes the raw value to trackworth's own unit or throws a Refusal. The problem's
 * words travel in the issue's `params`, since only the caller knows file, line and key; the `fix` of a missing value is
 * the example alone.
 */
export const field = <T>(text: FieldText, read: (raw: unknown) => T) => {
  const { description, example, expected, form } = text;
  const schema = z.transform((raw: unknown, context): T => {
    const refuse = (params: { expected: string; fix: string; code: string }): never => {
      context.issues.push({ code: 'custom', input: raw, params });
      return z.NEVER;
    };
    if (raw === undefined) return refuse({ code: 'missing-key', expected, fix: example });
    try {
      return read(raw);
    } catch (trouble) {
      if (!(trouble instanceof Refusal)) throw trouble;
      return refuse({ code: 'wrong-value', expected: trouble.expected, fix: trouble.fix });
    }
  });
  return schema.register(hints, { description, examples: [example], ...form });
};

/** One word in place of the value; where neither fits, the refusal names both. */
export const orWord = <T, W extends string>(raw: unknown, word: W, read: (raw: unknown) => T): T | W => {
  if (typeof raw === 'string' && raw.trim() === word) return word;
  try {
    return read(raw);
  } catch (trouble) {
    if (trouble instanceof Refusal) throw new Refusal(`${trouble.expected}, or ${word}`, trouble.fix);
    throw trouble;
  }
};
