import type { ArraySpec } from '../energy/index.ts';
import type { ArraySummary } from '../shared/index.ts';

/** The array in whole modules where a module is given: the count nearest to the rating asked for, and at least one. */
export const arrayOf = (spec: ArraySpec): ArraySummary => {
  const { module } = spec;
  const modules = module ? Math.max(1, Math.round((spec.dcKw * 1000) / module.powerW)) : null;
  return {
    given: spec.given,
    dc_kw: module && modules ? (modules * module.powerW) / 1000 : spec.dcKw,
    ac_kw: spec.inverterKw,
    modules,
    module_w: module?.powerW ?? null,
    module_area_m2: module?.lengthM && module.widthM ? module.lengthM * module.widthM : null,
  };
};
