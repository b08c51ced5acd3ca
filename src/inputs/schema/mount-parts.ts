import * as z from 'zod/mini';
import type { Convert } from '../convert.ts';
import { azimuth, side, tilt, turn } from '../fields/angles.ts';
import { hints } from '../fields/field.ts';
import { quantity } from '../fields/quantity.ts';
import { share } from '../fields/share.ts';
import { bareNumber, choice, text } from '../fields/words.ts';
import { cost } from './money.ts';
import type { Present } from './present.ts';
import { wherePresent } from './present.ts';
import { bearingGroup, slopeGroup } from './readings.ts';
import { snow } from './snow.ts';
import { stowTilt, stowTurn } from './stow.ts';

/** An id names files and JSON fields, so it stays plain. */
const ID = /^[a-z0-9][a-z0-9_-]*$/;
export const idField = (what: string, description: string) =>
  text({
    what,
    description,
    example: 'ground',
    pattern: ID,
    longest: 40,
    fix: 'Use lower-case letters, digits, - and _ only, at most 40, beginning with a letter or digit.',
  });

const length = (convert: Convert, what: string, example: string, description: string, least?: 'or zero') =>
  z.optional(
    quantity(convert, {
      what,
      unit: 'm',
      range: least ? { min: 0, max: 100 } : { above: 0, max: 100 },
      example,
      description: `${description} A bare number is metres. Blank: wind limits that need it are not checked.`,
    }),
  );

const gcr = () =>
  share({
    what: 'a ground coverage ratio',
    range: { above: 0, below: 1 },
    example: '0.4',
    description:
      'Ground coverage ratio: slant length of a row over the distance from row to row, above 0 and below 1.',
  });

const rows = () =>
  z
    .strictObject({ gcr: gcr() })
    .register(hints, { description: 'Rows of this mount. Blank: a single row, shaded by nothing.' });

const trackerRows = () =>
  z
    .strictObject({
      gcr: gcr(),
      low_sun: z.optional(
        choice(
          ['backtrack', 'shade'],
          "When the sun is low: turn back out of each other's shade (also if blank), or stay on the sun.",
        ),
      ),
    })
    .register(hints, { description: 'Rows of trackers. Blank: one row, true tracking.' });

const visits = () =>
  bareNumber(
    'visits a year',
    { min: 0, max: 366 },
    'Repair visits a year. Listed, not priced: put what they cost into upkeep.',
    '2',
    'Write for example 2, or 0.5 for one in two years.',
  );

const drive = <S extends z.ZodMiniType>(stuckAt: S) =>
  z
    .strictObject({
      working: z.optional(
        share({
          what: 'a share of the time',
          range: { min: 0, max: 1 },
          example: '97 %',
          description:
            'Share of the time that the tracker works. Blank: downtime is not counted, which flatters it.',
        }),
      ),
      stuck: z.optional(stuckAt),
      visits: z.optional(visits()),
      own_use: z.optional(
        share({
          what: 'a share of the yield',
          range: { min: 0, below: 1 },
          example: '0.3 %',
          description: 'Share of the yield that the drive itself uses. Blank: not counted.',
        }),
      ),
    })
    .register(hints, { description: 'The drive of a tracker.' });

const STUCK = { description: 'How it stands while it does not work. Needed with working.' };
const stuckWord = () =>
  choice(['flat', 'average'], 'Lying flat, or where it stopped, on average over all daylight.');

const stuckTurn = (convert: Convert) =>
  z
    .union([
      stuckWord(),
      z.strictObject({
        turn: turn(convert, 'Turn from flat about the axis, without a sign.'),
        faces: z.optional(side()),
      }),
    ])
    .register(hints, STUCK);

const stuckPlane = (convert: Convert) =>
  z
    .union([
      stuckWord(),
      z.strictObject({
        tilt: tilt(convert, 'Degrees from horizontal, a slope (3:12), a grade (25 %).'),
        azimuth: azimuth(convert, 'The way it faces: degrees clockwise from true north, 180 is south.'),
      }),
    ])
    .register(hints, STUCK);

/** The parts that the kinds of mount share, each made once: making schemas is what reading a study costs most. */
export const mountParts = (convert: Convert, has: Present) => ({
  common: {
    id: idField('an id', 'Short name, unique in the study: lower-case letters, digits, - and _.'),
    label: z.optional(
      text({
        what: 'a short text',
        description: 'What reports call it. Blank: its id.',
        example: 'the ground rack',
        longest: 80,
      }),
    ),
    cost: z.optional(cost()),
    snow: wherePresent(has('snow'), () => z.optional(snow())),
  },
  onSite: {
    bearing: wherePresent(has('bearing'), () => z.optional(bearingGroup(convert))),
    slope: wherePresent(has('slope'), () => z.optional(slopeGroup(convert))),
  },
  rows: z.optional(rows()),
  trackerRows: z.optional(trackerRows()),
  turningDrive: z.optional(drive(stuckTurn(convert))),
  facingDrive: z.optional(drive(stuckPlane(convert))),
  turntableDrive: wherePresent(has('drive'), () =>
    z.optional(
      drive(
        choice(['equator'], 'Which way it faces while it does not work, at its tilt. Needed with working.'),
      ),
    ),
  ),
  turningStow: wherePresent(has('stow'), () => z.optional(stowTurn(convert))),
  facingStow: wherePresent(has('stow'), () => z.optional(stowTilt(convert))),
  slant: length(convert, 'a slant length', '3.5 m', 'Length of a rack or tracker, measured along its slope.'),
  axisHeight: length(convert, 'a height', '1.5 m', 'Height of the axis above ground.'),
  lowerEdge: length(convert, 'a height', '0.8 m', 'Height of the lower edge above ground.', 'or zero'),
  airBehind: length(convert, 'a gap', '100 mm', 'Gap between the roof and the modules.', 'or zero'),
});
