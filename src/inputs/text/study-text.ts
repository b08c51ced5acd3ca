import type { Document } from 'yaml';
import { parseDocument, visit } from 'yaml';
import type { Problem } from '../../shared/index.ts';
import type { Places, Position } from './place.ts';
import { placesIn, positionsIn, START } from './place.ts';
import { syntaxProblems } from './syntax.ts';

/** A study's text as plain values, with the way back to line and column. Blank values are undefined. */
export interface StudyText extends Places {
  readonly value: unknown;
  /** Found while reading the text; where `broken`, the values are not to be trusted. */
  readonly problems: readonly Problem[];
  readonly broken: boolean;
}

/** Aliases (`*name`) may repeat values so often; more is a bomb. */
const MOST_ALIASES = 50;
// biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is looked for
const NOT_TEXT = /[\u0000-\u0008\u000b\u000e-\u001f\ufffd]/;

const notText = (text: string): Problem | null => {
  const odd = NOT_TEXT.exec(text);
  if (!odd) return null;
  return {
    code: 'not-text',
    ...positionsIn(text)(odd.index),
    expected: 'a text file',
    found: 'bytes that are no text',
    fix: 'Give a study file, saved as plain UTF-8 text.',
  };
};

/** The library throws for an alias without its anchor and for more of them than allowed; it does not say where. */
const aliasProblem = (document: Document, positionOf: (offset: number) => Position): Problem => {
  let place: Position | null = null;
  let found = 'one that repeats too much';
  visit(document, {
    Alias: (_, alias) => {
      const lost = alias.resolve(document) === undefined;
      if (alias.range && (lost || place === null)) place = positionOf(alias.range[0]);
      if (lost) found = `*${alias.source} without &${alias.source} before it`;
      return lost ? visit.BREAK : undefined;
    },
  });
  const fix = 'Write the values out, or put a text that begins with * in quotes.';
  return { code: 'alias', ...(place ?? START), expected: 'few and small aliases', found, fix };
};

/** Blank (null) becomes undefined and keeps its key; each shared group is converted once, so loops end. */
const blankToUndefined = (value: unknown, done = new Map<object, unknown>()): unknown => {
  if (value === null) return undefined;
  if (typeof value !== 'object') return value;
  if (done.has(value)) return done.get(value);
  const copy: Record<string, unknown> = Array.isArray(value) ? ([] as never) : Object.create(null);
  done.set(value, copy); // a copy without prototype takes __proto__ for a key like any other
  for (const [key, inner] of Object.entries(value)) copy[key] = blankToUndefined(inner, done);
  return copy;
};

/** Reads YAML, of which JSON is a part. Nothing is thrown for a wrong text: the problems say what is wrong. */
export const readStudyText = (file: string, source: string): StudyText => {
  const text = source.replace(/^\ufeff/, '');
  const broken = (problems: readonly Problem[]): StudyText => ({
    value: undefined,
    problems: problems.map((problem) => ({ ...problem, file })),
    broken: true,
    at: () => START,
    atKey: () => START,
  });
  const odd = notText(text);
  if (odd) return broken([odd]);

  const positionOf = positionsIn(text);
  const document = parseDocument(text, {
    prettyErrors: false,
    uniqueKeys: true,
    stringKeys: true,
    logLevel: 'error',
  });
  const tooDeep = document.errors.find(({ code }) => code === 'RESOURCE_EXHAUSTION');
  if (tooDeep) {
    const place = positionOf(tooDeep.pos[0]);
    const expected = 'groups a few levels deep';
    const fix = 'Remove the needless brackets.';
    return broken([{ code: 'too-deep', ...place, expected, found: 'brackets nested too deeply', fix }]);
  }
  const problems = syntaxProblems(document, text, positionOf);
  if (problems.some(({ code }) => code !== 'duplicate-key')) return broken(problems);
  try {
    const value = blankToUndefined(document.toJS({ maxAliasCount: MOST_ALIASES }));
    const named = problems.map((problem) => ({ ...problem, file }));
    return { value, problems: named, broken: false, ...placesIn(document, positionOf) };
  } catch {
    return broken([...problems, aliasProblem(document, positionOf)]);
  }
};
