import { resolve } from 'node:path';
import type { Study } from '../inputs/index.ts';
import { TrackworthError } from '../shared/index.ts';
import type { SiteSurvey } from '../study.ts';
import type { RawYear } from '../weather/index.ts';
import { factsJson } from './facts-json.ts';
import { readStudyInputs, readWeatherFile } from './inputs.ts';
import type { Io } from './io.ts';
import { ofOptions, PLANE, type PlaneOptions, studyOfReadings } from './plane-readings.ts';
import { surveyOf, surveyOfStudy } from './site-survey.ts';

interface Surveyed {
  readonly study: Study;
  readonly raw: RawYear;
  readonly survey: SiteSurvey;
  readonly mountId: string;
}

const fixedMounts = ({ mounts }: Study): string =>
  mounts
    .filter(({ geometry }) => geometry.kind === 'roof-plane' || geometry.kind === 'fixed-tilt')
    .map(({ id }) => id)
    .join(', ') || 'none';

const wrong = (field: string, code: string, expected: string, found: string, fix: string): TrackworthError =>
  new TrackworthError('usage', [{ code, field, expected, found, fix }]);

const planeOfStudy = async (
  { study: typed, mount, json: _, ...readings }: PlaneOptions & { readonly study: string },
  cwd: string,
): Promise<Surveyed> => {
  const beside = Object.keys(readings).map(
    (key) => `--${key.replace(/[A-Z]/g, (c) => `-${c.toLowerCase()}`)}`,
  );
  if (beside.length > 0)
    throw wrong(
      '--study',
      'options-with-study',
      'a plane of a study, or one that the options describe',
      `${beside.join(', ')} beside it`,
      'Write the readings in the study, or leave --study out and name --weather.',
    );
  const inputs = await readStudyInputs(typed, cwd);
  if (mount === undefined)
    throw wrong(
      '--mount',
      'missing-mount',
      'the id of a mount that does not move',
      'none',
      `The study has ${fixedMounts(inputs.study)}.`,
    );
  const { survey } = await surveyOfStudy(inputs, cwd);
  return { study: inputs.study, raw: inputs.raw, survey, mountId: mount };
};

const planeOfReadings = async (
  { mount, study: _, json: __, ...readings }: PlaneOptions,
  cwd: string,
): Promise<Surveyed> => {
  if (mount !== undefined)
    throw wrong(
      '--study',
      'mount-without-study',
      'a study that has the mount',
      'none',
      'Name it: --study site.yaml.',
    );
  const study = await studyOfReadings(readings);
  const { file, label } = study.weather;
  const bytes = await readWeatherFile(resolve(cwd, file), file);
  const { readWeather } = await import('../weather/index.ts');
  const raw = await readWeather({ source: file, bytes, label, place: study.site });
  const { survey } = await surveyOf({ study, raw, pathOf: (name) => name }, cwd).catch(ofOptions);
  return { study, raw, survey, mountId: PLANE };
};

/** A mount that is not there, or that moves, is wrong usage of its option. */
const ofMount = <T>(work: () => T): T => {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof TrackworthError) || error.kind !== 'usage') throw error;
    throw new TrackworthError(
      'usage',
      error.problems.map((problem) => ({ ...problem, field: '--mount' })),
      { cause: error },
    );
  }
};

/** How one fixed plane is turned to the light: of a study, or as the options describe it. */
export const plane = async (options: PlaneOptions, io: Io): Promise<void> => {
  const { study } = options;
  const found =
    study === undefined
      ? await planeOfReadings(options, io.cwd)
      : await planeOfStudy({ ...options, study }, io.cwd);
  const { planeReport } = await import('./plane-facts.ts');
  const report = ofMount(() => planeReport(found.study, found.raw, found.mountId, found.survey));
  if (options.json) return io.out(factsJson(report));
  const { planeScreen } = await import('./plane-screen.ts');
  io.out(planeScreen(report));
};
