import type { Document, Pair, YAMLError, YAMLMap } from 'yaml';
import { isAlias, isMap, isNode, isScalar, isSeq, LineCounter, parseDocument, visit } from 'yaml';
import type { Problem } from '../shared/index.ts';
import { shown } from './shown.ts';

export type Path = readonly PropertyKey[];
export interface Position {
  readonly line: number;
  readonly column: number;
}

/** A study's text as plain values, with the way back to line and column. Blank values are undefined. */
export interface StudyText {
  readonly value: unknown;
  /** Found while reading the text; where `broken`, the values are not to be trusted. */
  readonly problems: readonly Problem[];
  readonly broken: boolean;
  /** Of the value at `path`, or of the nearest group around it that is there. */
  readonly at: (path: Path) => Position;
  /** Of the key `key` in the group at `path`. */
  readonly atKey: (path: Path, key: string) => Position;
}

/** Aliases (`*name`) may repeat a value so often; more is a bomb. */
const MOST_ALIASES = 50;
const START: Position = { line: 1, column: 1 };
// biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is looked for
const NOT_TEXT = /[\u0000-\u0008\u000b\u000e-\u001f\ufffd]/;

/** Expected and what to do, by the YAML library's error code. */
const SYNTAX: Record<string, readonly [string, string]> = {
  TAB_AS_INDENT: [
    'spaces at the start of a line',
    'YAML does not take tabs here: replace each tab by two spaces.',
  ],
  MULTIPLE_DOCS: [
    'one study in the file',
    'Remove the line --- and all that follows it, or make it a file of its own.',
  ],
  BAD_SCALAR_START: ['a value that does not begin with a special sign', 'Put the value in quotes: "...".'],
  BLOCK_AS_IMPLICIT_KEY: [
    'one key with its value on the line',
    'Line up the keys of a group in one column; put a text that holds a colon in quotes.',
  ],
  MULTILINE_IMPLICIT_KEY: [
    'a key, a colon, a space and a value',
    'Write key: value, with a space after the colon.',
  ],
  MISSING_CHAR: [
    'a closing sign or a colon',
    'Close each quote and bracket, and write key: value, with a space after the colon.',
  ],
  BAD_INDENT: [
    'lines of one group to begin in one column, and each { or [ to be closed',
    'Close the bracket that is open, or line the keys up.',
  ],
  UNEXPECTED_TOKEN: [
    'the end of the value',
    'Remove what is too much here, perhaps a second closing bracket.',
  ],
  NON_STRING_KEY: ['a plain word as key', 'Write key: value.'],
  TAG_RESOLVE_FAILED: ['plain numbers and text', 'Remove the tag that begins with an exclamation mark.'],
};

/** Blank (null) becomes undefined and keeps its key; each shared group is converted once, so loops end. */
const blankToUndefined = (value: unknown, done = new Map<object, unknown>()): unknown => {
  if (value === null) return undefined;
  if (typeof value !== 'object') return value;
  if (done.has(value)) return done.get(value);
  const copy: object = Array.isArray(value) ? [] : Object.create(null);
  done.set(value, copy);
  for (const [key, inner] of Object.entries(value))
    Object.defineProperty(copy, key, {
      value: blankToUndefined(inner, done),
      enumerable: true,
      writable: true,
      configurable: true,
    });
  return copy;
};

