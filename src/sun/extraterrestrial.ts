/**
 * Total solar irradiance at one astronomical unit, W/m2: between Kopp & Lean 2011 (Geophys. Res. Lett. 38,
 * L01706: 1360.8 +- 0.5) and Gueymard 2018 (Solar Energy 168: 1361.1 +- 0.5).
 */
export const SOLAR_CONSTANT_WM2 = 1361;

/** Irradiance on a plane that faces the sun above the air, W/m2 (inverse square of the distance). */
export const extraterrestrialNormalWm2 = (distanceAu: number): number => SOLAR_CONSTANT_WM2 / distanceAu ** 2;
