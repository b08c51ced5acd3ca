/** What sort of trouble: a wrong command, a wrong input file, an output that cannot be written. */
export type TroubleKind = 'usage' | 'input' | 'output';

/** Exit codes of the command line; 0 is done and 1 is a fault of ours. */
export const EXIT_CODE: Record<TroubleKind, number> = { usage: 2, input: 3, output: 4 };

/** One thing that is wrong: where, what was expected, what was found, what to do. */
export interface Problem {
  /** Stable, machine-readable, kebab-case, for example `unknown-key`. */
  readonly code: string;
  readonly file?: string | undefined;
  /** 1-based, as editors count. */
  readonly line?: number | undefined;
  readonly column?: number | undefined;
  /** Dotted path in a study file, or the column's name in a weather file. */
  readonly field?: string | undefined;
  readonly expected: string;
  readonly found: string;
  readonly fix: string;
}

/** `study.yaml:4:13 site.latitude: expected a number from -90 to 90, found 95. Write ...` */
export const describeProblem = (p: Problem): string => {
  const place = [p.file, p.line, p.line === undefined ? undefined : p.column]
    .filter((x) => x !== undefined)
    .join(':');
  const field = p.field ? `${p.field}: ` : '';
  return `${place}${place ? ' ' : ''}${field}expected ${p.expected}, found ${p.found}. ${p.fix}`;
};

/** The one error class of trackworth: everything wrong with one file or command, reported together. */
export class TrackworthError extends Error {
  readonly kind: TroubleKind;
  readonly problems: readonly Problem[];

  constructor(kind: TroubleKind, problems: readonly Problem[], options?: ErrorOptions) {
    super(problems.map(describeProblem).join('\n'), options);
    this.name = 'TrackworthError';
    this.kind = kind;
    this.problems = problems;
  }

  get exitCode(): number {
    return EXIT_CODE[this.kind];
  }
}
