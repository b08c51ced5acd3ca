import { describeProblem, type Problem, TrackworthError } from '../shared/index.ts';
import type { Io } from './io.ts';
import { printable } from './plain.ts';

const FAULT_OF_OURS = 1;

const header = (file: string | undefined, count: number): string =>
  `${file === undefined ? 'the command' : printable(file)} has ${count === 1 ? 'a problem' : `${count} problems`}:`;

const block = (file: string | undefined, problems: readonly Problem[]): string =>
  [header(file, problems.length), ...problems.map((p) => `  ${printable(describeProblem(p))}`), ''].join(
    '\n',
  );

/** File after file, in the order of their first problem. */
const byFile = (problems: readonly Problem[]): Map<string | undefined, Problem[]> => {
  const groups = new Map<string | undefined, Problem[]>();
  for (const problem of problems) groups.set(problem.file, [...(groups.get(problem.file) ?? []), problem]);
  return groups;
};

/** Prints what went wrong, in plain words, and returns the exit code. */
export const reportTrouble = (error: unknown, io: Io): number => {
  if (error instanceof TrackworthError) {
    for (const [file, problems] of byFile(error.problems)) io.err(block(file, problems));
    return error.exitCode;
  }
  const message = error instanceof Error ? error.message : String(error);
  io.err(
    `This is a fault of trackworth, not of your files: ${printable(message)}\n` +
      (io.debug && error instanceof Error
        ? `${error.stack}\n`
        : 'Run it again with TRACKWORTH_DEBUG=1 to see where, and report that with the study and the command.\n'),
  );
  return FAULT_OF_OURS;
};
