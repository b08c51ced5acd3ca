import type * as z from 'zod/mini';
import { nearest } from './nearest.ts';

type Schema = z.core.$ZodType;
interface Definition {
  type: string;
  innerType?: Schema;
  element?: Schema;
  options?: Schema[];
  shape?: Record<string, Schema>;
}
/** The inside of a zod schema. */
export const partsOf = (schema: Schema): Definition => schema._zod.def as unknown as Definition;

/** The schema below `schema` at `path`: into groups, lists, optional values and the group or list form of a choice. */
const schemaAt = (schema: Schema | undefined, path: readonly PropertyKey[]): Schema | undefined => {
  if (!schema) return undefined;
  const { type, innerType, element, options, shape } = partsOf(schema);
  if (type === 'optional') return schemaAt(innerType, path);
  if (type === 'union') {
    const form = typeof path[0] === 'number' ? 'array' : 'object';
    return schemaAt(
      options?.find((o) => partsOf(o).type === form),
      path,
    );
  }
  if (path.length === 0) return schema;
  const [step, ...rest] = path;
  if (type === 'array') return schemaAt(element, rest);
  return schemaAt(shape && Object.hasOwn(shape, step) ? shape[String(step)] : undefined, rest);
};

/** The keys of the group at `path`; empty where it is no group. */
export const keysAt = (schema: Schema, path: readonly PropertyKey[]): string[] => {
  const there = schemaAt(schema, path);
  return there ? Object.keys(partsOf(there).shape ?? {}).filter((key) => key !== '$schema') : [];
};

/** Every group of `schema` by its dotted path, with its keys: `array.module` → power, length ... */
const groupsOf = (schema: Schema | undefined, path: string): { path: string; keys: string[] }[] => {
  const there = schemaAt(schema, []);
  if (!there) return [];
  const { element, shape } = partsOf(there);
  if (element) return groupsOf(element, path);
  if (!shape) return [];
  const below = Object.entries(shape).flatMap(([key, inner]) =>
    groupsOf(inner, path === '' ? key : `${path}.${key}`),
  );
  return [{ path, keys: Object.keys(shape) }, ...below];
};

/** A schema and the words for where its keys live. */
export interface Home {
  readonly schema: Schema;
  /** What a key of it belongs to: `single-axis mounts`; empty for the study itself. */
  readonly name: string;
}

const listed = (words: readonly string[]): string =>
  words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;

/** What to do about an unknown key: the nearest known one, else where such a key belongs, else the known keys. */
export const unknownKeyFix = (
  key: string,
  value: unknown,
  known: readonly string[],
  homes: readonly Home[],
): string => {
  const glued = /^([\w$]+):(.+)$/.exec(key);
  if (glued && value === undefined) return `Put a space after the colon: ${glued[1]}: ${glued[2]}.`;
  const typo = nearest(key, known, 1);
  const places = homes.flatMap(({ schema, name }) =>
    groupsOf(schema, '')
      .filter(({ keys }) => keys.includes(key))
      .map(({ path }) =>
        path === '' ? name || 'the top level of the study' : `${path}${name && ` of ${name}`}`,
      ),
  );
  if (typo) {
    // A whole key of one kind of mount may be a slip away from one of another: stow and snow.
    const kinds = places.filter((place) => homes.some(({ name }) => name === place));
    const elsewhere = kinds.length > 0 ? ` ${key} belongs to ${listed([...new Set(kinds)])}.` : '';
    return `Did you mean ${typo}?${elsewhere}`;
  }
  if (places.length > 0)
    return `${key} belongs to ${listed([...new Set(places)])}; move it there or remove it.`;
  const close = nearest(key, known);
  if (close) return `Did you mean ${close}?`;
  return known.length === 0 ? 'Remove it.' : `The keys here are ${listed(known)}.`;
};
