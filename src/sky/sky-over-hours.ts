import { acosDeg, type SkyModel } from '../shared/index.ts';
import { refractionDeg, relativeAirMass, type SunHours } from '../sun/index.ts';
import { SKY_MODELS } from './models.ts';
import { COS_85, type SkyHour, type SkyWeights } from './weights.ts';

/**
 * The light of every hour, ready for any plane; W/m2, hour means, all 0 in hours without sun. The model has been
 * asked once per hour, at its mean cosine of zenith.
 */
export interface SkyHours {
  readonly model: SkyModel;
  /** Direct normal. */
  readonly direct: Float64Array;
  /** Circumsolar light per unit of cosine of incidence. */
  readonly circumsolar: Float64Array;
  /** Isotropic part of the diffuse horizontal. */
  readonly isotropic: Float64Array;
  /** Times the sine of the tilt. */
  readonly horizon: Float64Array;
  /** Times sin^3(tilt / 2) of the isotropic part as seen: Reindl's term, in W/m2. */
  readonly steep: Float64Array;
  /** Global horizontal times ground reflectance. */
  readonly ground: Float64Array;
}

interface Radiation {
  readonly ghi: Float64Array;
  readonly dni: Float64Array;
  readonly dhi: Float64Array;
}

const emptyColumns = (hours: number) => {
  const column = () => new Float64Array(hours);
  return { circumsolar: column(), isotropic: column(), horizon: column(), steep: column() };
};

/**
 * Asks several sky models about every sunlit hour, in one pass over the year.
 * @param albedo ground reflectance 0..1, one number or one per hour
 */
export const skiesOverHours = <M extends SkyModel>(
  sun: SunHours,
  radiation: Radiation,
  albedo: number | Float64Array,
  models: readonly M[],
): Record<M, SkyHours> => {
  const hours = sun.cosZenith.length;
  const [direct, ground] = [new Float64Array(hours), new Float64Array(hours)];
  const skies = models.map((model) => ({ model, ask: SKY_MODELS[model], ...emptyColumns(hours) }));
  const hour: SkyHour = {
    directNormal: 0,
    diffuseHorizontal: 0,
    cosZenith: 0,
    extraterrestrialNormal: 0,
    airMass: 0,
  };
  const weights: SkyWeights = { isotropic: 0, circumsolar: 0, horizon: 0, steepness: 0 };
  for (let h = 0; h < hours; h++) {
    const cosZenith = sun.cosZenith[h];
    if (cosZenith <= 0) continue;
    ground[h] = radiation.ghi[h] * (typeof albedo === 'number' ? albedo : albedo[h]);
    direct[h] = radiation.dni[h];
    const diffuse = radiation.dhi[h];
    if (diffuse <= 0) continue;
    const zenithDeg = acosDeg(cosZenith);
    hour.directNormal = radiation.dni[h];
    hour.diffuseHorizontal = diffuse;
    hour.cosZenith = cosZenith;
    hour.extraterrestrialNormal = sun.extraterrestrialWm2[h];
    hour.airMass = relativeAirMass(zenithDeg - refractionDeg(90 - zenithDeg));
    for (const sky of skies) {
      sky.ask(hour, weights);
      sky.circumsolar[h] = (diffuse * weights.circumsolar) / Math.max(COS_85, cosZenith);
      sky.isotropic[h] = diffuse * weights.isotropic;
      sky.horizon[h] = diffuse * weights.horizon;
      sky.steep[h] = sky.isotropic[h] * weights.steepness;
    }
  }
  const all = {} as Record<M, SkyHours>;
  for (const { ask: _, ...columns } of skies) all[columns.model] = { ...columns, direct, ground };
  return all;
};

/** The same for one sky model. */
export const skyOverHours = (
  sun: SunHours,
  radiation: Radiation,
  albedo: number | Float64Array,
  model: SkyModel,
): SkyHours => skiesOverHours(sun, radiation, albedo, [model])[model];