/** Reads YAML, of which JSON is a part. Nothing is thrown for a wrong text: the problems say what is wrong. */
export const readStudyText = (file: string, source: string): StudyText => {
  const text = source.replace(/^\ufeff/, '');
  const lines = new LineCounter();
  const positionOf = (offset: number): Position => {
    const { line, col } = lines.linePos(offset);
    return { line: Math.max(line, 1), column: Math.max(col, 1) };
  };
  const broken = (code: string, at: Position, expected: string, found: string, fix: string): StudyText => ({
    value: undefined,
    problems: [{ code, file, ...at, expected, found, fix }],
    broken: true,
    at: () => START,
    atKey: () => START,
  });

  const odd = NOT_TEXT.exec(text);
  if (odd) {
    const before = text.slice(0, odd.index).split('\n');
    const at = { line: before.length, column: before.at(-1)!.length + 1 };
    return broken(
      'not-text',
      at,
      'a text file',
      'bytes that are no text',
      'Give a study file, saved as plain UTF-8 text.',
    );
  }

  const document: Document = parseDocument(text, {
    lineCounter: lines,
    prettyErrors: false,
    uniqueKeys: true,
    stringKeys: true,
    logLevel: 'error',
  });
  const tooDeep = [...document.errors].find((e) => e.code === 'RESOURCE_EXHAUSTION');
  if (tooDeep)
    return broken(
      'too-deep',
      positionOf(tooDeep.pos[0]),
      'groups a few levels deep',
      'brackets nested too deeply',
      'Remove the needless brackets.',
    );

  const firstOfKey = (offset: number): Position | null => {
    let first: Position | null = null;
    visit(document, {
      Map: (_, map) => {
        const again = map.items.find(({ key }) => isScalar(key) && key.range?.[0] === offset);
        const same = map.items.find(
          ({ key }) => isScalar(key) && isScalar(again?.key) && key.value === again.key.value,
        );
        if (again && same && isScalar(same.key) && same.key.range) first = positionOf(same.key.range[0]);
      },
    });
    return first;
  };
  const syntaxProblem = (error: YAMLError): Problem => {
    const at = positionOf(error.pos[0]);
    const line = text.split(/\r?\n/)[at.line - 1] ?? '';
    if (error.code === 'DUPLICATE_KEY') {
      const key = /^["']?([^"':\s]+)/.exec(line.slice(at.column - 1))?.[1] ?? line.trim();
      const first = firstOfKey(error.pos[0]);
      const found = `${shown(key)} again${first ? `, first on line ${first.line}` : ''}`;
      return {
        code: 'duplicate-key',
        file,
        ...at,
        field: key,
        expected: 'each key once in its group',
        found,
        fix: 'Keep one of the two.',
      };
    }
    const [expected, fix] = SYNTAX[error.code] ?? [
      'text that follows the rules of YAML',
      `${error.message}.`,
    ];
    const code = error.code === 'TAB_AS_INDENT' ? 'tab-indent' : 'yaml-syntax';
    const found =
      error.code === 'TAB_AS_INDENT'
        ? 'a tab'
        : line.trim() === ''
          ? 'the end of the text'
          : shown(line.trim());
    return { code, file, ...at, expected, found, fix };
  };
  const seen = new Set<number>();
  const problems = [...document.errors, ...document.warnings].map(syntaxProblem).filter(({ line, code }) => {
    if (code === 'duplicate-key') return true;
    if (seen.has(line!)) return false; // one slip often gives several errors on its line
    seen.add(line!);
    return true;
  });

  const follow = (node: unknown): unknown => (isAlias(node) ? node.resolve(document) : node);
  const pairOf = (map: YAMLMap, key: PropertyKey): Pair | undefined =>
    map.items.findLast(({ key: k }) => isScalar(k) && String(k.value) === String(key));
  const nodeAt = (path: Path): unknown => {
    let node = follow(document.contents);
    for (const step of path) {
      const next = isMap(node)
        ? pairOf(node, step)?.value
        : isSeq(node)
          ? node.items[Number(step)]
          : undefined;
      if (next === undefined || next === null) break;
      node = follow(next);
    }
    return node;
  };
  const at = (path: Path): Position => {
    const node = nodeAt(path);
    return isNode(node) && node.range ? positionOf(node.range[0]) : START;
  };
  const atKey = (path: Path, key: string): Position => {
    const map = nodeAt(path);
    const node = isMap(map) ? pairOf(map, key)?.key : undefined;
    return isScalar(node) && node.range ? positionOf(node.range[0]) : at(path);
  };

  const isBroken = problems.some(({ code }) => code !== 'duplicate-key');
  if (isBroken) return { value: undefined, problems, broken: true, at, atKey };
  try {
    const value = blankToUndefined(document.toJS({ maxAliasCount: MOST_ALIASES }));
    return { value, problems, broken: false, at, atKey };
  } catch {
    // The library throws for aliases without their anchor and for more of them than allowed.
    let first = START;
    let found = 'one that repeats too much';
    visit(document, {
      Alias: (_, alias) => {
        if (alias.resolve(document)) {
          if (first === START && alias.range) first = positionOf(alias.range[0]);
          return undefined;
        }
        if (alias.range) first = positionOf(alias.range[0]);
        found = `*${alias.source} without &${alias.source} before it`;
        return visit.BREAK;
      },
    });
    return broken(
      'alias',
      first,
      'few and small aliases',
      found,
      'Write the values out, or put text that begins with * in quotes.',
    );
  }
};
