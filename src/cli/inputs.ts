import { basename, dirname, isAbsolute, join, relative, resolve, sep } from 'node:path';
import type { Study } from '../inputs/index.ts';
import { TrackworthError } from '../shared/index.ts';
import type { RawYear } from '../weather/index.ts';
import { readInputFile, sha256, textOf } from './input-file.ts';
import { SAMPLE_STUDY, samplePath } from './package-files.ts';

/** A file as the report names it. */
export interface Checksum {
  readonly name: string;
  readonly sha256: string;
}

/** A study and its weather, read. */
export interface StudyInputs {
  readonly study: Study;
  readonly raw: RawYear;
  /** The study as the user typed it, and its text. */
  readonly typed: string;
  readonly text: string;
  /** The weather file as the user would type it on a command line. */
  readonly weatherPath: string;
  /** Both files, absolute. */
  readonly paths: readonly string[];
  /** Both files as the report names them. */
  readonly checksums: readonly Checksum[];
}

const STUDY_NAMES = /\.(ya?ml|json)$/i;
const WEATHER_NAMES = /\.(epw|tmy2?|tmy3|csv|tsv|txt)(\.gz)?$/i;

/** A file is taken for a study by the ending of its name. */
export const isStudyName = (path: string): boolean => STUDY_NAMES.test(path);

export const readWeatherFile = (path: string, shown = path) =>
  readInputFile({ path, shown, what: 'a weather file', looksRight: WEATHER_NAMES });

/** The sample study inside the package, from `cwd` if it lies below it, so that the user can type its path. */
export const demoStudyPath = (cwd: string): string => {
  const path = samplePath(SAMPLE_STUDY);
  const short = relative(cwd, path);
  return short.startsWith(`..${sep}`) || isAbsolute(short) ? path : short;
};

/** A file that a study names, relative to itself or absolute, as the user would type it. */
export const besideStudy = (typed: string, file: string): string =>
  isAbsolute(file) ? file : join(dirname(typed), file);

/** Where a study names a file, for a message about the file. */
export const namedInStudy = async (typed: string, text: string, field: string) => {
  const { placeOfField } = await import('./study-place.ts');
  return { file: typed, ...placeOfField(text, field), field };
};

const weatherForStudy = (typed: string): TrackworthError =>
  new TrackworthError('input', [
    {
      code: 'weather-for-study',
      file: typed,
      expected: 'a study file',
      found: 'the name of a weather file',
      fix:
        'Name the study that names this file; trackworth start DIR writes one to begin from, and trackworth weather ' +
        'FILE shows what a weather file holds.',
    },
  ]);

/**
 * Reads a study and the weather that it names: relative to the study, or absolute.
 * @param typed the study's path as the user typed it, from `cwd`
 * @throws TrackworthError of kind `input` with all problems of the study, or else of its weather
 */
export const readStudyInputs = async (typed: string, cwd: string): Promise<StudyInputs> => {
  if (WEATHER_NAMES.test(typed)) throw weatherForStudy(typed);
  const studyPath = resolve(cwd, typed);
  const studyBytes = await readInputFile({
    path: studyPath,
    shown: typed,
    what: 'a study file',
    looksRight: STUDY_NAMES,
  });
  const text = textOf(studyBytes);
  const [{ readStudy }, { readWeather }] = await Promise.all([
    import('../inputs/index.ts'),
    import('../weather/index.ts'),
  ]);
  const study = await readStudy({ file: typed, text });

  const { file, table, label } = study.weather;
  const weatherPath = besideStudy(typed, file);
  const weatherBytes = await readInputFile({
    path: resolve(cwd, weatherPath),
    shown: weatherPath,
    what: 'a weather file',
    looksRight: WEATHER_NAMES,
    namedAt: () => namedInStudy(typed, text, 'weather.file'),
  });
  const raw = await readWeather({
    source: weatherPath,
    bytes: weatherBytes,
    table,
    label,
    place: study.site,
  });
  return {
    study,
    // Results name the file as the study does, so that they are the same from whatever folder they were made.
    raw: { ...raw, source: file },
    typed,
    text,
    weatherPath,
    paths: [studyPath, resolve(cwd, weatherPath)],
    checksums: [
      { name: basename(typed), sha256: sha256(studyBytes) },
      { name: file, sha256: sha256(weatherBytes) },
    ],
  };
};
