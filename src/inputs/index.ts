export { studyJsonSchema } from './json-schema.ts';
export { readStudy } from './read-study.ts';
export type * from './study-file.ts';
export { studyTemplate } from './template.ts';
