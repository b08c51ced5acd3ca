/** What a sky model reads of one hour. Irradiances in W/m2, means over the hour. */
export interface SkyHour {
  directNormal: number;
  diffuseHorizontal: number;
  /** Mean cosine of the zenith angle over the sunlit part, above 0. */
  cosZenith: number;
  /** Irradiance facing the sun above the air. */
  extraterrestrialNormal: number;
  /** Relative optical air mass, not corrected for pressure. */
  airMass: number;
}

/**
 * How a model spreads the diffuse light of one hour over the sky. A plane of tilt b, on which the sun falls at
 * angle of incidence i, receives from the sky, as a share of the diffuse horizontal irradiance:
 *
 *     isotropic (1 + cos b)/2 (1 + steepness sin^3(b/2))  +  circumsolar max(0, cos i)/max(cos 85, cos z)  +  horizon sin b
 */
export interface SkyWeights {
  isotropic: number;
  circumsolar: number;
  horizon: number;
  steepness: number;
}

/** A sky model fills `out` for one hour; it allocates nothing, since it runs 4,400 times a year. */
export type SkyModelFunction = (hour: Readonly<SkyHour>, out: SkyWeights) => void;

/** Cosine below which the sun's height is held when light near it is referred to the horizontal (Perez et al. 1990). */
export const COS_85 = Math.cos((85 * Math.PI) / 180);
