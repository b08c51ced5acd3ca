import { monthlySums, yearlySum } from '../shared/index.ts';
import type { SkyHours } from '../sky/index.ts';
import { type HeatLoss, moduleTemperatureC, powerAtTemperature } from './heat.ts';
import { lightThrough, type PlaneViews } from './plane-views.ts';
import type { DriveSpec, LossSpec } from './spec.ts';

/** The air around the array; null columns are not counted. */
export interface Ambient {
  readonly temperatureC: Float64Array | null;
  /** At 10 m; null: still air is taken, and said. */
  readonly windMs: Float64Array | null;
}

/** What turns light into delivered energy on one mount. Shares are fractions; null is blank and takes nothing. */
export interface ChainSpec {
  readonly ambient: Ambient;
  readonly heatLoss: HeatLoss;
  /** Wind at the modules over wind at 10 m. */
  readonly windFactor: number;
  readonly heatPerK: number;
  readonly losses: LossSpec;
  /** Inverter's AC rating per kW of DC; null: no ceiling. */
  readonly ceilingKwPerKw: number | null;
  readonly drive: DriveSpec | null;
}

export interface Stage {
  readonly name: StageName;
  /** What is left over what came in, 0..1. */
  readonly efficiency: number;
  readonly kwhPerKwAfter: number;
}

export type StageName =
  | 'rows'
  | 'incidence'
  | 'heat'
  | 'dirt'
  | 'module spread'
  | 'cables'
  | 'conversion'
  | 'inverter ceiling'
  | 'drive'
  | 'downtime';

/** What one kW of DC rating delivers. */
export interface Delivered {
  /** Open light on the plane, kWh/m2 (1 kWh/m2 is 1 kWh per kW at test conditions). */
  readonly irradiationKwhM2: number;
  readonly irradiationMonthlyKwhM2: readonly number[];
  /** Counted stages, in order: their efficiencies times the irradiation are the energy. */
  readonly stages: readonly Stage[];
  readonly energyKwhPerKw: number;
  readonly energyMonthlyKwhPerKw: readonly number[];
  /** AC power before the inverter's ceiling, kW per kW, hour by hour. */
  readonly uncappedKwPerKw: Float64Array;
}

/** DC to AC, before the ceiling: light past the glass times heat, times the constant shares. kW per kW. */
const uncappedPower = (
  lit: Float64Array,
  warmed: Float64Array,
  spec: ChainSpec,
): { power: Float64Array; afterHeat: number } => {
  const power = new Float64Array(lit.length);
  const { temperatureC, windMs } = spec.ambient;
  const { u0, u1 } = spec.heatLoss;
  const kept = constantShares(spec.losses).reduce((product, [, share]) => product * (1 - share), 1);
  let afterHeat = 0;
  for (let h = 0; h < lit.length; h++) {
    if (lit[h] <= 0) continue;
    let heat = 1;
    if (temperatureC) {
      const wind = windMs ? windMs[h] * spec.windFactor : 0;
      heat = Math.max(
        0,
        powerAtTemperature(moduleTemperatureC(temperatureC[h], warmed[h], wind, u0, u1), spec.heatPerK),
      );
    }
    const dc = (lit[h] / 1000) * heat;
    afterHeat += dc;
    power[h] = dc * kept;
  }
  return { power, afterHeat };
};

/** The stages that take the same share of every hour, in order, where they are given. */
const constantShares = (losses: LossSpec): [StageName, number][] =>
  (
    [
      ['dirt', losses.dirt],
      ['module spread', losses.moduleSpread],
      ['cables', losses.cables],
      ['conversion', losses.conversion],
    ] as [StageName, number | null][]
  ).filter((stage): stage is [StageName, number] => stage[1] !== null);

const capped = (power: Float64Array, ceiling: number | null): Float64Array => {
  if (ceiling === null) return power;
  const under = new Float64Array(power.length);
  for (let h = 0; h < power.length; h++) under[h] = Math.min(power[h], ceiling);
  return under;
};

/**
 * From the views of a plane and a sky to delivered AC energy, stage by stage: rows, incidence, heat, dirt, module
 * spread, cables, conversion, the inverter's ceiling hour by hour, the drive's own use, and downtime.
 * A tracker that does not work delivers what it does where it is stuck: energy is `working` times the tracker's own
 * and `1 - working` times the stuck plane's (expected value; failures are taken as even over the year).
 * @param stuck views of the plane where a dead tracker lies; needed where `drive.working` is given
 */
export const deliver = (
  sky: SkyHours,
  views: PlaneViews,
  spec: ChainSpec,
  stuck: PlaneViews | null = null,
): Delivered => {
  const open = lightThrough(sky, views.open);
  const behindRows = views.rows === views.open ? open : lightThrough(sky, views.rows);
  const lit = lightThrough(sky, views.glass);
  const irradiationKwhM2 = yearlySum(open) / 1000;
  const stages: Stage[] = [];
  let [before, now] = [irradiationKwhM2, irradiationKwhM2];
  const stage = (name: StageName, after: number) => {
    stages.push({ name, efficiency: before > 0 ? after / before : 1, kwhPerKwAfter: after });
    [before, now] = [after, after];
  };
  if (views.rows !== views.open) stage('rows', yearlySum(behindRows) / 1000);
  stage('incidence', yearlySum(lit) / 1000);
  const { power, afterHeat } = uncappedPower(lit, behindRows, spec);
  if (spec.ambient.temperatureC) stage('heat', afterHeat);
  for (const [name, share] of constantShares(spec.losses)) stage(name, now * (1 - share));
  let ac = capped(power, spec.ceilingKwPerKw);
  if (spec.ceilingKwPerKw !== null) stage('inverter ceiling', yearlySum(ac));
  const ownUse = spec.drive?.ownUse ?? null;
  if (ownUse !== null) {
    ac = ac.map((p) => p * (1 - ownUse));
    stage('drive', yearlySum(ac));
  }
  const working = spec.drive?.working ?? null;
  if (working !== null && stuck) {
    const still = uncappedPower(lightThrough(sky, stuck.glass), lightThrough(sky, stuck.rows), spec).power;
    const dead = capped(still, spec.ceilingKwPerKw);
    ac = ac.map((p, h) => working * p + (1 - working) * dead[h]);
    stage('downtime', yearlySum(ac));
  }
  return {
    irradiationKwhM2,
    irradiationMonthlyKwhM2: monthlySums(open).map((wh) => wh / 1000),
    stages,
    energyKwhPerKw: yearlySum(ac),
    energyMonthlyKwhPerKw: monthlySums(ac),
    uncappedKwPerKw: power,
  };
};

/** Yearly AC energy of an array of `dcKw` under an inverter of `inverterKw` (null: none), kWh, from one kW's hours. */
export const energyUnderInverter = (
  uncappedKwPerKw: Float64Array,
  dcKw: number,
  inverterKw: number | null,
): number => {
  if (inverterKw === null) return dcKw * yearlySum(uncappedKwPerKw);
  let sum = 0;
  for (let h = 0; h < uncappedKwPerKw.length; h++) sum += Math.min(uncappedKwPerKw[h] * dcKw, inverterKw);
  return sum;
};
