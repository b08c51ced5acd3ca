import type { Problem } from '../shared/index.ts';
import { TrackworthError } from '../shared/index.ts';
import { documentedUnits, everyUnit } from './convert.ts';
import { crossFaults } from './cross-checks.ts';
import type { Fault } from './fault.ts';
import { found, tame } from './shown.ts';
import type { Study } from './study-file.ts';
import type { Path } from './text/place.ts';
import type { StudyText } from './text/study-text.ts';
import { toStudy } from './to-study.ts';

/** Dotted, mounts by their id: `mounts.tracker.drive.working`; by their number (`mounts.#2`) where that fails. */
const dotted = (path: Path, value: unknown): string => {
  const mounts = (value as { mounts?: unknown }).mounts;
  return path
    .map((step, i) => {
      if (typeof step !== 'number') return String(step);
      const id = i === 1 && path[0] === 'mounts' ? (mounts as { id?: unknown }[])[step]?.id : undefined;
      return typeof id === 'string' && /^[a-z0-9_-]+$/.test(id) ? id : `#${step + 1}`;
    })
    .join('.');
};

const problemOf = ({ path, key, ...fault }: Fault, file: string, text: StudyText): Problem => {
  const place = key === undefined ? text.at(path) : text.atKey(path, key);
  return { ...fault, file, ...place, field: dotted(key === undefined ? path : [...path, key], text.value) };
};

/** Longest text of a message; only a value of the user's own making gets that far. */
const LONGEST_TEXT = 300;
const tamed = (problem: Problem): Problem => ({
  ...problem,
  ...(problem.field === undefined ? {} : { field: tame(problem.field, LONGEST_TEXT) }),
  expected: tame(problem.expected, LONGEST_TEXT),
  found: tame(problem.found, LONGEST_TEXT),
  fix: tame(problem.fix, LONGEST_TEXT),
});

const refuse = (problems: readonly Problem[]): never => {
  const inLineOrder = problems.toSorted((a, b) => a.line! - b.line! || a.column! - b.column!);
  throw new TrackworthError('input', inLineOrder.map(tamed));
};

/** Checks with the documented units; fetches the units library only for a study that writes others. */
const check = async (raw: unknown) => {
  const { checkStudy } = await import('./check-study.ts');
  let missed = false;
  const first = checkStudy(
    raw,
    documentedUnits(() => {
      missed = true;
    }),
  );
  return missed ? checkStudy(raw, await everyUnit()) : first;
};

/**
 * Reads a study file (YAML or JSON) to trackworth's own units, with the documented defaults filled in.
 *
 * @param input `file`: the name for messages, and for the title where the study has none. `text`: its content.
 * @returns The study; what the user left blank is null.
 * @throws TrackworthError of kind `input` with every problem of the file in line order, each with its place.
 */
export const readStudy = async (input: { file: string; text: string }): Promise<Study> => {
  const { file } = input;
  const { readStudyText } = await import('./text/study-text.ts');
  const text = readStudyText(file, input.text);
  if (text.broken) return refuse(text.problems);
  const { value } = text;
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    const problem: Problem = {
      code: value === undefined ? 'empty-study' : 'wrong-type',
      file,
      ...text.at([]),
      expected: 'a study: keys with values, at least weather and mounts',
      found: found(value),
      fix: 'Begin with weather: { file: year.epw }; trackworth start DIR writes a study to begin from.',
    };
    return refuse([...text.problems, problem]);
  }
  const checked = await check(value);
  const faults = [...checked.faults, ...crossFaults(value, text.at)];
  const problems = [...text.problems, ...faults.map((fault) => problemOf(fault, file, text))];
  if (problems.length > 0 || !checked.study) return refuse(problems);
  return toStudy(checked.study.frame, checked.study.mounts, file);
};
