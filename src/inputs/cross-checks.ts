import type { Fault } from './fault.ts';
import { isGroup, rawAt } from './fault.ts';
import { nearest } from './nearest.ts';
import { SNOW_EXPECTED, SNOW_FIX } from './schema/snow.ts';
import { shown } from './shown.ts';
import { surveyFaults } from './survey-checks.ts';
import type { Path, Position } from './text/place.ts';

const idOf = (mount: unknown): string | null => {
  const id = rawAt(mount, ['id']);
  return typeof id === 'string' || typeof id === 'number' ? String(id).trim() : null;
};

const twins = (mounts: readonly unknown[], at: (path: Path) => Position): Fault[] =>
  mounts.flatMap((mount, i): Fault[] => {
    const id = idOf(mount);
    const first = mounts.findIndex((other) => idOf(other) === id);
    if (id === null || first === i) return [];
    const { line } = at(['mounts', first, 'id']);
    return [
      {
        code: 'duplicate-id',
        path: ['mounts', i, 'id'],
        expected: 'an id that no other mount has',
        found: `${shown(id)} again, first on line ${line}`,
        fix: `Give one of the two another id, for example ${id}-2.`,
      },
    ];
  });

const drives = (mounts: readonly unknown[]): Fault[] =>
  mounts.flatMap((mount, i): Fault[] => {
    const drive = rawAt(mount, ['drive']);
    if (!isGroup(drive)) return [];
    const [working, stuck] = [drive.working, drive.stuck];
    if ((working === undefined) === (stuck === undefined)) return [];
    const missing = stuck === undefined ? 'stuck' : 'working';
    return [
      {
        code: 'missing-key',
        path: ['mounts', i, 'drive', missing],
        expected: 'working and stuck together',
        found: `${missing === 'stuck' ? 'working' : 'stuck'} alone`,
        fix:
          missing === 'stuck'
            ? `Add stuck: ${rawAt(mount, ['kind']) === 'turntable' ? 'equator' : 'flat'}.`
            : 'Add for example working: 97 %, or remove stuck.',
      },
    ];
  });

/** An angle written in degrees; NaN in other units, which are converted elsewhere. */
const asDegrees = (raw: unknown): number =>
  typeof raw === 'string' && !/^[^a-z]*(?:deg\w*)?$/i.test(raw.trim()) ? Number.NaN : asWhole(raw);

/** Limits that leave a mast no turn, or no elevation. */
const reach = (mounts: readonly unknown[]): Fault[] =>
  mounts.flatMap((mount, i): Fault[] => {
    const at = (...path: string[]) => asDegrees(rawAt(mount, path));
    const [from, to] = [at('turns', 'from'), at('turns', 'to')];
    const [lowest, highest] = [at('elevation', 'lowest'), at('elevation', 'highest')];
    const faults: Fault[] = [];
    if (Math.abs(from - to) % 360 === 0)
      faults.push({
        code: 'no-turn',
        path: ['mounts', i, 'turns', 'to'],
        expected: 'another azimuth than that of from',
        found: String(to),
        fix: 'Leave turns blank where it turns all round.',
      });
    if (lowest > highest)
      faults.push({
        code: 'limits-crossed',
        path: ['mounts', i, 'elevation', 'lowest'],
        expected: `at most the highest, ${highest}`,
        found: String(lowest),
        fix: 'An upright plane faces a sun at 0 degrees, a flat one at 90: lowest is the steeper limit.',
      });
    return faults;
  });

/** On sloping ground the axis follows the ground, so its tilt is not a second key. */
const axisAndGround = (mounts: readonly unknown[]): Fault[] =>
  mounts.flatMap((mount, i): Fault[] =>
    rawAt(mount, ['ground']) === undefined || rawAt(mount, ['axis', 'tilt']) === undefined
      ? []
      : [
          {
            code: 'given-twice',
            path: ['mounts', i, 'axis', 'tilt'],
            expected: 'one of axis.tilt and ground',
            found: 'both',
            fix: 'Remove axis.tilt: it follows from the ground and the azimuth of the axis.',
          },
        ],
  );

