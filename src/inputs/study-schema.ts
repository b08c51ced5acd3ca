import * as z from 'zod/mini';
import type { Convert } from './convert.ts';
import { hints } from './fields/field.ts';
import { heat } from './fields/heat.ts';
import { coordinate, utcOffset } from './fields/place.ts';
import { quantity } from './fields/quantity.ts';
import { share, shareOr } from './fields/share.ts';
import { choice, flag, text, wholeYears } from './fields/words.ts';
import { idField, LONGEST_LIFE, mountSchemas } from './mount-schema.ts';

// A study is read once: compiling validators, which zod does for speed in long runs, would cost more than it saves.
z.config({ jitless: true });

const column = (description: string) => {
  const name = () => text({ what: 'the name of a column', description, example: 'GHI' });
  const unit = text({
    what: 'a unit',
    description: 'The unit that the column is in, for example W/m2, kJ/m2, degF, mph.',
    example: 'kJ/m2',
  });
  return z
    .union([name(), z.strictObject({ column: name(), unit: z.optional(unit) })])
    .register(hints, { description });
};

const weather = (convert: Convert) =>
  z
    .strictObject({
      file: text({
        what: 'the name of the weather file',
        description: 'EPW, TMY2, TMY3 or a plain table, gzipped or not: relative to this study, or absolute.',
        example: 'orlin.epw',
      }),
      table: z.optional(
        z
          .strictObject({
            time: column('Column with local standard time, ISO 8601 (2021-01-01 00:00).'),
            ghi: z.optional(column('Column of global horizontal irradiance, W/m2.')),
            dni: z.optional(column('Column of direct normal irradiance, W/m2.')),
            dhi: z.optional(column('Column of diffuse horizontal irradiance, W/m2.')),
            temperature: z.optional(column('Column of air temperature, degrees C.')),
            wind: z.optional(column('Column of wind speed at 10 m, m/s.')),
          })
          .register(hints, {
            description: 'For a plain table: which column holds what. Needs ghi, or dni and dhi.',
          }),
      ),
      label: z.optional(
        choice(
          ['end', 'start', 'middle'],
          "What the file's times mark of their hour. Blank: as the file's format says.",
        ),
      ),
      add_minutes: z.optional(
        quantity(convert, {
          what: 'a time shift',
          unit: 'min',
          range: { min: -720, max: 720 },
          example: '60',
          description: "Minutes to add to the file's times. Blank: 0.",
        }),
      ),
      accept_clock: z.optional(flag('true: the clock finding has been looked at and the file is right.')),
    })
    .register(hints, { description: 'The hourly typical year.' });

const site = (convert: Convert) =>
  z
    .strictObject({
      latitude: z.optional(
        coordinate(convert, 'latitude', 'Degrees, north positive. Blank: from the weather file.'),
      ),
      longitude: z.optional(
        coordinate(convert, 'longitude', 'Degrees, east positive. Blank: from the weather file.'),
      ),
      elevation: z.optional(
        quantity(convert, {
          what: 'an elevation',
          unit: 'm',
          range: { min: -500, max: 9000 },
          example: '1634',
          description: 'Above sea level; a bare number is metres. Blank: from the weather file.',
        }),
      ),
      utc_offset: z.optional(
        utcOffset(
          'Hours that local standard time is ahead of UTC: -7, 5.75, "+05:45". Blank: from the weather file.',
        ),
      ),
      roof_height: z.optional(
        quantity(convert, {
          what: 'a height',
          unit: 'm',
          range: { min: 0, max: 1000 },
          example: '5 m',
          description:
            'Of the roof above ground; a bare number is metres. Blank: wind on the roof is not checked.',
        }),
      ),
    })
    .register(hints, { description: 'Where the array stands. Blank: as the weather file says.' });

const sky = () =>
  z
    .strictObject({
      model: z.optional(
        choice(
          ['perez', 'hay-davies', 'reindl', 'isotropic'],
          'Model of the light on a tilted plane. Blank: perez. isotropic is a lower bound.',
        ),
      ),
      albedo: z.optional(
        shareOr(
          {
            what: 'a reflectance',
            range: { min: 0, max: 1 },
            example: '0.2',
            description:
              "Reflectance of the ground, 0 to 1; file takes the weather file's own column. Blank: 0.2.",
          },
          'file',
        ),
      ),
    })
    .register(hints, { description: 'How light reaches a tilted plane.' });

const array = (convert: Convert) => {
  const side = (what: string, example: string, above: number, max: number, description: string) =>
    quantity(convert, {
      what,
      unit: 'm',
      range: { above, max },
      example,
      description: `${description} A bare number is metres.`,
      outside: `A bare number is metres; write for example ${example}.`,
    });
  return z
    .strictObject({
      dc: quantity(convert, {
        what: 'a power',
        unit: 'kW',
        range: { above: 0 },
        example: '12 kW',
        description: 'DC rating of the modules; a bare number is kW.',
      }),
      inverter: z.optional(
        quantity(convert, {
          what: 'a power',
          unit: 'kW',
          range: { above: 0 },
          example: '10 kW',
          description:
            'AC rating of the inverter; a bare number is kW. Blank: its ceiling is not counted, which flatters trackers.',
        }),
      ),
      module: z.optional(
        z
          .strictObject({
            power: quantity(convert, {
              what: 'a power',
              unit: 'W',
              range: { min: 1, max: 5000 },
              example: '430 W',
              description: 'Rated power of one module; a bare number is W.',
              outside: 'A bare number is W; write for example 430 W.',
            }),
            length: z.optional(side('a length', '1.76 m', 0, 10, 'Longer side of one module.')),
            width: z.optional(side('a width', '1.13 m', 0, 10, 'Shorter side of one module.')),
            thickness: z.optional(side('a thickness', '35 mm', 0, 0.5, 'With its frame.')),
            heat: z.optional(
              heat('Change of power per kelvin, with its unit, negative. Blank: heat is not counted.'),
            ),
          })
          .register(hints, { description: 'One module. Blank: power is not rounded to whole modules.' }),
      ),
    })
    .register(hints, { description: 'The array. Blank: 1 kW is compared, without an inverter.' });
};

