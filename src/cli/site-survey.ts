import { resolve } from 'node:path';
import type { Study } from '../inputs/index.ts';
import { type Problem, TrackworthError } from '../shared/index.ts';
import type { SiteSurvey } from '../study.ts';
import type { RawYear } from '../weather/index.ts';
import { readInputFile, sha256, textOf } from './input-file.ts';
import { besideStudy, type Checksum, namedInStudy, type StudyInputs } from './inputs.ts';

/** What was read on site, worked out, and the files that it came from. */
export interface Surveyed {
  readonly survey: SiteSurvey;
  /** Skyline files, absolute. */
  readonly paths: readonly string[];
  readonly checksums: readonly Checksum[];
}

/** What to survey, and how the user knows its files. */
export interface ToSurvey {
  readonly study: Study;
  readonly raw: Pick<RawYear, 'place'>;
  /** A file that the study names, as the user would type it. */
  readonly pathOf: (file: string) => string;
  /** Where a field of the study stands; absent where there is no study file. */
  readonly placeOf?: (field: string) => Promise<Pick<Problem, 'file' | 'line' | 'column' | 'field'>>;
}

const SKYLINE_NAMES = /\.(csv|tsv|txt)$/i;

/** The field of the first skyline that names a file. */
const fieldOf = (study: Study, file: string): string => {
  const skylines = study.site.skyline ?? [];
  const index = skylines.findIndex((skyline) => skyline.file === file);
  return skylines.length === 1 ? 'site.skyline.file' : `site.skyline.#${index + 1}.file`;
};

/**
 * Works out a study's readings at the place of its weather, with the skyline files that it names.
 * @throws TrackworthError of kind `input`; problems of the readings carry their place where `placeOf` knows it, else
 *   no file
 */
export const surveyOf = async ({ study, raw, pathOf, placeOf }: ToSurvey, cwd: string): Promise<Surveyed> => {
  const { NO_SURVEY, surveySite } = await import('../study.ts');
  if (study.site.skyline === null && study.mounts.every(({ readings }) => readings === null))
    return { survey: NO_SURVEY, paths: [], checksums: [] };
  const files = new Map<string, Uint8Array>();
  const readText = async (file: string): Promise<string> => {
    const bytes =
      files.get(file) ??
      (await readInputFile({
        path: resolve(cwd, pathOf(file)),
        shown: pathOf(file),
        what: 'a skyline file',
        looksRight: SKYLINE_NAMES,
        ...(placeOf ? { namedAt: () => placeOf(fieldOf(study, file)) } : {}),
      }));
    files.set(file, bytes);
    return textOf(bytes);
  };
  const survey = await surveySite(study, raw.place, readText).catch(async (error) => {
    if (!(error instanceof TrackworthError)) throw error;
    const placed = error.problems.map(async (problem): Promise<Problem> => {
      if (problem.file !== undefined)
        return files.has(problem.file) ? { ...problem, file: pathOf(problem.file) } : problem;
      return placeOf && problem.field ? { ...problem, ...(await placeOf(problem.field)) } : problem;
    });
    const inLineOrder = (await Promise.all(placed)).toSorted((a, b) => (a.line ?? 0) - (b.line ?? 0));
    throw new TrackworthError('input', inLineOrder, { cause: error });
  });
  const read = [...files];
  return {
    survey,
    paths: read.map(([file]) => resolve(cwd, pathOf(file))),
    checksums: read.map(([name, bytes]) => ({ name, sha256: sha256(bytes) })),
  };
};

/** The same for a study file: what is wrong is told with its place there. */
export const surveyOfStudy = ({ study, raw, typed, text }: StudyInputs, cwd: string): Promise<Surveyed> =>
  surveyOf(
    {
      study,
      raw,
      pathOf: (file) => besideStudy(typed, file),
      placeOf: (field) => namedInStudy(typed, text, field),
    },
    cwd,
  );
