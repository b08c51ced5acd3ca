import type { MountReadings, Study, StudyBearing, StudyMount, StudySkyline } from '../inputs/index.ts';
import {
  compassWords,
  type Finding,
  type MeasuredWith,
  type Problem,
  TrackworthError,
} from '../shared/index.ts';
import {
  checkedSkyline,
  type DeclinationMistakes,
  dateText,
  declinationShort,
  gapFindings,
  planeAzimuth,
  readSkylineFile,
  type Skyline,
  type SkylineSurvey,
  skylineOfObstacles,
  slopeWords,
  surveySkylines,
} from '../survey/index.ts';
import { type NorthFound, northAt, type SurveyPlace } from './site-north.ts';

export type { SurveyPlace };

/** What the readings of one mount came to. */
export interface MountSurvey {
  /** True azimuth that the plane faces; null where the study gives it outright or asks for the best. */
  readonly azimuthDeg: number | null;
  /** Reading errors, either way, degrees; null where not given. */
  readonly azimuthErrorDeg: number | null;
  readonly tiltErrorDeg: number | null;
  readonly measuredWith: readonly MeasuredWith[];
  /** The raw readings as the user wrote them, one line each. */
  readonly readings: readonly string[];
  /** How the angles follow from them, each with its sum written out. */
  readonly steps: readonly string[];
  /** Azimuths had the declination been forgotten or applied the wrong way; null for true bearings. */
  readonly mistakes: DeclinationMistakes | null;
}

/** What was read on site, worked out once the place is known: what `compareMounts` takes beside study and weather. */
export interface SiteSurvey {
  readonly mounts: ReadonlyMap<string, MountSurvey>;
  /** Null: the horizon is open all round. */
  readonly skyline: SkylineSurvey | null;
  /** Declinations used, in words with their model and uncertainty, each once. */
  readonly declinations: readonly string[];
  readonly findings: readonly Finding[];
}

/** A study without readings or skyline. */
export const NO_SURVEY: SiteSurvey = { mounts: new Map(), skyline: null, declinations: [], findings: [] };

/** The text of a file that the study names, as it names it; throws TrackworthError where it cannot be read. */
export type ReadText = (file: string) => Promise<string>;

/**
 * Works out what a study's readings come to at their place: true azimuths with their errors, and the skyline. A study
 * without readings needs none of it; only mounts with readings are in the map.
 *
 * @param place From the study where it names one, else from the weather file.
 * @param studyFile Name of the study, for messages.
 * @throws TrackworthError of kind `input` with the problems of all mounts and skylines together, each with the study's
 *   field, or with the skyline file and its line.
 */
export const surveySite = async (
  study: Study,
  place: SurveyPlace,
  readText: ReadText,
  studyFile?: string,
): Promise<SiteSurvey> => {
  const problems: Problem[] = [];
  /** The work of one field; its problems are kept for the end, and it gives null for them. */
  const attempt = async <T>(field: string, work: () => Promise<T>): Promise<T | null> => {
    try {
      return await work();
    } catch (trouble) {
      if (!(trouble instanceof TrackworthError)) throw trouble;
      problems.push(...trouble.problems.map((problem) => placed(problem, field, studyFile)));
      return null;
    }
  };

  const mounts: [string, Surveyed<MountSurvey>][] = [];
  for (const mount of study.mounts) {
    const { readings } = mount;
    if (!readings) continue;
    const found = await attempt(`mounts.${mount.id}.bearing`, () => surveyMount(mount, readings, place));
    if (found) mounts.push([mount.id, found]);
  }
  const skylines: Surveyed<Skyline>[] = [];
  const given = study.site.skyline ?? [];
  for (const [i, skyline] of given.entries()) {
    const field = given.length === 1 ? 'site.skyline' : `site.skyline.#${i + 1}`;
    const found = await attempt(field, () => surveySkyline(skyline, place, readText));
    if (found) skylines.push(found);
  }
  if (problems.length > 0) throw new TrackworthError('input', problems);

  const all = [...mounts.map(([, found]) => found), ...skylines];
  return {
    mounts: new Map(mounts.map(([id, { result }]) => [id, result])),
    skyline: skylines.length === 0 ? null : surveySkylines(skylines.map(({ result }) => result)),
    declinations: eachWithItsReadings([
      ...mounts.map(([id, { north }]) => ({ north, reading: `the bearing of ${id}` })),
      ...skylines.map(({ north, result }) => ({ north, reading: `the skyline at ${result.name}` })),
    ]),
    findings: eachOnce(all.flatMap(({ north, findings }) => [...(north?.findings ?? []), ...findings])),
  };
};

