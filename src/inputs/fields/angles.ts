import { tiltOfSlopeText } from '../../survey/index.ts';
import type { Convert } from '../convert.ts';
import { field, orWord, Refusal } from './field.ts';
import type { QuantityRule } from './quantity.ts';
import { numberOrText, quantity, quantityWords, readQuantity } from './quantity.ts';
import { inRange, plainText } from './range.ts';
import { asWritten, bySurvey } from './readings.ts';
import { choice } from './words.ts';

type AngleRule = Omit<QuantityRule, 'description'>;

const TILT: AngleRule = {
  what: 'an angle from horizontal',
  unit: 'deg',
  range: { min: 0, max: 90 },
  example: '30 deg',
  fix: 'Flat is 0, upright is 90; write 30 deg, a slope such as 3:12, or a grade such as 25 %.',
};
const STEEPNESS: AngleRule = {
  what: 'a steepness of the ground',
  unit: 'deg',
  range: { min: 0, max: 60 },
  example: '6 %',
  fix: 'Write a grade such as 6 %, an angle such as 3.4 deg, or a slope such as 1:12; 60 degrees is the most.',
};
const FACED: AngleRule = {
  what: 'a height of the sun',
  unit: 'deg',
  range: { min: 0, max: 90 },
  example: '15 deg',
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

/** Degrees from horizontal; `25 %` is a grade (rise over run) and `3:12` a slope. */
const readTilt = (raw: unknown, convert: Convert, rule = TILT): number => {
  const slope = typeof raw === 'string' ? bySurvey(() => tiltOfSlopeText(plainText(raw))) : null;
  if (slope !== null && !inRange(slope, rule.range)) throw new Refusal(quantityWords(rule), rule.fix ?? '');
  return slope ?? readQuantity(raw, rule, convert);
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

/** Of the ground, or of the ground that a maker allows. */
export const steepness = (convert: Convert, description: string) =>
  field(wordsOf(STEEPNESS, description), (raw) => readTilt(raw, convert, STEEPNESS));

export interface WrittenTilt {
  readonly tiltDeg: number;
  /** Read as a grade in per cent. */
  readonly grade: boolean;
  readonly written: string;
}

/** A tilt that keeps the user's own words, for the list of readings. */
export const writtenTilt = (convert: Convert, description: string) =>
  field(
    { ...wordsOf(TILT, description), example: '3:12' },
    (raw): WrittenTilt => ({
      tiltDeg: readTilt(raw, convert),
      grade: typeof raw === 'string' && raw.includes('%'),
      written: asWritten(raw, 'deg'),
    }),
  );

export const azimuth = (convert: Convert, description: string) =>
  field(wordsOf(AZIMUTH, description), (raw) => readQuantity(raw, AZIMUTH, convert));

export const tiltOrBest = (convert: Convert, description: string) =>
  field(wordsOrBest(TILT, description), (raw) => orWord(raw, 'best', () => readTilt(raw, convert)));

export const azimuthOrBest = (convert: Convert, description: string) =>
  field(wordsOrBest(AZIMUTH, description), (raw) =>
    orWord(raw, 'best', () => readQuantity(raw, AZIMUTH, convert)),
  );

/** Elevation of the sun that a mast can face. */
export const faced = (convert: Convert, description: string) => quantity(convert, { ...FACED, description });

/** Greatest turn of a tracker either way from flat. */
export const swing = (convert: Convert, description: string) => quantity(convert, { ...SWING, description });

const TURN: AngleRule = {
  what: 'a turn from flat',
  unit: 'deg',
  range: { min: 0, max: 90 },
  example: '45 deg',
  fix: 'Write it without a sign, for example turn: 45, and the side that it faces, for example faces: east.',
};

/** How far a tracker is turned from flat; which way is a word of its own, since signs mislead. */
export const turn = (convert: Convert, description: string) => quantity(convert, { ...TURN, description });

const SIDES = ['east', 'west', 'north', 'south'] as const;
export type Side = (typeof SIDES)[number];
export const side = () => choice(SIDES, 'The side that it faces when turned.');
