import { randomUUID } from 'node:crypto';
import {
  existsSync,
  lstatSync,
  mkdirSync,
  readdirSync,
  readFileSync,
  realpathSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { basename, dirname, join, relative, sep } from 'node:path';
import { isReportMarker, REPORT_MARKER } from '../report/index.ts';
import { makeFolders, unmakeFolders } from './folders.ts';
import { orOutputTrouble, outputTrouble } from './output-trouble.ts';
import { errorCode } from './system-words.ts';

const within = (folder: string, path: string): boolean => {
  const way = relative(folder, path);
  return way === '' || (way !== '..' && !way.startsWith(`..${sep}`) && way !== path);
};

const isOurs = (folder: string): boolean => {
  try {
    return isReportMarker(readFileSync(join(folder, REPORT_MARKER), 'utf8'));
  } catch {
    return false;
  }
};

/** The folder behind a name: links are followed, so that a linked report is replaced where it lies. */
const realTarget = (path: string): string => {
  try {
    return realpathSync(path);
  } catch (error) {
    if (errorCode(error) !== 'ENOENT') throw error;
    if (lstatSync(path, { throwIfNoEntry: false })) throw error; // a link that leads nowhere
    return path;
  }
};

export interface ReportFolder {
  /** Absolute, links followed. */
  readonly path: string;
  /** As the user typed it. */
  readonly shown: string;
}

/**
 * Looks whether a report may go to a folder, before any work is done: it must be new, empty, or an earlier report.
 * @param keep paths that must not be replaced along with it: the inputs, the folder the user is in
 * @throws TrackworthError of kind `output`; nothing is changed
 */
export const checkReportFolder = (path: string, shown: string, keep: readonly string[]): ReportFolder =>
  orOutputTrouble(shown, () => {
    const target = realTarget(path);
    const entry = lstatSync(target, { throwIfNoEntry: false });
    if (!entry) return { path: target, shown };
    if (!entry.isDirectory())
      throw outputTrouble('is-file', shown, 'a file', 'Name another folder with --out.');
    const names = readdirSync(target);
    if (names.length > 0 && !isOurs(target))
      throw outputTrouble(
        'foreign-folder',
        shown,
        `a folder that holds ${names.length === 1 ? 'something else' : `${names.length} other things`}`,
        'Nothing was changed. Name another folder with --out.',
      );
    const inside = keep.find((file) => existsSync(file) && within(target, realpathSync(file)));
    if (inside !== undefined)
      throw outputTrouble(
        'in-use',
        shown,
        `a folder that is in use: ${inside} lies in it and would go with it`,
        'Nothing was changed. Name another folder with --out.',
      );
    return { path: target, shown };
  });

const writeAll = (folder: string, files: ReadonlyMap<string, string>): void => {
  for (const [name, text] of files) {
    const path = join(folder, name);
    mkdirSync(dirname(path), { recursive: true });
    writeFileSync(path, text, { flag: 'wx' });
  }
};

/** Two renames, and the earlier report comes back where the second one fails. */
const swap = (fresh: string, target: string): void => {
  if (!existsSync(target)) {
    renameSync(fresh, target);
    return;
  }
  const old = `${fresh}-old`;
  renameSync(target, old);
  try {
    renameSync(fresh, target);
  } catch (error) {
    renameSync(old, target);
    throw error;
  }
  rmSync(old, { recursive: true, force: true });
};

/**
 * Writes a report whole or not at all: into a hidden folder beside the target, which then takes its name. An
 * earlier report is replaced in that moment, and is left as it was where anything fails before.
 * @param files path inside the report → text
 * @throws TrackworthError of kind `output`
 */
export const writeReportFolder = (target: ReportFolder, files: ReadonlyMap<string, string>): void =>
  orOutputTrouble(target.shown, () => {
    const parent = dirname(target.path);
    const made: string[] = [];
    const fresh = join(parent, `.${basename(target.path).slice(0, 40)}-${randomUUID().slice(0, 8)}`);
    try {
      makeFolders(parent, made);
      mkdirSync(fresh);
      writeAll(fresh, files);
      swap(fresh, target.path);
    } catch (error) {
      rmSync(fresh, { recursive: true, force: true });
      unmakeFolders(made);
      throw error;
    }
  });