/** Braces without a month say neither that there is snow nor that there is none. */
const emptySnow = (mounts: readonly unknown[]): Fault[] =>
  mounts.flatMap((mount, i): Fault[] => {
    const snow = rawAt(mount, ['snow']);
    if (!isGroup(snow) || Object.values(snow).some((share) => share !== undefined)) return [];
    return [
      {
        code: 'wrong-value',
        path: ['mounts', i, 'snow'],
        expected: SNOW_EXPECTED,
        found: 'a group without keys',
        fix: SNOW_FIX,
      },
    ];
  });

const asWhole = (raw: unknown): number => {
  const value = typeof raw === 'string' ? Number.parseFloat(raw) : raw;
  return typeof value === 'number' ? value : Number.NaN;
};

const lateRenewals = (raw: unknown, mounts: readonly unknown[]): Fault[] => {
  const years = asWhole(rawAt(raw, ['finance', 'years']));
  return mounts.flatMap((mount, i) => {
    const renewals = rawAt(mount, ['cost', 'renewals']);
    return (Array.isArray(renewals) ? renewals : []).flatMap((renewal, j): Fault[] => {
      const year = asWhole(rawAt(renewal, ['year']));
      if (!Number.isInteger(year) || !(year > years)) return [];
      return [
        {
          code: 'late-renewal',
          path: ['mounts', i, 'cost', 'renewals', j, 'year'],
          expected: `a year of the study's life, from 1 to ${years}`,
          found: String(year),
          fix: 'Remove the renewal, or lengthen finance.years.',
        },
      ];
    });
  });
};

const reference = (raw: unknown, mounts: readonly unknown[]): Fault[] => {
  const given = rawAt(raw, ['compare_with']);
  const id = idOf({ id: given });
  if (id === null || id === '') return [];
  const ids = [...new Set(mounts.map(idOf))].filter((other) => other !== null);
  const path = ['compare_with'];
  const kind = rawAt(
    mounts.find((mount) => idOf(mount) === id),
    ['kind'],
  );
  if (!ids.includes(id)) {
    const close = nearest(id, ids);
    const fix = close ? `Did you mean ${close}?` : 'Write the id of a fixed mount.';
    return ids.length === 0
      ? []
      : [
          {
            code: 'unknown-mount',
            path,
            expected: `the id of a mount (${ids.join(', ')})`,
            found: shown(id),
            fix,
          },
        ];
  }
  if (kind !== 'single-axis' && kind !== 'dual-axis' && kind !== 'turntable') return [];
  const fixed = mounts.filter((mount) =>
    ['roof-plane', 'fixed-tilt'].includes(rawAt(mount, ['kind']) as string),
  );
  const fix =
    fixed.length === 0
      ? 'Gains are counted from a mount that does not move: add one, or leave compare_with blank.'
      : `Gains are counted from a mount that does not move: write ${fixed.map(idOf).join(' or ')}.`;
  return [
    {
      code: 'reference-moves',
      path,
      expected: 'the id of a fixed mount',
      found: kind === 'turntable' ? `${id}, a turntable` : `${id}, a ${kind} tracker`,
      fix,
    },
  ];
};

const lightColumns = (raw: unknown): Fault[] => {
  const table = rawAt(raw, ['weather', 'table']);
  if (!isGroup(table)) return [];
  const has = (key: string) => table[key] !== undefined;
  if (has('ghi') || (has('dni') && has('dhi'))) return [];
  return [
    {
      code: 'missing-key',
      path: ['weather', 'table', 'ghi'],
      expected: 'a column for ghi, or for both dni and dhi',
      found: has('dni') ? 'dni alone' : has('dhi') ? 'dhi alone' : 'no column of irradiance',
      fix: 'Add for example ghi: GHI, with the name that the column has in the file.',
    },
  ];
};

/** What only shows when parts of the study are held side by side; reads raw values, so it works beside other faults. */
export const crossFaults = (raw: unknown, at: (path: Path) => Position): Fault[] => {
  const list = rawAt(raw, ['mounts']);
  const mounts: readonly unknown[] = Array.isArray(list) ? list : [];
  return [
    ...twins(mounts, at),
    ...drives(mounts),
    ...axisAndGround(mounts),
    ...reach(mounts),
    ...emptySnow(mounts),
    ...lateRenewals(raw, mounts),
    ...reference(raw, mounts),
    ...lightColumns(raw),
    ...surveyFaults(raw, mounts),
  ];
};
