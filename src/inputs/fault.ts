import type { Path } from './text/place.ts';

/** Something wrong at a path; `key` where the key itself is at fault rather than its value. */
export interface Fault {
  readonly code: string;
  readonly path: Path;
  readonly key?: string;
  readonly expected: string;
  readonly found: string;
  readonly fix: string;
}

export const isGroup = (raw: unknown): raw is Record<string, unknown> =>
  typeof raw === 'object' && raw !== null && !Array.isArray(raw);

/** The raw value at `path`; undefined where there is none. */
export const rawAt = (raw: unknown, path: Path): unknown =>
  path.reduce<unknown>(
    (at, step) =>
      typeof at === 'object' && at !== null && Object.hasOwn(at, step) ? Reflect.get(at, step) : undefined,
    raw,
  );
