import * as z from 'zod/mini';
import { planeAzimuth, TAKEN } from '../../survey/index.ts';
import type { Convert } from '../convert.ts';
import { writtenTilt } from '../fields/angles.ts';
import { hints } from '../fields/field.ts';
import {
  bearing,
  calendarDate,
  declination,
  downslope,
  readingError,
  slopeError,
  writtenLength,
} from '../fields/readings.ts';
import { choice } from '../fields/words.ts';
import { readingOf } from '../to-readings.ts';
import { refuseIn, surveyIssues } from './survey-issues.ts';

/** The keys that turn magnetic bearings to true ones, for mounts and skylines. */
export const northKeys = () => ({
  dated: z.optional(calendarDate()),
  declination: z.optional(declination()),
});

const bearingKeys = (convert: Convert) =>
  z.strictObject({
    magnetic: z.optional(bearing('Compass bearing as read, degrees clockwise from magnetic north.')),
    true: z.optional(bearing('Bearing from true north, as from a map, degrees clockwise.', '166')),
    back: z.optional(
      bearing('The same line read from its far end, by the same north; the two are averaged.', '331'),
    ),
    taken: z.optional(
      choice(
        TAKEN,
        'Standing on the plane and facing out (also if blank), looking at it, or along its ridge or eave.',
      ),
    ),
    downslope: z.optional(downslope()),
    ...northKeys(),
    error: z.optional(
      readingError(convert, 'Reading error either way, degrees. Blank: not known, and not counted.'),
    ),
  });

export type RawBearing = z.infer<ReturnType<typeof bearingKeys>>;

/** Where the survey's refusals of a bearing belong. */
const KEY_OF_CODE: Record<string, string> = {
  'not-a-back-bearing': 'back',
  'ambiguous-facing': 'downslope',
  'wrong-downslope': 'downslope',
};

/**
 * What shows before the place is known: a ridge without its downslope side, two bearings taken the same way. Where the
 * declination is not known yet, a roughly named downslope side cannot be judged; `surveySite` does that.
 */
const checkBearing = (raw: RawBearing) =>
  surveyIssues(() => {
    const reading = readingOf(raw);
    if (!reading) return;
    const rough = typeof reading.downslope === 'object' && reading.downslope !== null;
    const unknownNorth = reading.north === 'magnetic' && raw.declination === undefined;
    const judged =
      rough && unknownNorth ? { ...reading, taken: 'facing' as const, downslope: null } : reading;
    planeAzimuth(judged, raw.declination?.declinationDeg ?? 0);
  }, KEY_OF_CODE);

export const bearingGroup = (convert: Convert) =>
  bearingKeys(convert)
    .check(({ value, issues }) => {
      issues.push(...checkBearing(value));
    })
    .register(hints, {
      description: 'The way the plane faces as read on site, in place of azimuth: magnetic, or true.',
    });

const slopeKeys = (convert: Convert) => {
  const length = (what: string, range: { min: 0 } | { above: 0 }, example: string, about: string) =>
    z.optional(writtenLength(convert, what, range, example, `${about} A bare number is metres.`));
  return z.strictObject({
    reading: z.optional(
      writtenTilt(convert, 'A slope such as 3:12, a grade such as 25 %, or degrees off a clinometer.'),
    ),
    error: z.optional(slopeError(convert)),
    rise: length('a rise', { min: 0 }, '4 ft', 'Height gained over the run.'),
    run: length('a run', { above: 0 }, '12 ft', 'Level distance, not along the roof.'),
    rise_error: length('a reading error', { min: 0 }, '1 in', 'Error of the rise, either way.'),
    run_error: length('a reading error', { min: 0 }, '1 in', 'Error of the run, either way.'),
  });
};

export type RawSlope = z.infer<ReturnType<typeof slopeKeys>>;

export const slopeGroup = (convert: Convert) =>
  slopeKeys(convert)
    .check(({ value: { reading, error }, issues }) => {
      if (error?.unit !== '%' || reading === undefined || reading.grade) return;
      issues.push(
        refuseIn(['error'], {
          code: 'wrong-value',
          expected: 'an error in degrees, since the reading is no grade in per cent',
          fix: 'Write for example 2 deg.',
        }),
      );
    })
    .register(hints, {
      description: 'The slope as read on site, in place of tilt: a reading, or rise and run.',
    });
