import { describeProblem, type Problem, TrackworthError } from '../shared/index.ts';

/** More problems than this are counted, not kept: a file of the wrong sort has thousands. */
const KEPT = 500;
/** How many problems the message spells out; `problems` of the error carries the others. */
const PRINTED = 10;

/** Gathers everything that is wrong with one weather file, so that all of it is reported together. */
export class Problems {
  readonly file: string;
  private readonly kept: Problem[] = [];
  private count = 0;

  constructor(file: string) {
    this.file = file;
  }

  add(problem: Omit<Problem, 'file'>): void {
    this.count++;
    if (this.kept.length < KEPT) this.kept.push({ file: this.file, ...problem });
  }

  get any(): boolean {
    return this.count > 0;
  }

  /** Throws one input error that carries every problem so far, or does nothing where there is none. */
  throwIfAny(options?: ErrorOptions): void {
    if (!this.any) return;
    const inOrder = this.kept.toSorted((a, b) => (a.line ?? 0) - (b.line ?? 0));
    const error = new TrackworthError('input', inOrder, options);
    if (this.count > PRINTED) {
      const first = inOrder.slice(0, PRINTED).map(describeProblem);
      error.message = [...first, `and ${this.count - PRINTED} more`].join('\n');
    }
    throw error;
  }

  /** Adds one last problem and throws. */
  fail(problem: Omit<Problem, 'file'>, options?: ErrorOptions): never {
    this.add(problem);
    this.throwIfAny(options);
    throw new Error('unreachable');
  }
}
