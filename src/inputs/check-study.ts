import * as z from 'zod/mini';
import type { MountKind } from '../shared/index.ts';
import type { Convert } from './convert.ts';
import type { Fault } from './fault.ts';
import { isGroup, rawAt } from './fault.ts';
import type { Home } from './known-keys.ts';
import { keysAt, unknownKeyFix } from './known-keys.ts';
import { nearest } from './nearest.ts';
import type { MountSchemas, RawMount } from './schema/mounts.ts';
import { mountSchemas } from './schema/mounts.ts';
import { everything, once } from './schema/present.ts';
import type { RawStudy } from './schema/study.ts';
import { studyFrame } from './schema/study.ts';
import { found, shown } from './shown.ts';
import type { Path } from './text/place.ts';

export interface CheckedStudy {
  readonly faults: readonly Fault[];
  /** Null where there are faults. */
  readonly study: { readonly frame: RawStudy; readonly mounts: readonly RawMount[] } | null;
}

const EXAMPLES: Record<string, string> = {
  weather: 'weather: { file: year.epw }',
  mounts: 'mounts: [ { id: ground, kind: fixed-tilt } ]',
};

const groupFault = (path: Path, raw: unknown, keys: readonly string[]): Fault => {
  const last = path.at(-1);
  const glued = typeof raw === 'string' ? /^(\w+):(\S.*)$/.exec(raw) : null;
  const fix = glued
    ? `Put a space after the colon: ${glued[1]}: ${glued[2]}.`
    : `Write for example ${typeof last === 'number' && path.length === 2 ? '{ id: ground, kind: fixed-tilt }' : (EXAMPLES[String(last)] ?? `{ ${keys[0]}: ... }`)}.`;
  const expected =
    keys.length === 0
      ? 'a group of keys'
      : `a group with the key${keys.length === 1 ? '' : 's'} ${keys.join(', ')}`;
  return { code: raw === undefined ? 'missing-key' : 'wrong-type', path, expected, found: found(raw), fix };
};

/** The issues of one zod run as faults, paths counted from `root`. */
const faultsOf = (
  issues: readonly z.core.$ZodIssue[],
  raw: unknown,
  schema: z.core.$ZodType,
  homes: () => readonly Home[],
  root: Path,
): Fault[] =>
  issues.flatMap((issue): Fault[] => {
    const here = rawAt(raw, issue.path);
    const path = [...root, ...issue.path];
    if (issue.code === 'unrecognized_keys') {
      const known = keysAt(schema, issue.path);
      return issue.keys.map((key) => ({
        code: 'unknown-key',
        path,
        key,
        expected: 'a known key',
        found: shown(key),
        fix: unknownKeyFix(key, rawAt(here, [key]), known, homes()),
      }));
    }
    if (issue.code === 'custom') {
      const { code, expected, fix } = issue.params as { code: string; expected: string; fix: string };
      const advice = code === 'missing-key' ? `Add for example ${String(issue.path.at(-1))}: ${fix}.` : fix;
      return [{ code, path, expected, found: found(here), fix: advice }];
    }
    if (issue.code === 'invalid_union') {
      // A column is a name or a group: judge it by the form that was tried.
      const branch = issue.errors[isGroup(here) ? 1 : 0].map((inner) => ({
        ...inner,
        path: [...issue.path, ...inner.path],
      }));
      return faultsOf(branch, raw, schema, homes, root);
    }
    if (issue.code === 'invalid_type' && issue.expected === 'object')
      return [groupFault(path, here, keysAt(schema, issue.path))];
    const name = String(issue.path.at(-1));
    const fix = `Write for example ${EXAMPLES[name] ?? `${name}: [ { ... } ]`}.`;
    const code = here === undefined ? 'missing-key' : 'wrong-type';
    return [{ code, path, expected: 'a list with at least one entry', found: found(here), fix }];
  });

/** For a mount of no known kind: every key of every kind, so that its other faults still show. */
const anyKind = (kinds: MountSchemas) => {
  const merged: Record<string, z.ZodMiniType> = {};
  for (const kind of ['roof-plane', 'dual-axis', 'fixed-tilt', 'single-axis'] as const)
    for (const [key, schema] of Object.entries(kinds[kind]().shape))
      merged[key] = z.optional(schema as z.ZodMiniType);
  return z.strictObject({ ...merged, kind: z.optional(z.unknown()), id: kinds['roof-plane']().shape.id });
};

const kindFault = (raw: unknown, path: Path, known: readonly MountKind[]): Fault => {
  const close = typeof raw === 'string' ? nearest(raw, known) : null;
  return {
    code: raw === undefined ? 'missing-key' : 'unknown-kind',
    path,
    expected: `one of ${known.join(', ')}`,
    found: found(raw),
    fix: close ? `Did you mean ${close}?` : `Write for example kind: ${known[1]}.`,
  };
};

/** Checks raw values against the schemas: the frame of the study, then each mount by its own kind. */
export const checkStudy = (raw: unknown, convert: Convert): CheckedStudy => {
  const frameSchema = studyFrame(convert, (...path) => rawAt(raw, path) !== undefined);
  const kinds = mountSchemas(convert);
  const known = Object.keys(kinds) as MountKind[];
  const homes = once((): Home[] => [
    ...known.map((kind) => ({ schema: kinds[kind](), name: `${kind} mounts` })),
    { schema: studyFrame(convert, everything), name: '' },
  ]);
  const frame = z.safeParse(frameSchema, raw);
  const faults = frame.success ? [] : faultsOf(frame.error.issues, raw, frameSchema, homes, []);
  const mounts: RawMount[] = [];
  const list = rawAt(raw, ['mounts']);
  for (const [i, mount] of (Array.isArray(list) ? list : []).entries()) {
    const path = ['mounts', i];
    if (!isGroup(mount)) {
      faults.push(groupFault(path, mount, ['id', 'kind']));
      continue;
    }
    const kind = known.find((k) => k === mount.kind);
    if (!kind) faults.push(kindFault(mount.kind, [...path, 'kind'], known));
    const schema = kind ? kinds[kind]() : anyKind(kinds);
    const result = z.safeParse(schema as z.ZodMiniType, mount);
    if (!result.success) faults.push(...faultsOf(result.error.issues, mount, schema, homes, path));
    else if (kind) mounts.push(result.data as RawMount);
  }
  return { faults, study: faults.length === 0 && frame.success ? { frame: frame.data, mounts } : null };
};
