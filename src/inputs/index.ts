export type * from './study-file.ts';
