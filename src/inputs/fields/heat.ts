import { field, Refusal } from './field.ts';
import { fromPercent, NUMBER_AND_REST, plainText } from './range.ts';

const EXAMPLE = '-0.34 %/K';
const EXPECTED = 'the change of power per kelvin with its unit, negative';
const UNIT = /^(%|1)? ?(?:\/|per) ?(?:K|°C|ºC|C|deg ?C|degrees? C(?:elsius)?|kelvin)$/i;
/** No cell material loses more than 2 % per kelvin; beyond that the unit is wrong. */
const STEEPEST_PER_K = -0.02;

/**
 * `-0.34 %/K` or `-0.0034 /K` to a fraction per kelvin. It must carry its unit: a bare -0.34 may be meant in per
 * cent, as data sheets print it, or as a fraction, a hundredfold apart.
 */
export const readHeat = (raw: unknown): number => {
  if (typeof raw === 'number')
    throw new Refusal(
      EXPECTED,
      `A bare number may be per cent or a fraction, a hundredfold apart; write its unit, as in ${EXAMPLE} or -0.0034 /K.`,
    );
  const parts = typeof raw === 'string' ? NUMBER_AND_REST.exec(plainText(raw)) : null;
  const unit = parts ? UNIT.exec(parts[2]) : null;
  if (!parts || !unit) throw new Refusal(EXPECTED, `Write for example ${EXAMPLE} or -0.0034 /K.`);
  const value = unit[1] === '%' ? fromPercent(Number(parts[1])) : Number(parts[1]);
  if (!(value < 0))
    throw new Refusal(EXPECTED, `Modules lose power as they warm, so write it with a minus: ${EXAMPLE}.`);
  if (value < STEEPEST_PER_K)
    throw new Refusal(
      EXPECTED,
      `That would be ${Number((value * 100).toPrecision(6))} % per kelvin; did you mean ${parts[1]} %/K?`,
    );
  return value;
};

export const heat = (description: string) =>
  field(
    {
      description,
      example: EXAMPLE,
      expected: EXPECTED,
      form: { type: 'string', pattern: '^ *[-−–].*[0-9].*[CKck]' },
    },
    readHeat,
  );
