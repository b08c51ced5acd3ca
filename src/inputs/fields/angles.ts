import { DEG } from '../../shared/index.ts';
import type { Convert } from '../convert.ts';
import { field, Refusal } from './field.ts';
import type { QuantityRule } from './quantity.ts';
import { numberOrText, quantity, quantityWords, readQuantity } from './quantity.ts';
import { plainText } from './range.ts';

const BEST = {
  anyOf: [
    { type: 'number', minimum: 0, maximum: 360 },
    { type: 'string', pattern: '^best$|[0-9]' },
  ],
};
const GRADE = /^(\d+(?:\.\d*)?|\.\d+) ?%$/;
const SLOPE = /^(\d+(?:\.\d*)?|\.\d+) ?(?:[:/]|in) ?(\d+(?:\.\d*)?|\.\d+)$/;

const tiltRule = (description: string): QuantityRule => ({
  what: 'an angle from horizontal',
  unit: 'deg',
  range: { min: 0, max: 90 },
  example: '30 deg',
  description,
  outside: 'Flat is 0, upright is 90; a slope may be written as 3:12 and a grade as 25 %.',
});

/** Degrees from horizontal; `25 %` is a grade (rise over run) and `3:12` a slope, both by the inverse tangent. */
export const readTilt = (raw: unknown, description: string, convert: Convert): number => {
  const text = typeof raw === 'string' ? plainText(raw) : '';
  const grade = GRADE.exec(text);
  if (grade) return Math.atan(Number(grade[1]) / 100) / DEG;
  const slope = SLOPE.exec(text);
  if (slope && Number(slope[2]) > 0) return Math.atan2(Number(slope[1]), Number(slope[2])) / DEG;
  return readQuantity(raw, tiltRule(description), convert);
};

const azimuthRule = (description: string): QuantityRule => ({
  what: 'a direction',
  unit: 'deg',
  range: { min: 0, max: 360 },
  example: '180',
  description,
});
const AZIMUTH_FIX =
  'Count clockwise from true north: 0 is north, 90 east, 180 south, 270 west; 10 degrees west of north is 350.';

const readAzimuth = (raw: unknown, description: string, convert: Convert): number => {
  try {
    return readQuantity(raw, azimuthRule(description), convert);
  } catch (trouble) {
    if (trouble instanceof Refusal) throw new Refusal(trouble.expected, AZIMUTH_FIX);
    throw trouble;
  }
};

const orBest = <T>(raw: unknown, read: () => T): T | 'best' => {
  if (typeof raw === 'string' && raw.trim() === 'best') return 'best';
  try {
    return read();
  } catch (trouble) {
    if (trouble instanceof Refusal) throw new Refusal(`${trouble.expected}, or best`, trouble.fix);
    throw trouble;
  }
};

export const tilt = (convert: Convert, description: string) =>
  field(
    {
      description,
      example: '30 deg',
      expected: quantityWords(tiltRule(description)),
      form: numberOrText({ min: 0, max: 90 }),
    },
    (raw) => readTilt(raw, description, convert),
  );

export const azimuth = (convert: Convert, description: string) =>
  field(
    {
      description,
      example: '180',
      expected: quantityWords(azimuthRule(description)),
      form: numberOrText({ min: 0, max: 360 }),
    },
    (raw) => readAzimuth(raw, description, convert),
  );

export const tiltOrBest = (convert: Convert, description: string) =>
  field(
    {
      description,
      example: 'best',
      expected: `${quantityWords(tiltRule(description))}, or best`,
      form: BEST,
    },
    (raw) => orBest(raw, () => readTilt(raw, description, convert)),
  );

export const azimuthOrBest = (convert: Convert, description: string) =>
  field(
    {
      description,
      example: 'best',
      expected: `${quantityWords(azimuthRule(description))}, or best`,
      form: BEST,
    },
    (raw) => orBest(raw, () => readAzimuth(raw, description, convert)),
  );

/** Greatest turn of a tracker either way from flat. */
export const swing = (convert: Convert, description: string) =>
  quantity(convert, {
    what: 'an angle either way from flat',
    unit: 'deg',
    range: { min: 0, max: 90 },
    example: '60 deg',
    description,
  });
