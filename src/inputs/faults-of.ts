import type * as z from 'zod/mini';
import type { Fault } from './fault.ts';
import { isGroup, rawAt } from './fault.ts';
import type { Home } from './known-keys.ts';
import { keysAt, unknownKeyFix } from './known-keys.ts';
import { found, shown } from './shown.ts';
import type { Path } from './text/place.ts';

type Issue = z.core.$ZodIssue;

const EXAMPLES: Record<string, string> = {
  weather: 'weather: { file: year.epw }',
  mounts: 'mounts: [ { id: ground, kind: fixed-tilt } ]',
  skyline: 'skyline: { points: [ [90, 12], [105, 9] ] }',
  points: 'points: [ [90, 12], [105, 9] ]',
  obstacles: 'obstacles: [ { height: 6 m, distance: 20 m, from: 100, to: 130 } ]',
  bearing: 'bearing: { magnetic: 150, dated: 2026-05-01 }',
  snow: 'snow: { Jan: 20 %, Feb: 15 % }',
  slope: 'slope: { reading: 3:12 }',
};
const A_MOUNT = '{ id: ground, kind: fixed-tilt }';

/** Something else where a group of keys should be, or nothing. */
export const groupFault = (path: Path, raw: unknown, keys: readonly string[]): Fault => {
  const last = path.at(-1);
  const glued = typeof raw === 'string' ? /^([a-z_]\w*):(\S.*)$/i.exec(raw) : null;
  const isMount = typeof last === 'number' && path.length === 2;
  const example = isMount ? A_MOUNT : (EXAMPLES[String(last)] ?? `{ ${keys[0]}: ... }`);
  return {
    code: raw === undefined ? 'missing-key' : 'wrong-type',
    path,
    expected: `a group with the key${keys.length === 1 ? '' : 's'} ${keys.join(', ')}`,
    found: found(raw),
    fix: glued ? `Put a space after the colon: ${glued[1]}: ${glued[2]}.` : `Write for example ${example}.`,
  };
};

const listFault = (path: Path, raw: unknown): Fault => {
  const name = String(path.at(-1));
  return {
    code: raw === undefined ? 'missing-key' : 'wrong-type',
    path,
    expected: 'a list with at least one entry',
    found: found(raw),
    fix: `Write for example ${EXAMPLES[name] ?? `${name}: [ { ... } ]`}.`,
  };
};

/** `found` is set where a group was refused for more than the one value at its path. */
interface FieldWords extends Pick<Fault, 'code' | 'expected' | 'fix'> {
  readonly found?: string;
}

/** A field's own refusal, as src/inputs/fields/field.ts packs it. */
const fieldFault = (issue: z.core.$ZodIssueCustom, path: Path, raw: unknown): Fault => {
  const { code, expected, fix, ...own } = issue.params as FieldWords;
  const advice = code === 'missing-key' ? `Add for example ${String(path.at(-1))}: ${fix}.` : fix;
  return { code, path, expected, found: own.found ?? found(raw), fix: advice };
};

/** What was checked: the raw value, its schema, where it stands in the study, and where keys may live. */
export interface Checked {
  readonly raw: unknown;
  readonly schema: z.core.$ZodType;
  readonly root: Path;
  readonly homes: () => readonly Home[];
}

/** The issues of one zod run as faults. */
export const faultsOf = (issues: readonly Issue[], checked: Checked): Fault[] =>
  issues.flatMap((issue): Fault[] => {
    const { raw, schema, root, homes } = checked;
    const here = rawAt(raw, issue.path);
    const path = [...root, ...issue.path];
    if (issue.code === 'custom') return [fieldFault(issue, path, here)];
    if (issue.code === 'unrecognized_keys') {
      const known = keysAt(schema, issue.path);
      const fixOf = (key: string) => unknownKeyFix(key, rawAt(here, [key]), known, homes());
      return issue.keys.map((key) => {
        const fix = fixOf(key);
        return { code: 'unknown-key', path, key, expected: 'a known key', found: shown(key), fix };
      });
    }
    if (issue.code === 'invalid_union') {
      // A column is a name or a group, a skyline a list or a group: judge it by the form that was tried.
      const [other, group] = issue.errors;
      const noList = other.some((below) => below.path.length === 0 && below.code === 'invalid_type');
      const tried = isGroup(here) || noList ? group : other;
      const inner = tried.map((below) => ({ ...below, path: [...issue.path, ...below.path] }));
      return faultsOf(inner, checked);
    }
    const wantsGroup = issue.code === 'invalid_type' && issue.expected === 'object';
    return [wantsGroup ? groupFault(path, here, keysAt(schema, issue.path)) : listFault(path, here)];
  });
