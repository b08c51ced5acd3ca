import { bisect, type SameEnergy } from '../shared/index.ts';
import { mountCost } from './mount-cost.ts';
import { presentCost } from './present-value.ts';
import type { CostSpec, FinanceSpec } from './spec.ts';
import { inWords } from './words.ts';

/** DC rating over the inverter's AC rating beyond which nobody adds modules; the limit of the search. */
export const MOST_DC_PER_AC = 2.5;

export interface SameEnergyQuestion {
  readonly tracker: {
    readonly id: string;
    readonly label: string;
    readonly capital: number | null;
    /** At `startDcKw`; absent or null: the cost over the life is not compared. */
    readonly cost?: CostSpec | null;
  };
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
  /** Absent, or without rate or years: the cost over the life is not compared. */
  readonly finance?: Pick<FinanceSpec, 'realRate' | 'years'>;
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

/** A rating or an area: two decimals at most, so that whole modules of a usual size print exactly. */
const sizeWords = (x: number): string => (x < 1000 ? String(Number(x.toFixed(2))) : inWords(x));

const arrayWords = (q: SameEnergyQuestion, dcKw: number, modules: number | null): string => {
  const { label } = q.reference;
  if (modules === null || q.moduleKw === null)
    return `${sizeWords(dcKw)} kW of fixed modules on ${label} in place of ${sizeWords(q.startDcKw)} kW`;
  const area = q.moduleAreaM2 === null ? '' : `, ${Math.round(modules * q.moduleAreaM2)} m2`;
  return `${modules} fixed modules (${sizeWords(dcKw)} kW${area}) on ${label} in place of ${Math.round(q.startDcKw / q.moduleKw)}`;
};

interface Differences {
  readonly capital: number | null;
  readonly presentCost: number | null;
}

const moneyWords = (q: SameEnergyQuestion, { capital, presentCost }: Differences): string => {
  const currency = q.currency === null ? '' : ` ${q.currency}`;
  const moreOrLess = (x: number) => `${inWords(Math.abs(x))}${currency} ${x < 0 ? 'less' : 'more'}`;
  if (capital === null) return '; the difference in capital is not known';
  const paid = capital === 0 ? 'the same capital as' : `${moreOrLess(capital)} capital than`;
  const { realRate = null, years = null } = q.finance ?? {};
  const overLife =
    presentCost === null || realRate === null || years === null
      ? ''
      : ` and ${presentCost === 0 ? 'the same' : moreOrLess(presentCost)} over ${sizeWords(years)} years ` +
        `(present cost at ${sizeWords(realRate * 100)} %)`;
  return `, for ${paid} ${q.tracker.label}${overLife}`;
};

const sentence = (
  q: SameEnergyQuestion,
  dcKw: number,
  modules: number | null,
  differences: Differences,
): string => {
  const inverter =
    q.inverterKw === null
      ? ' (no inverter is given, so its ceiling was not counted)'
      : ` under the same ${sizeWords(q.inverterKw)} kW inverter`;
  return (
    `${arrayWords(q, dcKw, modules)} deliver the ${inWords(q.targetKwh)} kWh a year of ${q.tracker.label}` +
    `${inverter}${moneyWords(q, differences)}.`
  );
};

/** Capital, upkeep and renewals of one mount over the life; null where a part, the rate or the years are not known. */
const presentCostOf = (cost: CostSpec | null | undefined, dcKw: number, q: SameEnergyQuestion) => {
  const { realRate = null, years = null } = q.finance ?? {};
  const { capital, upkeepPerYear, renewals } = mountCost(cost ?? null, dcKw);
  return capital === null || upkeepPerYear === null || realRate === null || years === null
    ? null
    : presentCost({ capital, upkeepPerYear, renewals }, realRate, years);
};

const less = (a: number | null, b: number | null): number | null => (a === null || b === null ? null : a - b);

/**
 * The array on the reference mount that delivers as much in its first year as one tracker, under the same
 * inverter: the fewest whole modules, or the exact rating where no module is given. Searched up to 2.5 DC per
 * AC; beyond that it is not reachable and the most it can give is returned. Capital is the reference's cost
 * per kW and fixed cost at the new size; so is upkeep in the present cost over the life. Renewals are held.
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
      present_cost_difference: null,
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
  const differences = {
    capital: less(capital, q.tracker.capital),
    presentCost: less(
      presentCostOf(q.reference.cost, dcKw, q),
      presentCostOf(q.tracker.cost, q.startDcKw, q),
    ),
  };
  return {
    ...known,
    ...sized(dcKw, modules),
    reachable: true,
    energy_kwh: q.energyOfDcKw(dcKw),
    capital,
    capital_difference: differences.capital,
    present_cost_difference: differences.presentCost,
    text: sentence(q, dcKw, modules, differences),
  };
};
