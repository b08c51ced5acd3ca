export * from './angles.ts';
export * from './calendar.ts';
export * from './edit-distance.ts';
export * from './errors.ts';
export * from './hourly-year.ts';
export * from './numerics.ts';
export * from './results.ts';