const losses = () => {
  const loss = (example: string, description: string) =>
    z.optional(
      share({
        what: 'a share lost',
        range: { min: 0, below: 1 },
        example,
        description: `${description} Blank: not counted.`,
      }),
    );
  return z
    .strictObject({
      dirt: loss('2 %', 'Light lost to dirt.'),
      module_spread: loss('1 %', 'Lost because modules differ.'),
      cables: loss('1.5 %', 'Lost in DC and AC cables.'),
      conversion: loss('3.5 %', 'Lost in the inverter below its ceiling.'),
    })
    .register(hints, { description: 'Losses that all mounts share.' });
};

const finance = () =>
  z
    .strictObject({
      real_rate: z.optional(
        share({
          what: 'a yearly rate',
          range: { min: 0, below: 1 },
          example: '6 %',
          description: 'Discount rate above inflation. Blank: cost per kWh at 4, 7 and 10 %.',
        }),
      ),
      years: z.optional(
        wholeYears(
          'the life of the array',
          { min: 1, max: LONGEST_LIFE },
          'Years that the array is to run.',
          '25',
        ),
      ),
      ageing: z.optional(
        share({
          what: 'a yearly loss of yield',
          range: { min: 0, below: 0.2 },
          example: '0.5 %',
          description: 'Yield lost per year, on the year before. Blank: not counted.',
        }),
      ),
      currency: z.optional(
        text({
          what: 'three letters or another short name of a currency',
          description: 'Named beside every amount, for example USD.',
          example: 'USD',
          longest: 12,
          pattern: /^[^\r\n]+$/,
        }),
      ),
    })
    .register(hints, { description: 'Life and rate for the cost per kWh.' });

const wind = (convert: Convert) => {
  const limit = (example: string, description: string) =>
    z.optional(
      quantity(convert, {
        what: 'a length',
        unit: 'm',
        range: { above: 0, max: 1000 },
        example,
        description: `${description} A bare number is metres. Blank: not checked.`,
      }),
    );
  return z
    .strictObject({
      design_gust: z.optional(
        quantity(convert, {
          what: 'a 3-second gust',
          unit: 'm/s',
          range: { min: 10, max: 110 },
          example: '115 mph',
          description:
            "The code's 3-second gust at 10 m, not the wind of a weather file; a bare number is m/s.",
          outside: 'A bare number is metres per second; write for example 115 mph.',
        }),
      ),
      exposure: z.optional(
        choice(
          ['B', 'C', 'D'],
          'B: town or wood, C: open country, D: open water or flat shore. Blank: no wind pressure.',
        ),
      ),
      limits: z.optional(
        z
          .strictObject({
            roof_projection: limit('10 in', 'Greatest rise above the roof.'),
            height: limit('3 m', 'Greatest height of the highest edge above ground.'),
          })
          .register(hints, { description: 'Limits that local rules set.' }),
      ),
    })
    .register(hints, {
      description: 'Wind screening. It does not replace the local code and a licensed engineer.',
    });
};

/** The keys of a study in the order of the template; `mounts` holds whatever `oneMount` says. */
const studyWith = <M extends z.ZodMiniType>(convert: Convert, oneMount: M) =>
  z
    .strictObject({
      $schema: z.optional(
        text({
          what: 'the place of a schema',
          description: 'For editors; trackworth passes over it.',
          example: 'study.schema.json',
        }),
      ),
      title: z.optional(
        text({
          what: 'a text',
          description: "Title of the report. Blank: the study file's name.",
          example: 'Orlin Bench',
        }),
      ),
      weather: weather(convert),
      site: z.optional(site(convert)),
      sky: z.optional(sky()),
      array: z.optional(array(convert)),
      mounts: z
        .array(oneMount)
        .check(z.minLength(1))
        .register(hints, { description: 'The mounts to compare.' }),
      losses: z.optional(losses()),
      finance: z.optional(finance()),
      wind: z.optional(wind(convert)),
      advice: z.optional(
        z
          .strictObject({
            objective: z.optional(
              choice(
                ['lowest cost per kWh', 'most kWh per kW', 'best worst month'],
                'What the choice is to serve. Blank: cost per kWh where costs are given, else kWh per kW.',
              ),
            ),
          })
          .register(hints, { description: 'What the recommendation is to serve.' }),
      ),
      compare_with: z.optional(
        idField(
          'the id of a fixed mount',
          'The mount that gains are counted from. Blank: the ground rack with the most kWh per kW.',
        ),
      ),
    })
    .register(hints, { title: 'trackworth study', description: 'What to compare, where, at what cost.' });

/** Everything but the inside of the mounts, which are read one by one by their own kind. */
export const studyFrame = (convert: Convert) => studyWith(convert, z.unknown());

/** The whole study in one schema, for editors. */
export const wholeStudy = (convert: Convert) => {
  const kinds = mountSchemas(convert);
  const { 'roof-plane': roof, 'fixed-tilt': rack, 'single-axis': single, 'dual-axis': dual } = kinds;
  return studyWith(convert, z.discriminatedUnion('kind', [roof, rack, single, dual]));
};

export type RawStudy = z.infer<ReturnType<typeof studyFrame>>;
