import { MONTH_FIRST_DAY, yearlySum } from '../shared/index.ts';
import type { SkyHours } from '../sky/index.ts';
import { type HeatLoss, moduleTemperatureC, powerAtTemperature } from './heat.ts';
import { lightAt, type PlaneViews } from './plane-views.ts';
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
  /** Share of each month's light that snow takes, twelve of them 0..1; null: not counted. */
  readonly snow: readonly number[] | null;
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
  | 'skyline'
  | 'rows'
  | 'incidence'
  | 'heat'
  | 'dirt'
  | 'snow'
  | 'module spread'
  | 'cables'
  | 'conversion'
  | 'inverter ceiling'
  | 'stow'
  | 'drive'
  | 'downtime';

/** A plane that is parked in some hours: which (1), and its views while it is. */
export interface Parked {
  readonly stowed: Uint8Array;
  readonly views: PlaneViews;
}

/** What one kW of DC rating delivers. */
export interface Delivered {
  /** Open light on the plane, kWh/m2 (1 kWh/m2 is 1 kWh per kW at test conditions). */
  readonly irradiationKwhM2: number;
  readonly irradiationMonthlyKwhM2: readonly number[];
  /** What of it comes past the skyline, by month; all of it with an open horizon. */
  readonly pastSkylineMonthlyKwhM2: readonly number[];
  /** Counted stages, in order: their efficiencies times the irradiation are the energy. */
  readonly stages: readonly Stage[];
  readonly energyKwhPerKw: number;
  readonly energyMonthlyKwhPerKw: readonly number[];
  /** AC power before the inverter's ceiling, kW per kW, hour by hour; in parked hours that of the parked plane. */
  readonly uncappedKwPerKw: Float64Array;
  /** What parking takes by month, before the drive's own use and downtime; negative where it gives. Null where not counted. */
  readonly lostToStowMonthlyKwhPerKw: readonly number[] | null;
  /** What one kW would deliver if its tracker stood dead all year; null where downtime is not counted. */
  readonly deadKwhPerKw: number | null;
  /** That over what the tracker delivers while it works; null where downtime is not counted. */
  readonly keptWhileDead: number | null;
}

/** One pass over the year: sums at each depth, kWh per kW of DC rating (1 kWh/m2 of light is 1 kWh per kW). */
interface YearPass {
  readonly open: number[];
  readonly skyline: number[];
  readonly rows: number;
  readonly lit: number;
  readonly heated: number;
  /** What of `heated` snow leaves. */
  readonly clear: number;
  /** AC energy under the ceiling, by month. */
  readonly ac: number[];
  /** AC power before the ceiling, hour by hour, kW per kW. */
  readonly uncapped: Float64Array;
}

