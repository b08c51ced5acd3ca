import * as z from 'zod/mini';
import type { MountKind } from '../shared/index.ts';
import type { Convert } from './convert.ts';
import type { Fault } from './fault.ts';
import { isGroup, rawAt } from './fault.ts';
import { faultsOf, groupFault } from './faults-of.ts';
import type { Home } from './known-keys.ts';
import { nearest } from './nearest.ts';
import type { MountSchemas, RawMount } from './schema/mounts.ts';
import { mountSchemas } from './schema/mounts.ts';
import { everything, once } from './schema/present.ts';
import type { RawStudy } from './schema/study.ts';
import { studyFrame } from './schema/study.ts';
import { found } from './shown.ts';
import type { Path } from './text/place.ts';

export interface CheckedStudy {
  readonly faults: readonly Fault[];
  /** Null where there are faults. */
  readonly study: { readonly frame: RawStudy; readonly mounts: readonly RawMount[] } | null;
}

/** For a mount of no known kind: every key of every kind, so that its other faults still show. */
const anyKind = (kinds: MountSchemas) => {
  const merged: Record<string, z.ZodMiniType> = {};
  for (const kind of ['roof-plane', 'turntable', 'dual-axis', 'fixed-tilt', 'single-axis'] as const)
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
  const list = rawAt(raw, ['mounts']);
  const entries: readonly unknown[] = Array.isArray(list) ? list : [];
  const kinds = mountSchemas(convert, (...path) => entries.some((mount) => rawAt(mount, path) !== undefined));
  const known = Object.keys(kinds) as MountKind[];
  const homes = once((): Home[] => {
    const whole = mountSchemas(convert, everything);
    return [
      ...known.map((kind) => ({ schema: whole[kind](), name: `${kind} mounts` })),
      { schema: studyFrame(convert, everything), name: '' },
    ];
  });
  const frame = z.safeParse(frameSchema, raw);
  const faults = frame.success
    ? []
    : faultsOf(frame.error.issues, { raw, schema: frameSchema, root: [], homes });
  const mounts: RawMount[] = [];
  for (const [i, mount] of entries.entries()) {
    const path = ['mounts', i];
    if (!isGroup(mount)) {
      faults.push(groupFault(path, mount, ['id', 'kind']));
      continue;
    }
    const kind = known.find((k) => k === mount.kind);
    if (!kind) faults.push(kindFault(mount.kind, [...path, 'kind'], known));
    const schema = kind ? kinds[kind]() : anyKind(kinds);
    const result = z.safeParse(schema as z.ZodMiniType, mount);
    if (!result.success)
      faults.push(...faultsOf(result.error.issues, { raw: mount, schema, root: path, homes }));
    else if (kind) mounts.push(result.data as RawMount);
  }
  return { faults, study: faults.length === 0 && frame.success ? { frame: frame.data, mounts } : null };
};
