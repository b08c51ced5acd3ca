import * as z from 'zod/mini';
import type { Convert } from '../convert.ts';
import { hints } from '../fields/field.ts';
import { coordinate, utcOffset } from '../fields/place.ts';
import { quantity } from '../fields/quantity.ts';
import { shareOr } from '../fields/share.ts';
import { choice } from '../fields/words.ts';
import type { Present } from './present.ts';
import { wherePresent } from './present.ts';
import { skyline } from './skyline.ts';

export const site = (convert: Convert, has: Present) =>
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
      skyline: wherePresent(has('site', 'skyline'), () => z.optional(skyline(convert))),
    })
    .register(hints, { description: 'Where the array stands. Blank: as the weather file says.' });

export const sky = () =>
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
