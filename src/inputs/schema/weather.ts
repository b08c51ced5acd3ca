import * as z from 'zod/mini';
import type { Convert } from '../convert.ts';
import { hints } from '../fields/field.ts';
import { quantity } from '../fields/quantity.ts';
import { choice, flag, text } from '../fields/words.ts';
import type { Present } from './present.ts';
import { wherePresent } from './present.ts';

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

const table = () =>
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
    });

export const weather = (convert: Convert, has: Present) =>
  z
    .strictObject({
      file: text({
        what: 'the name of the weather file',
        description: 'EPW, TMY2, TMY3 or a plain table, gzipped or not: relative to this study, or absolute.',
        example: 'orlin.epw',
      }),
      table: wherePresent(has('weather', 'table'), () => z.optional(table())),
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
