export * from './break-even.ts';
export * from './cost-of-energy.ts';
export * from './mount-cost.ts';
export * from './present-value.ts';
export * from './same-energy.ts';
export type * from './spec.ts';
export * from './words.ts';