interface Surveyed<T> {
  readonly result: T;
  readonly north: NorthFound | null;
  readonly findings: readonly Finding[];
}

/** A problem of a skyline file knows its own place; every other one lies in the study. */
const placed = (problem: Problem, field: string, studyFile: string | undefined): Problem =>
  problem.file === undefined
    ? { ...problem, file: studyFile, field: problem.field ? `${field}.${problem.field}` : field }
    : problem;

/** Each declination once, with the readings that it was applied to. */
const eachWithItsReadings = (
  used: readonly { readonly north: NorthFound | null; readonly reading: string }[],
): string[] => {
  const readings = new Map<string, string[]>();
  for (const { north, reading } of used)
    if (north) readings.set(north.words, [...(readings.get(north.words) ?? []), reading]);
  return [...readings].map(([words, applied]) => `${words}, applied to ${applied.join(' and ')}`);
};

const eachOnce = (findings: readonly Finding[]): Finding[] => [
  ...new Map(findings.map((finding) => [finding.text, finding])).values(),
];

const surveyMount = async (
  { label }: StudyMount,
  { bearing, slope }: MountReadings,
  place: SurveyPlace,
): Promise<Surveyed<MountSurvey>> => {
  const north = bearing && (await northAt(bearing, place));
  const plane = bearing && planeAzimuth(bearing.reading, north ? north.declinationDeg : null);
  return {
    result: {
      azimuthDeg: plane ? plane.azimuthDeg : null,
      azimuthErrorDeg: plane ? plane.errorDeg : null,
      tiltErrorDeg: slope ? slope.errorDeg : null,
      measuredWith: [
        ...(bearing ? [bearing.north === 'magnetic' ? ('compass' as const) : ('map bearing' as const)] : []),
        ...(slope ? [slope.riseAndRun ? ('rise and run' as const) : ('angle' as const)] : []),
      ],
      readings: [...(bearing ? [bearingWritten(bearing)] : []), ...(slope ? [`slope ${slope.written}`] : [])],
      steps: [
        ...(plane ? plane.steps : []),
        ...(slope ? [slopeWords(slope.tiltDeg) + errorWords(slope.errorDeg)] : []),
      ],
      mistakes: plane ? plane.mistakes : null,
    },
    north,
    // The survey does not know which roof it was.
    findings: (plane ? plane.findings : []).map((finding) => ({
      ...finding,
      text: `${label}: ${finding.text}`,
    })),
  };
};

const errorWords = (errorDeg: number | null): string =>
  errorDeg === null ? '' : `, +- ${Number(errorDeg.toFixed(1))}`;

/** `bearing 150 magnetic, back 331, taken along_ridge, downslope left, dated 2026-05-01, error 5 deg`. */
const bearingWritten = ({ reading, dated, declinationDeg }: StudyBearing): string => {
  const { north, bearingDeg, backDeg = null, taken, downslope = null, errorDeg = null } = reading;
  const side = typeof downslope === 'string' || !downslope ? downslope : compassWords(downslope.towardDeg);
  return [
    `bearing ${bearingDeg} ${north}`,
    ...(backDeg === null ? [] : [`back ${backDeg}`]),
    `taken ${taken}`,
    ...(side === null ? [] : [`downslope ${side}`]),
    ...(dated === null ? [] : [`dated ${dateText(dated)}`]),
    ...(declinationDeg === null ? [] : [`declination ${declinationShort(declinationDeg)}`]),
    ...(errorDeg === null ? [] : [`error ${errorDeg} deg`]),
  ].join(', ');
};

/** Bearings are checked as read and turned once. */
const surveySkyline = async (
  skyline: StudySkyline,
  place: SurveyPlace,
  readText: ReadText,
): Promise<Surveyed<Skyline>> => {
  const { name, file, points, obstacles } = skyline;
  const north = await northAt(skyline, place);
  const declinationDeg = north ? north.declinationDeg : 0;
  if (obstacles) {
    const placeOf = (index: number) => ({ field: `obstacles.#${index + 1}` });
    return { result: skylineOfObstacles(name, obstacles, declinationDeg, placeOf), north, findings: [] };
  }
  const read = file === null ? (points ?? []) : await readSkylineFile(file, await readText(file));
  const placeOf = (index: number) => ({ field: `points.#${index + 1}` });
  const result = checkedSkyline(name, read, declinationDeg, placeOf);
  return { result, north, findings: gapFindings(result) };
};
