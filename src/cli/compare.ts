import { join, resolve } from 'node:path';
import { TrackworthError } from '../shared/index.ts';
import { demoStudyPath, readStudyInputs } from './inputs.ts';
import type { Io } from './io.ts';
import { reportFolderName } from './report-name.ts';
import { surveyOfStudy } from './site-survey.ts';

export interface CompareOptions {
  readonly demo?: boolean;
  readonly out?: string;
  readonly json?: boolean;
  /** False after `--no-charts`. */
  readonly charts: boolean;
}

const HOW = 'Write trackworth compare STUDY, or trackworth compare --demo for the sample study.';

const studyOf = (typed: string | undefined, demo: boolean, cwd: string): string => {
  const wrong = (found: string) =>
    new TrackworthError('usage', [{ code: 'one-study', expected: 'one study', found, fix: HOW }]);
  if (typed === undefined && !demo) throw wrong('none');
  if (typed !== undefined && demo) throw wrong(`both ${typed} and --demo`);
  return typed ?? demoStudyPath(cwd);
};

/** The main job: reads, compares, renders, and only then writes the report and prints. */
export const compare = async (typed: string | undefined, options: CompareOptions, io: Io): Promise<void> => {
  const studyPath = studyOf(typed, options.demo ?? false, io.cwd);
  const inputs = await readStudyInputs(studyPath, io.cwd);
  const [{ compareMounts }, report] = await Promise.all([
    import('../study.ts'),
    import('../report/index.ts'),
  ]);
  const { survey, ...skyline } = await surveyOfStudy(inputs, io.cwd);

  const folder = options.out ?? (options.json ? undefined : reportFolderName(inputs.study.title));
  const target =
    folder === undefined ? null : await checkedFolder(folder, [...inputs.paths, ...skyline.paths], io);

  const comparison = compareMounts(inputs.study, inputs.raw, survey);
  if (target) {
    const { reportContent } = await import('./report-content.ts');
    const { writeReportFolder } = await import('./report-folder.ts');
    const checksums = [...inputs.checksums, ...skyline.checksums];
    const files = await reportContent(comparison, checksums, options.charts);
    writeReportFolder(target, files);
  }

  const memo = target && join(target.shown, 'memo.md');
  if (options.json) {
    if (memo) io.err(`Report written: ${memo}\n`);
    return io.out(report.resultsJson(comparison));
  }
  // A plain table is only understood through its study.
  const weatherArgument = inputs.study.weather.table ? studyPath : inputs.weatherPath;
  io.out(report.screenTable(comparison, { reportPath: memo, weatherArgument }));
};

const checkedFolder = async (folder: string, inputPaths: readonly string[], io: Io) => {
  const { checkReportFolder } = await import('./report-folder.ts');
  return checkReportFolder(resolve(io.cwd, folder), folder, [...inputPaths, io.cwd]);
};
