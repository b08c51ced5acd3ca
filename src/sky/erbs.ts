/**
 * Diffuse share of global horizontal light from the clearness index.
 * Erbs, Klein & Duffie 1982, Solar Energy 28, 293, eq. 1.
 * @param clearness global over extraterrestrial horizontal, 0 upwards
 */
export const erbsDiffuseFraction = (clearness: number): number => {
  if (clearness <= 0.22) return 1 - 0.09 * clearness;
  if (clearness > 0.8) return 0.165;
  return 0.9511 + clearness * (-0.1604 + clearness * (4.388 + clearness * (-16.638 + 12.336 * clearness)));
};

/** Below this sun (zenith beyond 87 degrees) all light is taken as diffuse: dividing by cos z would invent beam. */
const COS_87 = Math.cos((87 * Math.PI) / 180);

/**
 * Splits a year of global horizontal irradiance into direct normal and diffuse, hour by hour (means over the hour, its
 * dark part included), so that global is direct times the cosine of the zenith over the sunlit part, plus diffuse.
 * Direct is capped at the extraterrestrial irradiance of the hour; what it may not hold goes to the diffuse.
 */
export const splitGlobal = (
  ghi: Float64Array,
  sun: { cosZenith: Float64Array; sunlit: Float64Array; extraterrestrialWm2: Float64Array },
): { dni: Float64Array; dhi: Float64Array } => {
  const [dni, dhi] = [new Float64Array(ghi.length), new Float64Array(ghi.length)];
  for (let h = 0; h < ghi.length; h++) {
    const cosZenith = sun.cosZenith[h];
    if (cosZenith <= 0 || ghi[h] <= 0) continue;
    const extraterrestrial = sun.extraterrestrialWm2[h] * sun.sunlit[h];
    const diffuse = ghi[h] * erbsDiffuseFraction(ghi[h] / (extraterrestrial * cosZenith));
    const beam = cosZenith < COS_87 ? 0 : (ghi[h] - diffuse) / cosZenith;
    dni[h] = Math.min(beam, extraterrestrial);
    dhi[h] = ghi[h] - dni[h] * cosZenith;
  }
  return { dni, dhi };
};
