import * as z from 'zod/mini';
import { checkedSkyline, type SkylinePoint, skylineOfObstacles } from '../../survey/index.ts';
import type { Convert } from '../convert.ts';
import { field, hints, Refusal } from '../fields/field.ts';
import { quantity } from '../fields/quantity.ts';
import { bearing } from '../fields/readings.ts';
import { text } from '../fields/words.ts';
import { obstacleOf } from '../to-readings.ts';
import { northKeys } from './readings.ts';
import { entriesOf, surveyIssues } from './survey-issues.ts';

const POINT = 'a bearing and an elevation angle, two numbers of degrees';

const point = () =>
  field(
    {
      description: 'A bearing, and the elevation angle of the skyline there, in degrees.',
      example: '[120, 8.5]',
      expected: POINT,
      form: { type: 'array', items: { type: 'number' }, minItems: 2, maxItems: 2 },
    },
    (raw): SkylinePoint => {
      if (!Array.isArray(raw) || raw.length !== 2 || !raw.every((x) => typeof x === 'number'))
        throw new Refusal(POINT, 'Write for example [120, 8.5].');
      return { azimuthDeg: raw[0], elevationDeg: raw[1] };
    },
  );

const points = () =>
  z
    .array(point())
    .check(({ value, issues }) => {
      issues.push(...surveyIssues(() => checkedSkyline('', value, 0, entriesOf(value))));
    })
    .register(hints, {
      description: 'Points of the skyline, [bearing, elevation], at least every 15 degrees.',
    });

const obstacle = (convert: Convert) => {
  const length = (what: string, example: string, description: string) =>
    quantity(convert, { what, unit: 'm', range: { above: 0 }, example, description });
  return z.strictObject({
    height: length('a height', '6 m', "Height above the array's lowest point."),
    distance: length('a distance', '20 m', 'Level distance from the array.'),
    from: bearing('Bearing of its left edge as seen from the array.', '100'),
    to: bearing('Bearing of its right edge, clockwise from the left one; 0 to 360 is all round.', '130'),
  });
};

const obstacles = (convert: Convert) =>
  z
    .array(obstacle(convert))
    .check(({ value, issues }) => {
      issues.push(...surveyIssues(() => skylineOfObstacles('', value.map(obstacleOf), 0, entriesOf(value))));
    })
    .register(hints, { description: 'What stands before the sky, by its height and distance.' });

export type RawObstacle = z.infer<ReturnType<typeof obstacle>>;

const NORTHS = 'true or magnetic';

/** YAML hands an unquoted true over as a truth value. */
const north = () =>
  field(
    {
      description: 'The north that the bearings are counted from. Blank: true.',
      example: 'magnetic',
      expected: NORTHS,
      form: { enum: [true, 'true', 'magnetic'] },
    },
    (raw): 'true' | 'magnetic' => {
      if (raw === 'magnetic') return raw;
      if (raw === true || raw === 'true') return 'true';
      throw new Refusal(NORTHS, 'Write bearings: magnetic for a compass, true for a map.');
    },
  );

const one = (convert: Convert) =>
  z
    .strictObject({
      points: z.optional(points()),
      file: z.optional(
        text({
          what: 'the name of a file',
          description: 'A table with the header bearing,elevation: relative to this study, or absolute.',
          example: 'skyline.csv',
        }),
      ),
      obstacles: z.optional(obstacles(convert)),
      bearings: z.optional(north()),
      ...northKeys(),
      name: z.optional(
        text({
          what: 'a short text',
          description: 'The point of the array that it was read from. Blank: point 1, point 2 ...',
          example: 'north-east corner',
          longest: 60,
        }),
      ),
    })
    .register(hints, { description: 'A skyline: points, a file or obstacles.' });

export type RawSkyline = z.infer<ReturnType<typeof one>>;

/** One skyline, or a list of one for each point of the array. */
export const skyline = (convert: Convert) =>
  z.union([z.array(one(convert)).check(z.minLength(1)), one(convert)]).register(hints, {
    description:
      'What stands before the sky, from one point of the array or several. Blank: the horizon is open.',
  });
