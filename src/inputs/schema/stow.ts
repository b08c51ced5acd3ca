import * as z from 'zod/mini';
import type { Convert } from '../convert.ts';
import { side, turn } from '../fields/angles.ts';
import { hints } from '../fields/field.ts';
import { quantity } from '../fields/quantity.ts';
import { bareNumber } from '../fields/words.ts';
import { refuseIn } from './survey-issues.ts';

const speed = (convert: Convert, what: string, example: string, description: string) =>
  quantity(convert, { what, unit: 'm/s', range: { above: 0, max: 110 }, example, description });

const keys = (convert: Convert) => ({
  gust: speed(
    convert,
    'a gust',
    '18 m/s',
    "Gust at 10 m at which it parks: the weather file's hourly mean times gust_factor.",
  ),
  gust_factor: z.optional(
    bareNumber(
      'a gust factor',
      { min: 1, max: 3 },
      'Gust over hourly mean. Blank: 1.5, an assumption.',
      '1.5',
    ),
  ),
  release: z.optional(
    speed(convert, 'a gust', '12 m/s', 'It goes back to work once gusts stay below this. Blank: as gust.'),
  ),
  hold: z.optional(
    quantity(convert, {
      what: 'a time',
      unit: 'h',
      range: { min: 0, max: 168 },
      example: '3 h',
      description: 'How long gusts must stay below release. A bare number is hours. Blank: 0.',
    }),
  ),
});

interface Gusts {
  readonly gust: number;
  readonly release?: number | undefined;
}
const releaseIssues = ({ gust, release }: Gusts) =>
  release === undefined || release <= gust
    ? []
    : [
        refuseIn(['release'], {
          code: 'wrong-value',
          expected: `a gust of at most ${Number(gust.toPrecision(6))} m/s, at which it parks`,
          fix: 'A tracker is released in less wind than it parks in: write a lower release or leave it blank.',
        }),
      ];

export const stowTurn = (convert: Convert) =>
  z
    .strictObject({
      ...keys(convert),
      angle: z.optional(turn(convert, 'Turn from flat while it is parked, without a sign. Blank: 0, flat.')),
      faces: z.optional(side()),
    })
    .check(({ value, issues }) => {
      issues.push(...releaseIssues(value));
    })
    .register(hints, { description: 'When it parks in wind, and how. Blank: not counted.' });

export const stowTilt = (convert: Convert) =>
  z
    .strictObject({
      ...keys(convert),
      angle: z.optional(
        quantity(convert, {
          what: 'a tilt',
          unit: 'deg',
          range: { min: 0, max: 90 },
          example: '0',
          description: 'Tilt towards the equator while it is parked, from horizontal. Blank: 0, flat.',
        }),
      ),
    })
    .check(({ value, issues }) => {
      issues.push(...releaseIssues(value));
    })
    .register(hints, { description: 'When it parks in wind, and how. Blank: not counted.' });
