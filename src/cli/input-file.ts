import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, statSync } from 'node:fs';
import { dirname } from 'node:path';
import { type Problem, TrackworthError } from '../shared/index.ts';
import { printable } from './plain.ts';
import { errorCode, systemWords } from './system-words.ts';

/** A file that the user named, and what it ought to be. */
export interface Wanted {
  /** For the disk. */
  readonly path: string;
  /** As the user knows it. */
  readonly shown: string;
  /** `a study file`. */
  readonly what: string;
  /** Names that look right, to suggest from the same folder. */
  readonly looksRight: RegExp;
  /** Where the name was read, if not on the command line. */
  readonly namedAt?: () => Promise<Pick<Problem, 'file' | 'line' | 'column' | 'field'>>;
}

const MOST_SUGGESTIONS = 5;

const candidates = (folder: string, looksRight: RegExp): string[] => {
  try {
    return readdirSync(folder)
      .filter((name) => looksRight.test(name))
      .sort()
      .slice(0, MOST_SUGGESTIONS)
      .map(printable);
  } catch {
    return [];
  }
};

/** What is wrong with the file, before its place is known. */
type Fault = Pick<Problem, 'code' | 'found' | 'fix'>;

const missing = ({ path, looksRight }: Wanted): Fault => {
  const near = candidates(dirname(path), looksRight);
  const fix =
    near.length > 0 ? `In that folder: ${near.join(', ')}.` : 'Check the name and the folder it is in.';
  return { code: 'no-such-file', found: 'no file', fix };
};

const isFolder = ({ path, looksRight }: Wanted): Fault => {
  const near = candidates(path, looksRight);
  const fix = `Name the file in it${near.length > 0 ? `: ${near.join(', ')}` : ''}.`;
  return { code: 'is-folder', found: 'a folder', fix };
};

const readOrFault = (wanted: Wanted): Uint8Array | Fault => {
  try {
    const entry = statSync(wanted.path);
    if (entry.isDirectory()) return isFolder(wanted);
    if (!entry.isFile() && !entry.isFIFO())
      return { code: 'no-file', found: 'a device', fix: 'Name a file.' };
    return readFileSync(wanted.path);
  } catch (error) {
    if (errorCode(error) === 'ENOENT') return missing(wanted);
    const fix = 'Check the name, and that you may read the file.';
    return { code: 'unreadable', found: systemWords(error), fix };
  }
};

/**
 * The bytes of a file that the user named.
 * @throws TrackworthError of kind `input` where it is missing, a folder, a device or unreadable
 */
export const readInputFile = async (wanted: Wanted): Promise<Uint8Array> => {
  const read = readOrFault(wanted);
  if (read instanceof Uint8Array) return read;
  const { shown, what, namedAt } = wanted;
  const place = namedAt ? await namedAt() : { file: shown };
  const found = namedAt ? `${read.found} called ${shown}` : read.found;
  throw new TrackworthError('input', [{ ...read, ...place, expected: what, found }]);
};

/** A study's text; bytes that are not UTF-8 become U+FFFD, which the study reader refuses at its line. */
export const textOf = (bytes: Uint8Array): string => new TextDecoder('utf-8').decode(bytes);

export const sha256 = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');
