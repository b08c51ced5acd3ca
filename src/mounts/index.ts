export type * from './spec.ts';
