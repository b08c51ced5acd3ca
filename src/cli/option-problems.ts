import { type Problem, TrackworthError } from '../shared/index.ts';

/** A problem as its reader tells it, said of the option that it came from. */
export const atOption = (problem: Problem, option: string): Problem => ({
  ...problem,
  file: undefined,
  line: undefined,
  column: undefined,
  field: option,
});

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
