import * as z from 'zod/mini';
import { MONTH_NAMES } from '../../shared/index.ts';
import { hints } from '../fields/field.ts';
import { share } from '../fields/share.ts';
import { refuseIn } from './survey-issues.ts';

const lost = (month: string) =>
  share({
    what: 'a share of the light',
    range: { min: 0, max: 1 },
    example: '20 %',
    description: `What snow on the modules takes of the light of ${month}.`,
  });

export const SNOW_EXPECTED = 'twelve shares, January to December, of which not all are 100 %';

/** A mount under snow all year delivers nothing, and nothing can be said of it. */
const allCovered = (shares: readonly number[]): boolean =>
  shares.length === 12 && shares.every((taken) => taken === 1);

const refused = (fix: string) => refuseIn([], { code: 'wrong-value', expected: SNOW_EXPECTED, fix });
export const SNOW_FIX = 'Write the months that have snow, for example { Jan: 20 %, Feb: 15 % }.';

type Month = (typeof MONTH_NAMES)[number];
type Months = Partial<Record<Month, number | undefined>>;

/** The shares in order; a month that a group leaves out has no snow. */
export const monthlyShares = (raw: readonly number[] | Months): number[] =>
  Array.isArray(raw) ? [...raw] : MONTH_NAMES.map((month) => (raw as Months)[month] ?? 0);

/** What snow takes month by month: a list of twelve, or the months that have any. */
export const snow = () => {
  const byName = Object.fromEntries(MONTH_NAMES.map((month) => [month, z.optional(lost(month))])) as Record<
    Month,
    ReturnType<typeof optionalShare>
  >;
  return z
    .union([
      z.array(lost('the month')).check(({ value, issues }) => {
        if (value.length !== 12 || allCovered(value)) issues.push(refused(SNOW_FIX));
      }),
      z.strictObject(byName).check(({ value, issues }) => {
        if (allCovered(monthlyShares(value))) issues.push(refused(SNOW_FIX));
      }),
    ])
    .register(hints, {
      description:
        'What snow on the modules takes of the light, month by month; months left out: none. Blank: not counted.',
    });
};

const optionalShare = () => z.optional(lost(''));
