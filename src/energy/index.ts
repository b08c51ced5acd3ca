export * from './delivered.ts';
export * from './heat.ts';
export * from './incidence.ts';
export * from './plane-views.ts';
export * from './skyline-shade.ts';
export type * from './spec.ts';
