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

/** Takes the marks (¦) out of a text and says which `line:column` stood behind each. */
export const marked = (text: string): { text: string; places: string[] } => {
  const parts = text.split('¦');
  const places = parts.slice(0, -1).map((_, i) => {
    const lines = parts
      .slice(0, i + 1)
      .join('')
      .split('\n');
    return `${lines.length}:${lines.at(-1)!.length + 1}`;
  });
  return { text: parts.join(''), places };
};

/** The one problem of a study; where the text holds a mark (¦), the problem must be there. */
export const onlyProblem = async (withMark: string): Promise<Problem & { place: string }> => {
  const { text, places } = marked(withMark);
  const found = (await problemsOf(text)).map((p) => ({ ...p, place: `${p.line}:${p.column}` }));
  expect(found.map((p) => `${p.place} ${p.field} ${p.code}`)).toHaveLength(1);
  if (places.length > 0) expect(found[0].place).toBe(places[0]);
  return found[0];
};
