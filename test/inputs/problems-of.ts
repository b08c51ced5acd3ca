import { expect } from 'vitest';
import { readStudy } from '../../src/inputs/index.ts';
import type { Problem } from '../../src/shared/index.ts';
import { TrackworthError } from '../../src/shared/index.ts';

export const FILE = 'sites/orlin.yaml';

/** The least study that is right, to hang other keys on. */
export const LEAST = 'weather: { file: a.epw }\nmounts: [ { id: ground, kind: fixed-tilt } ]\n';

/** The problems that a study is refused with; fails where it is accepted. */
export const problemsOf = async (text: string): Promise<readonly Problem[]> => {
  const trouble = await readStudy({ file: FILE, text }).then(
    () => expect.fail('the study was accepted'),
    (error: unknown) => error,
  );
  if (!(trouble instanceof TrackworthError)) throw trouble;
  expect(trouble.kind).toBe('input');
  expect(trouble.exitCode).toBe(3);
  for (const p of trouble.problems) {
    expect(p.file).toBe(FILE);
    for (const words of [p.code, p.expected, p.found, p.fix]) expect(words).toMatch(/\S/);
  }
  return trouble.problems;
};

/** The one problem of a study as `line:column field code`, with its words. */
export const onlyProblem = async (text: string) => {
  const problems = await problemsOf(text);
  expect(problems.map((p) => `${p.line}:${p.column} ${p.field} ${p.code}`)).toHaveLength(1);
  const [p] = problems;
  return { ...p, place: `${p.line}:${p.column}` };
};
