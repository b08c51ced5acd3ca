import { type Problem, TrackworthError } from '../shared/index.ts';

/** Keys of a study that readers tell the user to write. */
const KEYS_TO_WRITE = /\b(say) (taken|downslope): /gi;

/** A problem as its reader tells it, said of the option that it came from. */
export const atOption = ({ code, expected, found, fix }: Problem, option: string): Problem => ({
  code,
  field: option,
  expected,
  found,
  fix: fix.replace(KEYS_TO_WRITE, '$1 --$2 '),
});

/** How a declination is entered where the model has none. */
export const BY_HAND =
  'Enter the declination itself, from a map of that year: --declination "16 E" or "16 W".';

/** Without a declination by hand, a magnetic bearing needs its date. */
export const missingDate: Problem = {
  code: 'missing-date',
  field: '--dated',
  expected: 'the day of the reading, since declination drifts with the years and the clock is never asked',
  found: 'none',
  fix: 'Write for example --dated 2026-05-01, or give the declination by hand: --declination "16 E".',
};

/** Reads the options of one command and keeps every problem, so that all are told at once. */
export class OptionReader {
  readonly problems: Problem[] = [];

  /** The value, or null where it was not given or is wrong. */
  read<T>(option: string, text: string | undefined, parse: (text: string) => T): T | null {
    if (text === undefined) return null;
    try {
      return parse(text);
    } catch (error) {
      if (!(error instanceof TrackworthError)) throw error;
      this.problems.push(...error.problems.map((problem) => atOption(problem, option)));
      return null;
    }
  }

  refuse(option: string, code: string, expected: string, found: string, fix: string): void {
    this.problems.push({ code, field: option, expected, found, fix });
  }

  /** @throws TrackworthError of kind `usage` where anything was wrong */
  done(): void {
    if (this.problems.length > 0) throw new TrackworthError('usage', this.problems);
  }
}
