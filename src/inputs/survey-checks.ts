import { COVERED_DATES, dateText, parseCalendarDate } from '../survey/index.ts';
import type { Fault } from './fault.ts';
import { isGroup, rawAt } from './fault.ts';
import { shown } from './shown.ts';
import type { Path } from './text/place.ts';
import { skylineName } from './to-readings.ts';

type Group = Record<string, unknown>;

/** Which of these keys hold something. */
const given = (group: Group, keys: readonly string[]): string[] =>
  keys.filter((key) => group[key] !== undefined);

const missing = (path: Path, expected: string, fix: string): Fault => ({
  code: 'missing-key',
  path,
  expected,
  found: 'nothing',
  fix,
});

/** The second of two keys that say the same thing. */
const oneTooMany = (path: Path, keys: readonly string[], among: string): Fault => ({
  code: 'given-twice',
  path,
  key: keys[keys.length - 1],
  expected: `one of ${among}`,
  found: keys.join(' and '),
  fix: 'Keep one and remove the other.',
});

/** Exactly one of the keys must be there. */
const exactlyOne = (group: Group, path: Path, keys: readonly string[], example: string): Fault[] => {
  const here = given(group, keys);
  const among = `${keys.slice(0, -1).join(', ')} and ${keys[keys.length - 1]}`;
  if (here.length > 1) return [oneTooMany(path, here, among)];
  return here.length === 1
    ? []
    : [missing([...path, keys[0]], `one of ${among}`, `Add for example ${example}.`)];
};

const isOutsideModel = (raw: unknown): boolean => {
  try {
    const date = dateText(parseCalendarDate(raw));
    return date < COVERED_DATES.first || date > COVERED_DATES.last;
  } catch {
    return false; // no date at all, which its own field reports
  }
};

/** Magnetic bearings need a declination, by hand or by their date; true ones must not have it applied again. */
const northFaults = (group: Group, path: Path, magnetic: boolean): Fault[] => {
  const { dated, declination } = group;
  if (!magnetic)
    return declination === undefined
      ? []
      : [
          {
            code: 'declination-twice',
            path: [...path, 'declination'],
            expected: 'no declination beside true bearings, which have it already',
            found: 'one',
            fix: 'Remove it; or enter the bearings as magnetic, if that is how they were read.',
          },
        ];
  if (declination !== undefined) return [];
  if (dated === undefined)
    return [
      missing(
        [...path, 'dated'],
        'dated or declination beside a magnetic bearing',
        'Add the day of the reading as dated: 2026-05-01, or the declination as declination: 16 E.',
      ),
    ];
  if (!isOutsideModel(dated)) return [];
  return [
    {
      code: 'date-outside-model',
      path: [...path, 'dated'],
      expected: `a date from ${COVERED_DATES.first} to ${COVERED_DATES.last}, which the World Magnetic Models cover`,
      found: shown(String(dated)),
      fix: 'Add the declination itself, from a map of that year, as declination: 16 E.',
    },
  ];
};

const bearingFaults = (bearing: Group, path: Path): Fault[] => [
  ...exactlyOne(bearing, path, ['magnetic', 'true'], 'magnetic: 150'),
  ...(given(bearing, ['magnetic', 'true']).length === 1
    ? northFaults(bearing, path, bearing.magnetic !== undefined)
    : []),
];

const LENGTHS = ['rise', 'run', 'rise_error', 'run_error'];

const slopeFaults = (slope: Group, path: Path): Fault[] => {
  const lengths = given(slope, LENGTHS);
  if (slope.reading !== undefined)
    return lengths.length === 0
      ? []
      : [oneTooMany(path, ['reading', lengths[0]], 'reading, or rise and run')];
  if (lengths.length === 0)
    return [missing([...path, 'reading'], 'reading, or rise and run', 'Add for example reading: 3:12.')];
  const lacking = ['rise', 'run'].filter((key) => slope[key] === undefined);
  return [
    ...lacking.map((key) =>
      missing([...path, key], 'rise and run together', `Add for example ${key}: ${EXAMPLE[key]}.`),
    ),
    ...(slope.error === undefined
      ? []
      : [
          {
            code: 'misplaced-key',
            path,
            key: 'error',
            expected: 'rise_error and run_error beside rise and run',
            found: 'error',
            fix: 'Say which of the two may be off: rise_error: 1 in, run_error: 1 in.',
          },
        ]),
  ];
};
const EXAMPLE: Readonly<Record<string, string>> = { rise: '4 ft', run: '12 ft' };

const ON_SITE: readonly (readonly [key: string, onSite: string, example: string])[] = [
  ['tilt', 'slope', 'tilt: 30 deg, or slope: { reading: 3:12, error: 2 }'],
  ['azimuth', 'bearing', 'azimuth: 180, or bearing: { magnetic: 150, dated: 2026-05-01 }'],
];

const mountFaults = (mount: Group, path: Path): Fault[] => [
  ...ON_SITE.flatMap(([key, onSite, example]): Fault[] => {
    const here = given(mount, [key, onSite]);
    if (here.length === 2) return [oneTooMany(path, here, `${key} and ${onSite}`)];
    if (here.length === 1 || mount.kind !== 'roof-plane') return [];
    return [missing([...path, key], `${key}, or ${onSite} as read on site`, `Add for example ${example}.`)];
  }),
  ...(isGroup(mount.bearing) ? bearingFaults(mount.bearing, [...path, 'bearing']) : []),
  ...(isGroup(mount.slope) ? slopeFaults(mount.slope, [...path, 'slope']) : []),
];

const skylineFaults = (skyline: Group, path: Path): Fault[] => [
  ...exactlyOne(skyline, path, ['points', 'file', 'obstacles'], 'points: [ [90, 12], [105, 9] ]'),
  ...(['magnetic', 'true', true, undefined].includes(skyline.bearings as string)
    ? northFaults(skyline, path, skyline.bearings === 'magnetic')
    : []),
];

const sameNames = (skylines: readonly unknown[]): Fault[] => {
  const names = skylines.map((one, i) => {
    const name = rawAt(one, ['name']);
    return skylineName(typeof name === 'object' || name === undefined ? undefined : String(name).trim(), i);
  });
  return names.flatMap((name, i): Fault[] =>
    names.indexOf(name) === i
      ? []
      : [
          {
            code: 'duplicate-name',
            path: ['site', 'skyline', i, 'name'],
            expected: 'a name that no other skyline has',
            found: shown(name),
            fix: 'Name each after the point of the array where it was read.',
          },
        ],
  );
};

/** Which readings go together; reads raw values, so it works beside other faults. */
export const surveyFaults = (raw: unknown, mounts: readonly unknown[]): Fault[] => {
  const skyline = rawAt(raw, ['site', 'skyline']);
  const several = Array.isArray(skyline) ? skyline : [];
  return [
    ...mounts.flatMap((mount, i) =>
      isGroup(mount) && !['single-axis', 'dual-axis', 'turntable'].includes(mount.kind as string)
        ? mountFaults(mount, ['mounts', i])
        : [],
    ),
    ...(isGroup(skyline) ? skylineFaults(skyline, ['site', 'skyline']) : []),
    ...several.flatMap((one, i) => (isGroup(one) ? skylineFaults(one, ['site', 'skyline', i]) : [])),
    ...sameNames(several),
  ];
};
