import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { makeFolders, unmakeFolders } from './folders.ts';
import type { Io } from './io.ts';
import { orOutputTrouble, outputTrouble } from './output-trouble.ts';
import { SAMPLE_WEATHER, samplePath } from './package-files.ts';
import { shellWord } from './plain.ts';

const STUDY = 'study.yaml';
const TITLE = 'First study';

const refuseToOverwrite = (folder: string, shown: string, names: readonly string[]): void => {
  const there = names.filter((name) => existsSync(join(folder, name)));
  if (there.length > 0)
    throw outputTrouble(
      'would-overwrite',
      shown,
      `${there.join(' and ')} there already`,
      'Nothing was changed. Name another folder.',
      `a folder without ${names.join(' and ')}`,
    );
};

/** Writes all files or, where one fails, none; never over one that exists. */
const writeNew = (folder: string, files: ReadonlyMap<string, string | Uint8Array>): void => {
  const made: string[] = [];
  const written: string[] = [];
  try {
    makeFolders(folder, made);
    for (const [name, content] of files) {
      const path = join(folder, name);
      writeFileSync(path, content, { flag: 'wx' });
      written.push(path);
    }
  } catch (error) {
    for (const path of written) rmSync(path);
    unmakeFolders(made);
    throw error;
  }
};

/** Writes a commented study and its sample weather, ready to edit, and says what to try next. */
export const start = async (folder: string, io: Io): Promise<void> => {
  const { studyTemplate } = await import('../inputs/index.ts');
  const files = new Map<string, string | Uint8Array>([
    [STUDY, studyTemplate({ title: TITLE, weatherFile: SAMPLE_WEATHER })],
    [SAMPLE_WEATHER, readFileSync(samplePath(SAMPLE_WEATHER))],
  ]);
  const path = resolve(io.cwd, folder);
  orOutputTrouble(folder, () => {
    refuseToOverwrite(path, folder, [...files.keys()]);
    writeNew(path, files);
  });
  const study = join(folder, STUDY);
  const weather = join(folder, SAMPLE_WEATHER);
  const column = Math.max(study.length, weather.length) + 2;
  io.out(
    [
      `Wrote  ${study.padEnd(column)}a study with every key explained, ready to edit`,
      `       ${weather.padEnd(column)}an hourly year of an invented place, until you put your own in`,
      `Next   trackworth compare ${shellWord(study)}`,
      'Then   name your own weather file, mounts and quotes in the study; what you leave blank is listed as not counted',
      '',
    ].join('\n'),
  );
};
