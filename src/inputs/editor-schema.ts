import { toJSONSchema } from 'zod/mini';
import { documentedUnits } from './convert.ts';
import { hints } from './fields/field.ts';
import { wholeStudy } from './study-schema.ts';

type Json = { [key: string]: unknown };

/** An optional key may be left blank, which YAML reads as null. */
const allowBlank = (schema: Json): void => {
  if (Array.isArray(schema.enum)) schema.enum = [...schema.enum, null];
  else if ('type' in schema) schema.type = [...new Set([schema.type, 'null'].flat())];
  else if (Array.isArray(schema.anyOf)) schema.anyOf = [...schema.anyOf, { type: 'null' }];
};

/** The JSON Schema of a study, made of the schema that reads it. */
export const editorSchema = (): object =>
  toJSONSchema(wholeStudy(documentedUnits(() => undefined)), {
    target: 'draft-7',
    io: 'input',
    metadata: hints,
    override: ({ jsonSchema }) => {
      const required = new Set(jsonSchema.required);
      for (const [key, inner] of Object.entries(jsonSchema.properties ?? {}))
        if (!required.has(key)) allowBlank(inner as Json);
    },
  });
