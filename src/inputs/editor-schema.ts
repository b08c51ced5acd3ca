import { toJSONSchema } from 'zod/mini';
import { documentedUnits } from './convert.ts';
import { hints } from './fields/field.ts';
import { partsOf } from './known-keys.ts';
import { wholeStudy } from './schema/study.ts';

type Json = { [key: string]: unknown };

/** An optional key may be left blank, which YAML reads as null. */
const orBlank = (schema: Json): Json => {
  if (Array.isArray(schema.enum)) return { ...schema, enum: [...schema.enum, null] };
  if (Array.isArray(schema.anyOf)) return { ...schema, anyOf: [...schema.anyOf, { type: 'null' }] };
  return { ...schema, type: [schema.type, 'null'].flat() };
};

const withBlanks = (schema: unknown): unknown => {
  if (Array.isArray(schema)) return schema.map(withBlanks);
  if (typeof schema !== 'object' || schema === null) return schema;
  const json = Object.fromEntries(
    Object.entries(schema).map(([key, inner]) => [key, withBlanks(inner)]),
  ) as Json;
  if (json.type !== 'object' || typeof json.properties !== 'object') return json;
  const required = new Set((json.required ?? []) as string[]);
  const properties = Object.entries(json.properties as Record<string, Json>);
  json.properties = Object.fromEntries(
    properties.map(([key, inner]) => [key, required.has(key) ? inner : orBlank(inner)]),
  );
  return json;
};

/** The JSON Schema of a study, made of the schema that reads it. */
export const editorSchema = (): object => {
  const json = toJSONSchema(wholeStudy(documentedUnits(() => undefined)), {
    target: 'draft-7',
    io: 'input',
    unrepresentable: 'any', // fields are transforms: their input form stands in the hints
    metadata: hints,
    override: ({ zodSchema, jsonSchema }) => {
      // For zod a transform may do with nothing, so it counts as optional there, and its examples are dropped.
      const { shape, type } = partsOf(zodSchema);
      const needed = Object.entries(shape ?? {}).filter(([, inner]) => partsOf(inner).type !== 'optional');
      if (needed.length > 0) jsonSchema.required = needed.map(([key]) => key);
      const examples = type === 'transform' ? hints.get(zodSchema)?.examples : undefined;
      if (examples) jsonSchema.examples = examples as string[];
    },
  });
  return withBlanks(json) as object;
};
