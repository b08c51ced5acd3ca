/** What a study says about money; all in the study's currency, in real terms. Null is blank, never zero. */

export interface Renewal {
  readonly what: string;
  /** At the end of this year, 1 .. years. */
  readonly year: number;
  readonly cost: number;
}

export interface CostSpec {
  readonly capitalPerKw: number | null;
  /** For the whole array. */
  readonly capital: number | null;
  readonly upkeepPerKw: number | null;
  /** For the whole array, per year. */
  readonly upkeep: number | null;
  readonly renewals: readonly Renewal[];
}

export interface FinanceSpec {
  /** Real discount rate, fraction per year; null: cost per kWh is shown at 4, 7 and 10 %. */
  readonly realRate: number | null;
  readonly years: number | null;
  /** Geometric loss of yield per year, fraction. */
  readonly ageing: number | null;
  readonly currency: string | null;
}
