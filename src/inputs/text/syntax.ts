import type { Document, YAMLError } from 'yaml';
import { isScalar, visit } from 'yaml';
import type { Problem } from '../../shared/index.ts';
import { shown } from '../shown.ts';
import type { Position } from './place.ts';

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
    'Remove what is too much here, or before it, such as a second closing bracket, or line the line up with others.',
  ],
  NON_STRING_KEY: ['a plain word as key', 'Write key: value.'],
  TAG_RESOLVE_FAILED: ['plain numbers and text', 'Remove the tag that begins with an exclamation mark.'],
};

/** Where the key that stands again at `offset` stood first in its group. */
const firstOfKey = (document: Document, offset: number): number | null => {
  let first: number | null = null;
  visit(document, {
    Map: (_, map) => {
      const again = map.items.find(({ key }) => isScalar(key) && key.range?.[0] === offset)?.key;
      if (!isScalar(again)) return;
      const same = map.items.find(({ key }) => isScalar(key) && key.value === again.value)?.key;
      if (isScalar(same) && same.range) first = same.range[0];
    },
  });
  return first;
};

/** What the YAML library found, in plain words; one problem a line, since one slip often gives several errors. */
export const syntaxProblems = (
  document: Document,
  text: string,
  positionOf: (offset: number) => Position,
): Problem[] => {
  const lines = text.split(/\r?\n/);
  const problemOf = (error: YAMLError): Problem => {
    const place = positionOf(error.pos[0]);
    const line = (lines[place.line - 1] ?? '').trim();
    if (error.code === 'DUPLICATE_KEY') {
      const rest = (lines[place.line - 1] ?? '').slice(place.column - 1);
      const field = /^["']?([^"':\s]+)/.exec(rest)?.[1] ?? rest;
      const first = firstOfKey(document, error.pos[0]);
      const found = `${shown(field)} again${first === null ? '' : `, first on line ${positionOf(first).line}`}`;
      const expected = 'each key once in its group';
      return { code: 'duplicate-key', ...place, field, expected, found, fix: 'Keep one of the two.' };
    }
    const tab = error.code === 'TAB_AS_INDENT';
    const [expected, fix] = SYNTAX[error.code] ?? [
      'text that follows the rules of YAML',
      `${error.message}.`,
    ];
    const found = tab ? 'a tab' : line === '' ? 'the end of the text' : shown(line);
    return { code: tab ? 'tab-indent' : 'yaml-syntax', ...place, expected, found, fix };
  };
  const seen = new Set<number>();
  // Once the text has gone on after its end, every word that follows is reported: one of these is enough.
  const derailed = document.errors.find(({ code }) => code === 'UNEXPECTED_TOKEN');
  return [...document.errors, ...document.warnings]
    .filter((error) => error.code !== 'UNEXPECTED_TOKEN' || error === derailed)
    .map(problemOf)
    .filter(({ line, code }) => {
      if (code === 'duplicate-key') return true;
      if (seen.has(line!)) return false;
      seen.add(line!);
      return true;
    });
};
