/**
 * JSON Schema (draft 7) of the study file as a user writes it, numbers or text with units, for editors. It is made
 * of the schema that reads the file. Rules that tie several keys together are not in it: `readStudy` knows them.
 */
export const studyJsonSchema = async (): Promise<object> => {
  const { editorSchema } = await import('./editor-schema.ts');
  return editorSchema();
};
