import { describeProblem, type Problem, TrackworthError } from '../shared/index.ts';
import { thousands } from './numbers.ts';

/** Of problems of the same sort in the same column so many are told one by one, and the others counted. */
const TOLD_ALONE = 3;
/** How many problems the message spells out; `problems` of the error carries the others. */
const PRINTED = 10;

/** Problems of one sort in one column, which a file of the wrong sort has by the thousand. */
interface Group {
  readonly told: Problem[];
  count: number;
  last: Problem;
}

/** A problem, and how many it stands for. */
interface Told {
  readonly problem: Problem;
  readonly count: number;
}

/** Gathers everything that is wrong with one weather file, so that all of it is reported together. */
export class Problems {
  readonly file: string;
  private readonly groups = new Map<string, Group>();

  constructor(file: string) {
    this.file = file;
  }

  add(problem: Omit<Problem, 'file'>): void {
    const added = { file: this.file, ...problem };
    const key = [problem.code, problem.field, problem.column].join('\n');
    const group = this.groups.get(key);
    if (!group) this.groups.set(key, { told: [added], count: 1, last: added });
    else {
      group.count++;
      group.last = added;
      // One more than is told alone: where there is no fifth it needs no counting.
      if (group.told.length <= TOLD_ALONE) group.told.push(added);
    }
  }

  get any(): boolean {
    return this.groups.size > 0;
  }

  /** Throws one input error that carries every problem so far, or does nothing where there is none. */
  throwIfAny(options?: ErrorOptions): void {
    if (!this.any) return;
    const told = [...this.groups.values()].flatMap(tell);
    const inOrder = told.toSorted((a, b) => (a.problem.line ?? 0) - (b.problem.line ?? 0));
    const error = new TrackworthError(
      'input',
      inOrder.map(({ problem }) => problem),
      options,
    );
    if (inOrder.length > PRINTED) {
      const first = inOrder.slice(0, PRINTED).map(({ problem }) => describeProblem(problem));
      const others = inOrder.slice(PRINTED).reduce((sum, { count }) => sum + count, 0);
      error.message = [...first, `and ${others} more`].join('\n');
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

const tell = ({ told, count, last }: Group): Told[] => {
  if (count === told.length) return told.map((problem) => ({ problem, count: 1 }));
  const others = count - TOLD_ALONE;
  const next = told[TOLD_ALONE];
  const where = last.line === undefined ? '' : `, ${next.line} to ${last.line}`;
  const rest = { ...next, found: `${thousands(others)} more lines like these${where}` };
  return [
    ...told.slice(0, TOLD_ALONE).map((problem) => ({ problem, count: 1 })),
    { problem: rest, count: others },
  ];
};
