import * as z from 'zod/mini';
import type { Convert } from '../convert.ts';
import { hints } from '../fields/field.ts';
import { choice, text } from '../fields/words.ts';
import { array, losses } from './array.ts';
import { finance } from './money.ts';
import { idField } from './mount-parts.ts';
import { mountSchemas } from './mounts.ts';
import { site, sky } from './site.ts';
import { weather } from './weather.ts';
import { wind } from './wind.ts';

// A study is read once: compiling validators, which zod does for speed in long runs, would cost more than it saves.
z.config({ jitless: true });

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
