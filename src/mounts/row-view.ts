/**
 * What a plane in long rows still sees of an even sky and ground, by Hottel's crossed strings (Hottel & Sarofim,
 * Radiative Transfer, 1967, ch. 2): exact for infinite rows, mean over the slant. With slant 1 and pitch P = 1/GCR
 * the plane sees the sky through the gap between its top edge and that of the row before it.
 */

/** View of the sky, 0..1; (1 + cos tilt)/2 without rows. */
export const skyViewBetweenRows = (cosTilt: number, gcr: number): number => {
  const pitch = 1 / gcr;
  return (1 + pitch - Math.sqrt(pitch * pitch - 2 * pitch * cosTilt + 1)) / 2;
};

/** View of the ground between the rows, lower edges taken at the ground, 0..1; (1 - cos tilt)/2 without rows. */
export const groundViewBetweenRows = (cosTilt: number, gcr: number): number => {
  const pitch = 1 / gcr;
  return (1 + pitch - Math.sqrt(pitch * pitch + 2 * pitch * cosTilt + 1)) / 2;
};

/** Share of the open view of the sky that rows leave. */
export const skyLeftByRows = (cosTilt: number, gcr: number): number =>
  skyViewBetweenRows(cosTilt, gcr) / ((1 + cosTilt) / 2);

/** Share of the open view of the ground that rows leave; lying flat, where both are 0, the limit 1/(1 + GCR). */
export const groundLeftByRows = (cosTilt: number, gcr: number): number =>
  cosTilt > 0.9999 ? 1 / (1 + gcr) : groundViewBetweenRows(cosTilt, gcr) / ((1 - cosTilt) / 2);
