import { TrackworthError } from '../shared/index.ts';
import { systemWords } from './system-words.ts';

/** Nothing was written; says where it should have gone, what stood in the way and what to do. */
export const outputTrouble = (
  code: string,
  file: string,
  found: string,
  fix: string,
  expected = 'a new or empty folder, or an earlier report of trackworth',
  cause?: unknown,
): TrackworthError => new TrackworthError('output', [{ code, file, expected, found, fix }], { cause });

/** Runs a step of writing; an error of the system becomes an output error. */
export const orOutputTrouble = <T>(file: string, step: () => T): T => {
  try {
    return step();
  } catch (error) {
    if (error instanceof TrackworthError) throw error;
    throw outputTrouble(
      'cannot-write',
      file,
      systemWords(error),
      'Nothing was written. Choose a folder in which you may write.',
      'a folder that can be written',
      error,
    );
  }
};
