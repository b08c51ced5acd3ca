import * as z from 'zod/mini';
import type { Convert } from './convert.ts';
import { azimuth, azimuthOrBest, swing, tilt, tiltOrBest } from './fields/angles.ts';
import { hints } from './fields/field.ts';
import { quantity } from './fields/quantity.ts';
import { share } from './fields/share.ts';
import { choice, money, text, wholeYears } from './fields/words.ts';

/** Longest life that a study may ask for, years. */
export const LONGEST_LIFE = 100;

const length = (convert: Convert, what: string, example: string, description: string, least?: 'or zero') =>
  quantity(convert, {
    what,
    unit: 'm',
    range: least ? { min: 0, max: 100 } : { above: 0, max: 100 },
    example,
    description: `${description} A bare number is metres. Blank: wind limits that need it are not checked.`,
  });

const costSchema = () => {
  const renewal = z
    .strictObject({
      what: text({
        what: 'the name of the part',
        description: 'The part that is renewed.',
        example: 'drive',
        longest: 80,
      }),
      year: wholeYears(
        'the year of the renewal',
        { min: 1, max: LONGEST_LIFE },
        'At the end of which year of the study; not beyond finance.years.',
        '12',
      ),
      cost: money('a cost', 'For the whole array, in finance.currency.', '800'),
    })
    .register(hints, { description: 'A part that is renewed once.' });
  return z
    .strictObject({
      capital_per_kw: z.optional(money('a cost per kW', 'Capital per kW of DC rating.', '1700')),
      capital: z.optional(money('a cost', 'Capital for the whole array; added to capital_per_kw.', '2500')),
      upkeep_per_kw: z.optional(
        money(
          'a yearly cost per kW',
          'Upkeep per kW of DC rating and year. Blank: the cost per kWh is marked incomplete.',
          '15',
        ),
      ),
      upkeep: z.optional(
        money('a yearly cost', 'Upkeep for the whole array and year; added to upkeep_per_kw.', '120'),
      ),
      renewals: z.optional(
        z.array(renewal).register(hints, { description: 'Parts that are renewed in given years.' }),
      ),
    })
    .register(hints, {
      description:
        'What this mount costs, modules included, in finance.currency. Blank: mounts are ranked by energy.',
    });
};

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

const drive = () =>
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
      stuck: z.optional(choice(['flat'], 'How it stands while it does not work. Needed with working.')),
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

/** Study id: it names files and JSON fields, so it stays plain. */
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

const common = () => ({
  id: idField('an id', 'Short name, unique in the study: lower-case letters, digits, - and _.'),
  label: z.optional(
    text({
      what: 'a short text',
      description: 'What reports call it. Blank: made of id and kind.',
      example: 'the ground rack',
      longest: 80,
    }),
  ),
  cost: z.optional(costSchema()),
});

/** One schema for each kind of mount; its keys are the kind's own. */
export const mountSchemas = (convert: Convert) => {
  const slant = () =>
    z.optional(
      length(
        convert,
        'a slant length',
        '3.5 m',
        'Length of a rack or tracker plane, measured along its slope.',
      ),
    );
  const axisHeight = () =>
    z.optional(length(convert, 'a height', '1.5 m', 'Height of the axis above ground.'));
  return {
    'roof-plane': z
      .strictObject({
        kind: z.literal('roof-plane'),
        ...common(),
        tilt: tilt(
          convert,
          "The roof's own slope: degrees from horizontal, a slope such as 3:12, or a grade such as 25 %.",
        ),
        azimuth: azimuth(convert, 'The way the roof faces: degrees clockwise from true north, 180 is south.'),
        air_behind: z.optional(
          length(
            convert,
            'a gap',
            '100 mm',
            'Clear gap between the roof and the back of the modules.',
            'or zero',
          ),
        ),
      })
      .register(hints, { description: 'Modules parallel to a roof.' }),
    'fixed-tilt': z
      .strictObject({
        kind: z.literal('fixed-tilt'),
        ...common(),
        tilt: z.optional(
          tiltOrBest(
            convert,
            'Degrees from horizontal, a slope such as 3:12, a grade such as 25 %, or best (also if blank).',
          ),
        ),
        azimuth: z.optional(
          azimuthOrBest(convert, 'Degrees clockwise from true north, 180 is south, or best (also if blank).'),
        ),
        rows: z.optional(rows()),
        slant: slant(),
        lower_edge: z.optional(
          length(convert, 'a height', '0.8 m', 'Height of the lower edge above ground.', 'or zero'),
        ),
      })
      .register(hints, { description: 'A rack on the ground that does not move.' }),
    'single-axis': z
      .strictObject({
        kind: z.literal('single-axis'),
        ...common(),
        axis: z.optional(
          z
            .strictObject({
              azimuth: z.optional(
                azimuth(convert, 'Direction towards which a tilted axis falls. Blank: 180, north-south.'),
              ),
              tilt: z.optional(tilt(convert, 'Of the axis, from horizontal. Blank: 0, level.')),
            })
            .register(hints, { description: 'The axis. Blank: level, north-south.' }),
        ),
        swing: z.optional(swing(convert, 'Greatest turn either way from flat, degrees. Blank: 60.')),
        rows: z.optional(
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
            .register(hints, { description: 'Rows of trackers. Blank: one row, true tracking.' }),
        ),
        slant: slant(),
        axis_height: axisHeight(),
        drive: z.optional(drive()),
      })
      .register(hints, { description: 'A tracker that turns about one axis.' }),
    'dual-axis': z
      .strictObject({
        kind: z.literal('dual-axis'),
        ...common(),
        rows: z.optional(rows()),
        slant: slant(),
        axis_height: axisHeight(),
        drive: z.optional(drive()),
      })
      .register(hints, { description: 'A tracker that faces the sun.' }),
  };
};

export type MountSchemas = ReturnType<typeof mountSchemas>;
export type RawMount = { [K in keyof MountSchemas]: z.infer<MountSchemas[K]> }[keyof MountSchemas];
