export * from './highest-edge.ts';
export * from './limits.ts';
export * from './power-law.ts';
export * from './screen.ts';
export type * from './spec.ts';
export * from './stow.ts';
export * from './velocity-pressure.ts';
export * from './words.ts';
