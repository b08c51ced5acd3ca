import { bisect, type SameEnergy } from '../shared/index.ts';
import { mountCost } from './mount-cost.ts';
import type { CostSpec } from './spec.ts';
import { inWords } from './words.ts';

/** DC rating over the inverter's AC rating beyond which nobody adds modules; the limit of the search. */
export const MOST_DC_PER_AC = 2.5;

export interface SameEnergyQuestion {
  readonly tracker: { readonly id: string; readonly label: string; readonly capital: number | null };
  readonly reference: { readonly id: string; readonly label: string; readonly cost: CostSpec | null };
  /** What the tracker delivers in the first year, whole array. */
  readonly targetKwh: number;
  /** First year's AC energy of the reference mount at another DC rating, under the same inverter; never falls. */
  readonly energyOfDcKw: (dcKw: number) => number;
  /** DC rating that the study compares, kW. */
  readonly startDcKw: number;
  /** Rated power of one module, kW; null: the answer is an exact rating rather than whole modules. */
  readonly moduleKw: number | null;
  readonly moduleAreaM2: number | null;
  readonly inverterKw: number | null;
  readonly currency: string | null;
}

/** The smallest whole number in 1 .. `most` at which the rising `energy` reaches `target`; `most` does reach it. */
const fewest = (energy: (count: number) => number, target: number, most: number): number => {
  let [low, high] = [0, most];
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2);
    if (energy(middle) >= target) high = middle;
    else low = middle;
  }
  return high;
};

/** Without an inverter energy is in proportion to the rating, so this rating surely reaches the target. */
const sureDcKw = (q: SameEnergyQuestion): number =>
  ((q.startDcKw * q.targetKwh) / q.energyOfDcKw(q.startDcKw)) * 1.000001;

/** Largest rating to try: whole modules, up to 2.5 DC per AC (or the study's own rating where that is more). */
const searchLimit = (q: SameEnergyQuestion): number => {
  const most = q.inverterKw === null ? sureDcKw(q) : Math.max(MOST_DC_PER_AC * q.inverterKw, q.startDcKw);
  if (q.moduleKw === null) return most;
  const whole = most / q.moduleKw;
  return q.moduleKw * Math.max(1, q.inverterKw === null ? Math.ceil(whole) : Math.floor(whole + 1e-9));
};

const sentence = (q: SameEnergyQuestion, dcKw: number, modules: number | null, difference: number | null) => {
  const size =
    modules === null || q.moduleKw === null
      ? `${inWords(dcKw)} kW of ${q.reference.label} in place of ${inWords(q.startDcKw)} kW`
      : `${modules} modules on ${q.reference.label} in place of ${Math.round(q.startDcKw / q.moduleKw)}`;
  const inverter =
    q.inverterKw === null
      ? 'no inverter is given, so its ceiling was not counted'
      : `under the same ${inWords(q.inverterKw)} kW inverter`;
  const money =
    difference === null
      ? 'the difference in capital is not known'
      : difference === 0
        ? 'the same capital'
        : `${inWords(Math.abs(difference))} ${q.currency ?? ''}`.trim() +
          (difference < 0 ? ' less capital' : ' more capital');
  return `${size} deliver the ${inWords(q.targetKwh)} kWh a year of ${q.tracker.label} (${inverter}): ${money}.`;
};

/**
 * The array on the reference mount that delivers as much in its first year as one tracker, under the same
 * inverter: the fewest whole modules, or the exact rating where no module is given. Searched up to 2.5 DC per
 * AC; beyond that it is not reachable and the most it can give is returned. Capital is the reference's cost
 * per kW and fixed cost at the new size.
 */
export const sameEnergy = (q: SameEnergyQuestion): SameEnergy => {
  const limitKw = searchLimit(q);
  const most = q.energyOfDcKw(limitKw);
  const known = { tracker_id: q.tracker.id, reference_id: q.reference.id, target_kwh: q.targetKwh };
  const sized = (dcKw: number, modules: number | null) => ({
    modules,
    dc_kw: dcKw,
    module_area_m2: modules === null || q.moduleAreaM2 === null ? null : modules * q.moduleAreaM2,
  });
  if (!(most >= q.targetKwh)) {
    return {
      ...known,
      ...sized(limitKw, q.moduleKw === null ? null : Math.round(limitKw / q.moduleKw)),
      reachable: false,
      energy_kwh: most,
      capital: null,
      capital_difference: null,
      text:
        `not reachable under this inverter: ${q.reference.label} gives at most ${inWords(most)} kWh of the ` +
        `${inWords(q.targetKwh)} of ${q.tracker.label}, with ${inWords(limitKw)} kW on it.`,
    };
  }
  const { moduleKw } = q;
  const modules =
    moduleKw === null
      ? null
      : fewest((n) => q.energyOfDcKw(n * moduleKw), q.targetKwh, Math.round(limitKw / moduleKw));
  const dcKw =
    modules === null || moduleKw === null
      ? bisect((kw) => q.energyOfDcKw(kw) - q.targetKwh, limitKw * 1e-6, limitKw, limitKw * 1e-7)
      : modules * moduleKw;
  const { capital } = mountCost(q.reference.cost, dcKw);
  const difference = capital === null || q.tracker.capital === null ? null : capital - q.tracker.capital;
  return {
    ...known,
    ...sized(dcKw, modules),
    reachable: true,
    energy_kwh: q.energyOfDcKw(dcKw),
    capital,
    capital_difference: difference,
    text: sentence(q, dcKw, modules, difference),
  };
};
