export * from './air-mass.ts';
export * from './ephemeris.ts';
export * from './extraterrestrial.ts';
export * from './position.ts';
export * from './refraction.ts';
export * from './rise-set.ts';
export * from './sun-over-hours.ts';
