/** Angles live in degrees at every border; radians stay inside a function. */
export const DEG = Math.PI / 180;

export const sinDeg = (deg: number): number => Math.sin(deg * DEG);
export const cosDeg = (deg: number): number => Math.cos(deg * DEG);
export const tanDeg = (deg: number): number => Math.tan(deg * DEG);

/** Rounding may carry a cosine a hair outside -1..1; the inverse sines and cosines here clamp it first. */
export const clampUnit = (x: number): number => Math.max(-1, Math.min(1, x));
export const asinDeg = (x: number): number => Math.asin(clampUnit(x)) / DEG;
export const acosDeg = (x: number): number => Math.acos(clampUnit(x)) / DEG;
export const atan2Deg = (y: number, x: number): number => Math.atan2(y, x) / DEG;

/** Any angle in degrees to 0 (included) .. 360 (excluded). */
export const wrap360 = (deg: number): number => {
  const wrapped = deg % 360;
  return wrapped < 0 ? (wrapped + 360) % 360 : wrapped + 0;
};

/** Any angle in degrees to -180 (excluded) .. 180 (included). */
export const wrap180 = (deg: number): number => {
  const wrapped = wrap360(deg);
  return wrapped > 180 ? wrapped - 360 : wrapped;
};

const POINTS = [
  'north', 'north-north-east', 'north-east', 'east-north-east',
  'east', 'east-south-east', 'south-east', 'south-south-east',
  'south', 'south-south-west', 'south-west', 'west-south-west',
  'west', 'west-north-west', 'north-west', 'north-north-west',
]; // biome-ignore format: one quadrant a line

/** An azimuth (degrees clockwise from true north) in the words of a sixteen-point compass. */
export const compassWords = (azimuthDeg: number): string =>
  POINTS[Math.round(wrap360(azimuthDeg) / 22.5) % 16];
