import * as z from 'zod/mini';
import type { Convert } from '../convert.ts';
import { hints } from '../fields/field.ts';
import { heat } from '../fields/heat.ts';
import { quantity } from '../fields/quantity.ts';
import { share } from '../fields/share.ts';

export const array = (convert: Convert) => {
  const side = (what: string, example: string, above: number, max: number, description: string) =>
    quantity(convert, {
      what,
      unit: 'm',
      range: { above, max },
      example,
      description: `${description} A bare number is metres.`,
      fix: `A bare number is metres; write for example ${example}.`,
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
              fix: 'A bare number is W; write for example 430 W.',
            }),
            length: z.optional(side('a length', '1.76 m', 0, 10, 'Longer side of one module.')),
            width: z.optional(side('a width', '1.13 m', 0, 10, 'Shorter side of one module.')),
            thickness: z.optional(side('a thickness', '35 mm', 0, 0.5, 'With its frame.')),
            heat: z.optional(
              heat(
                'Change of power per kelvin, with its unit, negative. Blank: -0.35 %/K, common practice for crystalline silicon.',
              ),
            ),
          })
          .register(hints, { description: 'One module. Blank: power is not rounded to whole modules.' }),
      ),
    })
    .register(hints, { description: 'The array. Blank: 1 kW is compared, without an inverter.' });
};

export const losses = () => {
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