/** Follows the light of every hour to AC power: all that cannot be told from yearly sums happens here. */
const passThroughYear = (sky: SkyHours, views: PlaneViews, spec: ChainSpec): YearPass => {
  const { temperatureC, windMs } = spec.ambient;
  const { u0, u1 } = spec.heatLoss;
  const hasSkyline = views.skyline !== views.open;
  const hasRows = views.rows !== views.skyline;
  const ceiling = spec.ceilingKwPerKw ?? Number.POSITIVE_INFINITY;
  const kept = constantShares(spec.losses).reduce((product, [, share]) => product * (1 - share), 1);
  const uncapped = new Float64Array(sky.direct.length);
  const twelve = () => new Array<number>(12).fill(0);
  const pass = {
    open: twelve(),
    skyline: twelve(),
    rows: 0,
    lit: 0,
    heated: 0,
    clear: 0,
    ac: twelve(),
    uncapped,
  };
  for (let month = 0; month < 12; month++) {
    let open = 0;
    let pastSkyline = 0;
    let ac = 0;
    let heated = 0;
    const clear = 1 - (spec.snow?.[month] ?? 0);
    const keptClear = kept * clear;
    const end = MONTH_FIRST_DAY[month + 1] * 24;
    for (let h = MONTH_FIRST_DAY[month] * 24; h < end; h++) {
      const light = lightAt(sky, views.open, h) / 1000;
      if (light <= 0) continue;
      const seen = hasSkyline ? lightAt(sky, views.skyline, h) / 1000 : light;
      const behindRows = hasRows ? lightAt(sky, views.rows, h) / 1000 : seen;
      const lit = Math.max(0, lightAt(sky, views.glass, h) / 1000);
      let dc = lit;
      if (temperatureC) {
        const wind = windMs ? windMs[h] * spec.windFactor : 0;
        const moduleC = moduleTemperatureC(temperatureC[h], behindRows * 1000, wind, u0, u1);
        dc *= Math.max(0, powerAtTemperature(moduleC, spec.heatPerK));
      }
      const power = dc * keptClear;
      open += light;
      pastSkyline += seen;
      pass.rows += behindRows;
      pass.lit += lit;
      pass.heated += dc;
      heated += dc;
      uncapped[h] = power;
      ac += Math.min(power, ceiling);
    }
    pass.clear += heated * clear;
    pass.open[month] = open;
    pass.skyline[month] = pastSkyline;
    pass.ac[month] = ac;
  }
  return pass;
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

const sum = (monthly: readonly number[]): number => monthly.reduce((total, month) => total + month, 0);

/**
 * From the views of a plane and a sky to delivered AC energy, stage by stage: skyline, rows, incidence, heat, dirt, snow,
 * module spread, cables, conversion, the inverter's ceiling hour by hour, stow, the drive's own use, and downtime.
 * A parked plane goes through the same chain; stow is the step from a plane that never parks to one that does.
 * A tracker that does not work delivers what it does where it is stuck: energy is `working` times the tracker's own
 * and `1 - working` times the stuck plane's (expected value; failures are taken as even over the year).
 * @param stuck views of the planes where a dead tracker may stand, each as likely as the others; needed where
 *   `drive.working` is given
 * @param parked null: never parked
 */
export const deliver = (
  sky: SkyHours,
  views: PlaneViews,
  spec: ChainSpec,
  stuck: readonly PlaneViews[] = [],
  parked: Parked | null = null,
): Delivered => {
  const pass = passThroughYear(sky, views, spec);
  const irradiationKwhM2 = sum(pass.open);
  const stages: Stage[] = [];
  let now = irradiationKwhM2;
  const stage = (name: StageName, after: number) => {
    stages.push({ name, efficiency: now > 0 ? after / now : 1, kwhPerKwAfter: after });
    now = after;
  };
  if (views.skyline !== views.open) stage('skyline', sum(pass.skyline));
  if (views.rows !== views.skyline) stage('rows', pass.rows);
  stage('incidence', pass.lit);
  if (spec.ambient.temperatureC) stage('heat', pass.heated);
  const shares = constantShares(spec.losses);
  for (const [name, share] of shares) if (name === 'dirt') stage(name, now * (1 - share));
  if (spec.snow) stage('snow', pass.heated > 0 ? (now * pass.clear) / pass.heated : 0);
  for (const [name, share] of shares) if (name !== 'dirt') stage(name, now * (1 - share));
  let ac = pass.ac;
  if (spec.ceilingKwPerKw !== null) stage('inverter ceiling', sum(ac));
  let lostToStow: number[] | null = null;
  if (parked) {
    lostToStow = park(pass.uncapped, passThroughYear(sky, parked.views, spec).uncapped, parked.stowed, spec);
    ac = ac.map((kwh, month) => kwh - (lostToStow as number[])[month]);
    stage('stow', sum(ac));
  }
  const ownUse = spec.drive?.ownUse ?? null;
  if (ownUse !== null) {
    ac = ac.map((kwh) => kwh * (1 - ownUse));
    stage('drive', sum(ac));
  }
  const working = spec.drive?.working ?? null;
  let [deadKwhPerKw, keptWhileDead]: (number | null)[] = [null, null];
  if (working !== null && stuck.length > 0) {
    const dead = meanOfMonths(stuck.map((views) => passThroughYear(sky, views, spec).ac));
    deadKwhPerKw = sum(dead);
    keptWhileDead = now > 0 ? deadKwhPerKw / now : null;
    ac = ac.map((kwh, month) => working * kwh + (1 - working) * dead[month]);
    stage('downtime', sum(ac));
  }
  return {
    irradiationKwhM2,
    irradiationMonthlyKwhM2: pass.open,
    pastSkylineMonthlyKwhM2: pass.skyline,
    stages,
    energyKwhPerKw: sum(ac),
    energyMonthlyKwhPerKw: ac,
    uncappedKwPerKw: pass.uncapped,
    lostToStowMonthlyKwhPerKw: lostToStow,
    deadKwhPerKw,
    keptWhileDead,
  };
};

/** Puts the parked plane's power in the parked hours of `uncapped`; returns what that takes under the ceiling, by month. */
const park = (
  uncapped: Float64Array,
  still: Float64Array,
  stowed: Uint8Array,
  { ceilingKwPerKw }: ChainSpec,
): number[] => {
  const ceiling = ceilingKwPerKw ?? Number.POSITIVE_INFINITY;
  const lost = new Array<number>(12).fill(0);
  for (let month = 0; month < 12; month++)
    for (let h = MONTH_FIRST_DAY[month] * 24; h < MONTH_FIRST_DAY[month + 1] * 24; h++) {
      if (stowed[h] === 0) continue;
      lost[month] += Math.min(uncapped[h], ceiling) - Math.min(still[h], ceiling);
      uncapped[h] = still[h];
    }
  return lost;
};

/** Month by month, the mean of years that are equally likely. */
const meanOfMonths = (years: readonly (readonly number[])[]): number[] =>
  years[0].map((_, month) => years.reduce((total, year) => total + year[month], 0) / years.length);

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
