import type { Io } from './io.ts';

/** The JSON Schema of the study file, for editors. */
export const schema = async (io: Io): Promise<void> => {
  const { studyJsonSchema } = await import('../inputs/index.ts');
  io.out(`${JSON.stringify(await studyJsonSchema(), null, 2)}\n`);
};
