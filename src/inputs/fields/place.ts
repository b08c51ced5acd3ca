import type { Convert } from '../convert.ts';
import { field, Refusal } from './field.ts';
import type { QuantityRule } from './quantity.ts';
import { numberOrText, quantityWords, readQuantity } from './quantity.ts';
import { plainText, rangeWords } from './range.ts';

const HEMISPHERE = /^([\d.]+ ?(?:°|º|deg)?) ?([NSEW])$/i;

/** Latitude (limit 90, `N` and `S`) or longitude (limit 180, `E` and `W`): north and east count positive. */
export const coordinate = (convert: Convert, what: 'latitude' | 'longitude', description: string) => {
  const [limit, plus, minus] = what === 'latitude' ? [90, 'N', 'S'] : [180, 'E', 'W'];
  const example = what === 'latitude' ? '40.0167' : '-105.25';
  const range = { min: -limit, max: limit };
  const rule: QuantityRule = { what: `a ${what}`, unit: 'deg', range, example, description };
  const fix = what === 'latitude' ? 'North is positive, south negative.' : 'East is positive, west negative.';
  return field({ description, example, expected: quantityWords(rule), form: numberOrText(range) }, (raw) => {
    const letter = typeof raw === 'string' ? HEMISPHERE.exec(plainText(raw)) : null;
    if (!letter) return readQuantity(raw, { ...rule, fix }, convert);
    const side = letter[2].toUpperCase();
    if (side !== plus && side !== minus) throw new Refusal(quantityWords(rule), fix);
    const value = readQuantity(letter[1], { ...rule, fix }, convert);
    return side === plus ? value : -value;
  });
};

const OFFSET = /^(?:UTC|GMT)? ?([+-]?)(\d{1,2})(?::(\d{2}))?$/i;
const OFFSET_RANGE = { min: -12, max: 14 };

/** Hours that local standard time is ahead of UTC: `-7`, `5.75`, `"+05:45"`, `UTC-7`. Whole quarters only. */
export const readUtcOffset = (raw: unknown): number => {
  const expected = `hours ahead of UTC${rangeWords(OFFSET_RANGE)}, in quarters`;
  const fix = 'Write -7, 5.75 or "+05:45": local standard time less UTC, without daylight saving.';
  const text = typeof raw === 'string' ? plainText(raw) : '';
  const clock = OFFSET.exec(text);
  let hours = typeof raw === 'number' ? raw : text === '' ? Number.NaN : Number(text);
  if (clock) {
    hours = Number(clock[2]) + Number(clock[3] ?? 0) / 60;
    if (Number(clock[3] ?? 0) > 59) hours = Number.NaN;
    if (clock[1] === '-' && hours !== 0) hours = -hours;
  }
  if (!(hours >= OFFSET_RANGE.min && hours <= OFFSET_RANGE.max) || !Number.isInteger(hours * 4))
    throw new Refusal(expected, fix);
  return hours;
};

export const utcOffset = (description: string) =>
  field(
    {
      description,
      example: '-7',
      expected: `hours ahead of UTC${rangeWords(OFFSET_RANGE)}, in quarters`,
      form: numberOrText(OFFSET_RANGE),
    },
    readUtcOffset,
  );
