import * as z from 'zod/mini';
import type { Convert } from '../convert.ts';
import { hints } from '../fields/field.ts';
import { quantity } from '../fields/quantity.ts';
import { choice } from '../fields/words.ts';

export const wind = (convert: Convert) => {
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
          fix: 'A bare number is metres per second; write for example 115 mph.',
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
