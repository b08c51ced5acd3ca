import * as z from 'zod/mini';
import type { Convert } from '../convert.ts';
import { hints } from '../fields/field.ts';
import { share } from '../fields/share.ts';
import { choice, text } from '../fields/words.ts';
import { array, losses } from './array.ts';
import { finance } from './money.ts';
import { idField } from './mount-parts.ts';
import { mountSchemas } from './mounts.ts';
import type { Present } from './present.ts';
import { everything, wherePresent } from './present.ts';
import { site, sky } from './site.ts';
import { weather } from './weather.ts';
import { wind } from './wind.ts';

// A study is read once: compiling validators, which zod does for speed in long runs, would cost more than it saves.
z.config({ jitless: true });

const least = (what: string, description: string) =>
  z.optional(
    share({
      what,
      range: { above: 0, max: 1 },
      example: '75 %',
      description: `${description} Blank: not checked.`,
    }),
  );

const advice = () =>
  z
    .strictObject({
      objective: z.optional(
        choice(
          ['lowest cost per kWh', 'most kWh per kW', 'best worst month'],
          'What the choice is to serve. Blank: cost per kWh where costs are given, else kWh per kW.',
        ),
      ),
      minimum_tof: least(
        'a tilt-and-orientation factor',
        'Least TOF that a programme asks of fixed planes: their light over that of the best plane.',
      ),
      minimum_tsrf: least(
        'a total solar resource fraction',
        'Least TSRF that a programme asks of fixed planes: TOF times what the skyline leaves.',
      ),
    })
    .register(hints, { description: 'What the recommendation is to serve.' });

/** The keys of a study in the order of the template; `mounts` holds whatever `oneMount` says. */
const studyWith = <M extends z.ZodMiniType>(convert: Convert, oneMount: M, has: Present) =>
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
      weather: weather(convert, has),
      site: wherePresent(has('site'), () => z.optional(site(convert, has))),
      sky: wherePresent(has('sky'), () => z.optional(sky())),
      array: wherePresent(has('array'), () => z.optional(array(convert))),
      mounts: z
        .array(oneMount)
        .check(z.minLength(1))
        .register(hints, { description: 'The mounts to compare.' }),
      losses: wherePresent(has('losses'), () => z.optional(losses())),
      finance: wherePresent(has('finance'), () => z.optional(finance())),
      wind: wherePresent(has('wind'), () => z.optional(wind(convert))),
      advice: wherePresent(has('advice'), () => z.optional(advice())),
      compare_with: z.optional(
        idField(
          'the id of a fixed mount',
          'The mount that gains are counted from. Blank: the ground rack with the most kWh per kW.',
        ),
      ),
    })
    .register(hints, { title: 'trackworth study', description: 'What to compare, where, at what cost.' });

/** Everything that the study has but the inside of its mounts, which are read one by one by their own kind. */
export const studyFrame = (convert: Convert, has: Present) => studyWith(convert, z.unknown(), has);

/** The whole study in one schema, for editors. */
export const wholeStudy = (convert: Convert) => {
  const kinds = mountSchemas(convert, everything);
  const mount = z.discriminatedUnion('kind', [
    kinds['roof-plane'](),
    kinds['fixed-tilt'](),
    kinds['single-axis'](),
    kinds['dual-axis'](),
    kinds.turntable(),
  ]);
  return studyWith(convert, mount, everything);
};

export type RawStudy = z.infer<ReturnType<typeof studyFrame>>;
