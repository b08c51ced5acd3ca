import { expect } from 'vitest';
import { TrackworthError } from '../../src/shared/index.ts';

/** The problems that a call throws; fails where it throws none. */
export const problemsOf = async (run: () => unknown) => {
  try {
    await run();
  } catch (error) {
    if (!(error instanceof TrackworthError)) throw error;
    expect(error.kind).toBe('input');
    return error.problems;
  }
  return expect.fail('nothing was refused');
};

export const codesOf = async (run: () => unknown) => (await problemsOf(run)).map(({ code }) => code);
