import { TrackworthError } from '../../shared/index.ts';
import {
  type Downslope,
  type MapDeclination,
  parseBearing,
  parseCalendarDate,
  parseDownslope,
  parseMapDeclination,
} from '../../survey/index.ts';
import type { Convert } from '../convert.ts';
import { field, Refusal } from './field.ts';
import { numberOrText, quantity, readQuantity } from './quantity.ts';
import { plainText, type Range } from './range.ts';

/** Reads with the survey's own parser; its refusal becomes the field's. */
export const bySurvey = <T>(read: () => T): T => {
  try {
    return read();
  } catch (trouble) {
    if (!(trouble instanceof TrackworthError)) throw trouble;
    const [{ expected, fix }] = trouble.problems;
    throw new Refusal(expected, fix);
  }
};

const plain = (raw: unknown): unknown => (typeof raw === 'string' ? plainText(raw) : raw);

export const bearing = (description: string, example = '150') =>
  field(
    {
      description,
      example,
      expected: 'a bearing from 0 to 360 degrees, clockwise from north',
      form: numberOrText({ min: 0, max: 360 }),
    },
    (raw): number => bySurvey(() => parseBearing(plain(raw))),
  );

export const declination = () =>
  field(
    {
      description:
        'Declination by hand with its side, and the year of the map if it gives one: 16 E, 13 W, 16 E 2019. Blank: from the date.',
      example: '16 E',
      expected: 'a declination from 0 to 180 degrees with its side, E or W',
      form: { type: 'string', pattern: '[0-9].*[EeWw]' },
    },
    (raw): MapDeclination => bySurvey(() => parseMapDeclination(plain(raw))),
  );

export const calendarDate = () =>
  field(
    {
      description: 'Day of the reading, year-month-day; declination changes from year to year.',
      example: '2026-05-01',
      expected: 'the day of the reading as year-month-day',
      form: { type: 'string', pattern: '^ *[0-9]{4}-[0-9]{2}-[0-9]{2} *$' },
    },
    (raw) => bySurvey(() => parseCalendarDate(plain(raw))),
  );

export const downslope = () =>
  field(
    {
      description:
        'Where the roof falls: left or right as seen looking along the bearing, or roughly where to, such as south.',
      example: 'left',
      expected: 'left, right or a point of the compass',
      form: { type: 'string', minLength: 1 },
    },
    (raw): Downslope => bySurvey(() => parseDownslope(raw)),
  );

/** No reading is worth having that is off by more than a right angle. */
const ERROR_RANGE: Range = { min: 0, max: 90 };
const ERROR_RULE = {
  what: 'a reading error either way',
  unit: 'deg',
  range: ERROR_RANGE,
  example: '5 deg',
} as const;

export const readingError = (convert: Convert, description: string) =>
  quantity(convert, { ...ERROR_RULE, description });

/** An error of a slope: in degrees, or in points of a grade in per cent. */
export interface SlopeError {
  readonly size: number;
  readonly unit: 'deg' | '%';
  readonly written: string;
}

const GRADE_ERROR = /^(\d+(?:\.\d*)?|\.\d+) ?%$/;

export const slopeError = (convert: Convert) =>
  field(
    {
      description:
        'Reading error either way: degrees, or per cent points where the reading is a grade. Blank: not known.',
      example: '2 deg',
      expected: 'a reading error either way in degrees from 0 to 90',
      form: numberOrText(ERROR_RANGE),
    },
    (raw): SlopeError => {
      const grade = typeof raw === 'string' ? GRADE_ERROR.exec(plainText(raw)) : null;
      const size = grade ? Number(grade[1]) : readQuantity(raw, ERROR_RULE, convert);
      return { size, unit: grade ? '%' : 'deg', written: asWritten(raw, 'deg') };
    },
  );

/** What the user wrote (a number or text), with the unit that a bare number stands for. */
export const asWritten = (raw: unknown, unit: string): string => {
  const text = plainText(String(raw));
  return /[^\d.eE+-]/.test(text) ? text : `${text} ${unit}`;
};

export interface WrittenLength {
  readonly lengthM: number;
  readonly written: string;
}

/** A length that keeps the user's own words, for the list of readings. */
export const writtenLength = (
  convert: Convert,
  what: string,
  range: Range,
  example: string,
  about: string,
) => {
  const rule = { what, unit: 'm', range, example } as const;
  return field(
    { description: about, example, expected: `${what} in m`, form: numberOrText(range) },
    (raw): WrittenLength => ({
      lengthM: readQuantity(raw, rule, convert),
      written: asWritten(raw, 'm'),
    }),
  );
};
