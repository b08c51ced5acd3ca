import * as z from 'zod/mini';
import { hints } from '../fields/field.ts';
import { share } from '../fields/share.ts';
import { money, text, wholeYears } from '../fields/words.ts';

/** Longest life that a study may ask for, years. */
export const LONGEST_LIFE = 100;

export const finance = () =>
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

export const cost = () => {
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
