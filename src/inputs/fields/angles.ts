import { DEG } from '../../shared/index.ts';
import type { Convert } from '../convert.ts';
import { field, orWord } from './field.ts';
import type { QuantityRule } from './quantity.ts';
import { numberOrText, quantity, quantityWords, readQuantity } from './quantity.ts';
import { plainText } from './range.ts';

type AngleRule = Omit<QuantityRule, 'description'>;

const TILT: AngleRule = {
  what: 'an angle from horizontal',
  unit: 'deg',
  range: { min: 0, max: 90 },
  example: '30 deg',
  fix: 'Flat is 0, upright is 90; write 30 deg, a slope such as 3:12, or a grade such as 25 %.',
};
const AZIMUTH: AngleRule = {
  what: 'a direction',
  unit: 'deg',
  range: { min: 0, max: 360 },
  example: '180',
  fix: 'Count clockwise from true north: 0 is north, 90 east, 180 south, 270 west; 10 degrees west of north is 350.',
};
const SWING: AngleRule = {
  what: 'an angle either way from flat',
  unit: 'deg',
  range: { min: 0, max: 90 },
  example: '60 deg',
};

const GRADE = /^(\d+(?:\.\d*)?|\.\d+) ?%$/;
const SLOPE = /^(\d+(?:\.\d*)?|\.\d+) ?(?:[:/]|in) ?(\d+(?:\.\d*)?|\.\d+)$/;

/** Degrees from horizontal; `25 %` is a grade (rise over run) and `3:12` a slope, both by the inverse tangent. */
const readTilt = (raw: unknown, convert: Convert): number => {
  const text = typeof raw === 'string' ? plainText(raw) : '';
  const grade = GRADE.exec(text);
  if (grade) return Math.atan(Number(grade[1]) / 100) / DEG;
  const slope = SLOPE.exec(text);
  if (slope && Number(slope[2]) > 0) return Math.atan2(Number(slope[1]), Number(slope[2])) / DEG;
  return readQuantity(raw, TILT, convert);
};

const wordsOf = (rule: AngleRule, description: string) => ({
  description,
  example: rule.example,
  expected: quantityWords(rule),
  form: numberOrText(rule.range),
});

const wordsOrBest = (rule: AngleRule, description: string) => ({
  description,
  example: 'best',
  expected: `${quantityWords(rule)}, or best`,
  form: numberOrText(rule.range, 'best'),
});

export const tilt = (convert: Convert, description: string) =>
  field(wordsOf(TILT, description), (raw) => readTilt(raw, convert));

export const azimuth = (convert: Convert, description: string) =>
  field(wordsOf(AZIMUTH, description), (raw) => readQuantity(raw, AZIMUTH, convert));

export const tiltOrBest = (convert: Convert, description: string) =>
  field(wordsOrBest(TILT, description), (raw) => orWord(raw, 'best', () => readTilt(raw, convert)));

export const azimuthOrBest = (convert: Convert, description: string) =>
  field(wordsOrBest(AZIMUTH, description), (raw) =>
    orWord(raw, 'best', () => readQuantity(raw, AZIMUTH, convert)),
  );

/** Greatest turn of a tracker either way from flat. */
export const swing = (convert: Convert, description: string) => quantity(convert, { ...SWING, description });
