import { basename } from 'node:path';
import type { Study } from '../inputs/index.ts';
import { type Problem, TrackworthError } from '../shared/index.ts';
import { atOption, BY_HAND, missingDate } from './option-problems.ts';
import type { WeatherOverrides } from './weather-options.ts';

/** The plane as the options describe it. */
export interface PlaneReadings extends WeatherOverrides {
  readonly weather?: string;
  readonly tilt?: string;
  readonly tiltError?: string;
  readonly bearing?: string;
  readonly bearingError?: string;
  readonly dated?: string;
  readonly declination?: string;
  readonly true?: boolean;
  readonly taken?: string;
  readonly back?: string;
  readonly downslope?: string;
  readonly skyline?: readonly string[];
}

export interface PlaneOptions extends PlaneReadings {
  readonly study?: string;
  readonly mount?: string;
  readonly json?: boolean;
}

/** The mount's id in the study that stands for the options. */
export const PLANE = 'plane';
/** The name of the study that is no file: one that no file has. */
const NO_FILE = '';

const skylinesOf = ({ skyline, true: isTrue, dated, declination }: PlaneReadings) =>
  skyline?.map((file) => ({
    name: basename(file).slice(0, 60),
    file,
    bearings: isTrue ? 'true' : 'magnetic',
    ...(isTrue ? {} : { dated, declination }),
  }));

/** The study that says what the options say, so that both are checked and worked out by the same rules. */
const studyText = (r: PlaneReadings): string =>
  JSON.stringify({
    title: PLANE,
    weather: { file: r.weather, label: r.label },
    site: {
      latitude: r.latitude,
      longitude: r.longitude,
      elevation: r.elevation,
      utc_offset: r.utcOffset,
      skyline: skylinesOf(r),
    },
    mounts: [
      {
        id: PLANE,
        kind: 'roof-plane',
        slope: { reading: r.tilt, error: r.tiltError },
        bearing: {
          [r.true ? 'true' : 'magnetic']: r.bearing,
          back: r.back,
          taken: r.taken,
          downslope: r.downslope,
          dated: r.dated,
          declination: r.declination,
          error: r.bearingError,
        },
      },
    ],
  });

/** The first that fits the beginning of a field. */
const OPTION_OF_FIELD: readonly (readonly [field: string, option: string])[] = [
  [`mounts.${PLANE}.slope.error`, '--tilt-error'],
  [`mounts.${PLANE}.slope`, '--tilt'],
  [`mounts.${PLANE}.bearing.error`, '--bearing-error'],
  ...['back', 'taken', 'downslope', 'dated', 'declination'].map(
    (key) => [`mounts.${PLANE}.bearing.${key}`, `--${key}`] as const,
  ),
  [`mounts.${PLANE}.bearing`, '--bearing'],
  ['site.skyline', '--skyline'],
  ['weather', '--weather'],
];

/** What only shows once the place is known names the bearing as a whole. */
const OPTION_OF_CODE: Record<string, string> = {
  'ambiguous-facing': '--downslope',
  'wrong-downslope': '--downslope',
};

const FIX_OF_CODE: Record<string, string> = {
  'date-outside-model': BY_HAND,
  'declination-twice': 'Leave out --declination, or --true.',
  'duplicate-name': 'Name each file once, and after the point of the array where it was read.',
};

const optionOf = ({ code, field = '' }: Problem): string =>
  OPTION_OF_CODE[code] ??
  OPTION_OF_FIELD.find(([start]) => field.startsWith(start))?.[1] ??
  'the command line';

/** A skyline repeats what the bearing says of declination; a problem of both is told once, of the option they share. */
const said = (problem: Problem): Problem => {
  const option = optionOf(problem);
  const shared = /^site\.skyline\.(?:#\d+\.)?(dated|declination)$/.exec(problem.field ?? '');
  const fix = FIX_OF_CODE[problem.code];
  return { ...atOption(problem, shared ? `--${shared[1]}` : option), ...(fix === undefined ? {} : { fix }) };
};

const eachOnce = (problems: readonly Problem[]): Problem[] => [
  ...new Map(problems.map((problem) => [`${problem.field} ${problem.code}`, problem])).values(),
];

/**
 * Problems of the study that stands for the options, said of the options: wrong usage. Those of a file keep its name,
 * and make the whole an error of input.
 */
export const ofOptions = (error: unknown): never => {
  if (!(error instanceof TrackworthError)) throw error;
  const inFile = error.problems.filter(({ file }) => file !== undefined && file !== NO_FILE);
  const own = error.problems.filter((problem) => !inFile.includes(problem));
  throw new TrackworthError(inFile.length > 0 ? 'input' : 'usage', [...eachOnce(own.map(said)), ...inFile], {
    cause: error,
  });
};

/** What must be there before anything can be read. */
const missing = (r: PlaneReadings): Problem[] => {
  const lacking = (option: string, expected: string, example: string): Problem => ({
    code: 'missing-option',
    field: option,
    expected,
    found: 'none',
    fix: `Write for example ${option} ${example}, or name a plane of a study: --study site.yaml --mount roof.`,
  });
  return [
    ...(r.weather === undefined ? [lacking('--weather', 'the weather file of the place', 'year.epw')] : []),
    ...(r.tilt === undefined ? [lacking('--tilt', 'the slope of the plane', '3:12')] : []),
    ...(r.bearing === undefined ? [lacking('--bearing', 'the bearing of the plane', '150')] : []),
    ...(r.bearing !== undefined && !r.true && r.dated === undefined && r.declination === undefined
      ? [{ ...missingDate, fix: `${missingDate.fix} A bearing from a map goes with --true.` }]
      : []),
  ];
};

/**
 * The study that the options describe.
 * @throws TrackworthError of kind `usage` with every problem, each said of its option
 */
export const studyOfReadings = async (readings: PlaneReadings): Promise<Study> => {
  const lacking = missing(readings);
  if (lacking.length > 0) throw new TrackworthError('usage', lacking);
  const { readStudy } = await import('../inputs/index.ts');
  return readStudy({ file: NO_FILE, text: studyText(readings) }).catch(ofOptions);
};
