import { Refusal } from './field.ts';

/** Which numbers a field takes. `above` and `below` exclude the bound itself. */
export interface Range {
  readonly min?: number;
  readonly max?: number;
  readonly above?: number;
  readonly below?: number;
}

export const inRange = (x: number, { min, max, above, below }: Range): boolean =>
  Number.isFinite(x) &&
  (min === undefined || x >= min) &&
  (max === undefined || x <= max) &&
  (above === undefined || x > above) &&
  (below === undefined || x < below);

/** ` from 0 to 90`, ` above 0`, ` above 0 and below 1`; empty without bounds. `show` writes a bound. */
export const rangeWords = (
  { min, max, above, below }: Range,
  show: (x: number) => string = String,
): string => {
  if (min !== undefined && max !== undefined) return ` from ${show(min)} to ${show(max)}`;
  const low =
    min === undefined ? (above === undefined ? '' : `above ${show(above)}`) : `${show(min)} or more`;
  const high =
    max === undefined ? (below === undefined ? '' : `below ${show(below)}`) : `at most ${show(max)}`;
  const words = [low, high].filter((part) => part !== '').join(' and ');
  return words === '' ? '' : ` ${words}`;
};

/** The same bounds in JSON Schema (draft 7) keywords. */
export const rangeForm = ({ min, max, above, below }: Range): Record<string, number> => ({
  ...(min === undefined ? {} : { minimum: min }),
  ...(max === undefined ? {} : { maximum: max }),
  ...(above === undefined ? {} : { exclusiveMinimum: above }),
  ...(below === undefined ? {} : { exclusiveMaximum: below }),
});

const NUMBER = '[+-]?(?:\\d+(?:\\.\\d*)?|\\.\\d+)(?:[eE][+-]?\\d+)?';
export const NUMBER_AND_REST = new RegExp(`^(${NUMBER})\\s*(.*)$`, 's');
export const FEET_AND_INCHES = new RegExp(
  `^(${NUMBER})\\s*(?:ft|feet|foot|['’′])\\s*(\\d+(?:\\.\\d*)?)\\s*(?:in|inch|inches|["”″])$`,
  'i',
);

/** Takes typographic minus signs and spaces back to the plain ones. */
export const plainText = (text: string): string => text.replace(/[−–]/g, '-').replace(/\s+/g, ' ').trim();

/** A raw value as a number and the text behind it (`''` for a bare number); refuses all else in the field's words. */
export const numberAndRest = (raw: unknown, expected: string, fix: string): [number, string] => {
  if (typeof raw === 'number' && Number.isFinite(raw)) return [raw, ''];
  if (typeof raw !== 'string') throw new Refusal(expected, fix);
  const text = plainText(raw);
  if (/^[+-]?\d+,\d/.test(text))
    throw new Refusal(expected, `Write numbers with a decimal point and no other marks. ${fix}`);
  const parts = NUMBER_AND_REST.exec(text);
  if (!parts || !Number.isFinite(Number(parts[1]))) throw new Refusal(expected, fix);
  return [Number(parts[1]), parts[2].trim()];
};

/** Per cent to a fraction without the dust of binary division: 3.5 gives 0.035. */
export const fromPercent = (percent: number): number => Number((percent / 100).toPrecision(15));
