import { mountCost, presentEnergy } from '../cost/index.ts';
import { type ChainSpec, type Delivered, deliver, energyUnderInverter } from '../energy/index.ts';
import { isTracker } from '../mounts/index.ts';
import type { NotCounted } from '../shared/index.ts';
import { GUST_FACTOR } from '../wind/index.ts';
import type { MountRun } from './mount-run.ts';
import type { Setting } from './setting.ts';

/** The setting, and every mount worked out in it: what the effects below are reckoned from. */
export interface Counted extends Setting {
  readonly runs: readonly MountRun[];
  readonly reference: MountRun;
}

/** One plausible value of each blank, to show what it would do. They are examples, never applied. */
const WORKING_EXAMPLE = 0.95;
const OWN_USE_EXAMPLE = 0.005;
const LOSS_EXAMPLES = { dirt: 0.03, moduleSpread: 0.01, cables: 0.015, conversion: 0.035 } as const;
const LOSS_KEYS = {
  dirt: 'dirt',
  moduleSpread: 'module_spread',
  cables: 'cables',
  conversion: 'conversion',
} as const;
const DC_PER_AC_EXAMPLE = 1.2;
const AGEING_EXAMPLE = 0.005;
const STOW_GUST_MS = 15;
const LOW_SUN = Math.sin((10 * Math.PI) / 180);
const SNOW_EXAMPLE = 0.2;
const RENEWAL_EXAMPLE = { share: 0.05, year: 12 };

const percent = (share: number): string => `${Number((share * 100).toFixed(1))} %`;
const kwh = (x: number): string => `${Math.round(x)} kWh/kW·yr`;

const deliveredBy = (c: Counted, run: MountRun): Delivered => run.delivered[c.study.sky.model];
const again = (c: Counted, run: MountRun, change: Partial<ChainSpec>): Delivered =>
  deliver(c.sky, run.views, { ...run.chain, ...change }, run.stuck, run.parked);
const each = (c: Counted, share: (run: MountRun) => number): string =>
  c.runs.map((run) => `${run.mount.id} ${percent(share(run))}`).join(', ');

const lossLines = (c: Counted): NotCounted[] =>
  (Object.keys(LOSS_KEYS) as (keyof typeof LOSS_KEYS)[])
    .filter((key) => c.study.losses[key] === null)
    .map((key) => {
      const energy = deliveredBy(c, c.reference).energyKwhPerKw;
      const changed = again(c, c.reference, { losses: { ...c.study.losses, [key]: LOSS_EXAMPLES[key] } });
      return {
        what: `losses.${LOSS_KEYS[key]}`,
        effect: `${percent(LOSS_EXAMPLES[key])} would take ${kwh(energy - changed.energyKwhPerKw)} from ${c.reference.mount.id} and a like share from every mount`,
      };
    });

const driveLines = (c: Counted): NotCounted[] =>
  c.runs
    .filter((run) => isTracker(run.geometry))
    .flatMap((run) => {
      const energy = deliveredBy(c, run).energyKwhPerKw;
      const drive = run.mount.drive ?? { working: null, stuck: null, visits: null, ownUse: null };
      const loss = (change: Partial<typeof drive>) =>
        percent(1 - again(c, run, { drive: { ...drive, ...change } }).energyKwhPerKw / energy);
      const stuck = run.geometry.kind === 'turntable' ? 'equator' : 'flat';
      const lines: NotCounted[] = [];
      if (drive.working === null)
        lines.push({
          what: `mounts.${run.mount.id}.drive.working`,
          effect: `${percent(1 - WORKING_EXAMPLE)} of the year stuck ${stuck === 'flat' ? 'flat' : 'facing the equator'} would cost ${run.mount.id} ${loss({ working: WORKING_EXAMPLE, stuck })} of its energy`,
        });
      if (drive.ownUse === null)
        lines.push({
          what: `mounts.${run.mount.id}.drive.own_use`,
          effect: `${percent(OWN_USE_EXAMPLE)} would cost ${run.mount.id} ${loss({ ownUse: OWN_USE_EXAMPLE })} of its energy`,
        });
      if (drive.visits !== null)
        lines.push({
          what: `mounts.${run.mount.id}.drive.visits`,
          effect: `${Number(drive.visits.toFixed(2))} visits a year are listed, not priced: put what they cost into its upkeep`,
        });
      // A turntable has no flat to go to.
      if (!run.parked && run.geometry.kind !== 'turntable') lines.push(stowLine(c, run));
      return lines;
    });

/** What lying flat in gusty hours would cost: hourly wind times 1.5 against a trigger of 15 m/s, no hold time. */
const stowLine = (c: Counted, run: MountRun): NotCounted => {
  const what = `wind stow of ${run.mount.id}`;
  const wind = c.year.windMs;
  if (run.mount.stow && !wind)
    return { what, effect: 'given, but the weather file has no wind: not counted, which is not zero' };
  if (!wind || !run.flat) return { what, effect: 'the weather file has no wind, so it cannot be estimated' };
  const working = deliver(c.sky, run.views, { ...run.chain, drive: null }).uncappedKwPerKw;
  const flat = deliver(c.sky, run.flat, { ...run.chain, drive: null }).uncappedKwPerKw;
  const ceiling = run.chain.ceilingKwPerKw ?? Number.POSITIVE_INFINITY;
  let [all, lost, hours] = [0, 0, 0];
  for (let h = 0; h < wind.length; h++) {
    const now = Math.min(working[h], ceiling);
    all += now;
    if (wind[h] * GUST_FACTOR <= STOW_GUST_MS) continue;
    hours++;
    lost += now - Math.min(flat[h], ceiling);
  }
  return {
    what,
    effect: `lying flat while hourly wind x ${GUST_FACTOR} passes ${STOW_GUST_MS} m/s (${hours} hours) would cost ${run.mount.id} ${percent(lost / all)}; a hold time costs as much again or more`,
  };
};

const inverterLine = (c: Counted): NotCounted[] => {
  if (c.array.ac_kw !== null) return [];
  const ceilingKw = c.array.dc_kw / DC_PER_AC_EXAMPLE;
  const share = (run: MountRun) => {
    const hours = deliveredBy(c, run).uncappedKwPerKw;
    return (
      1 -
      energyUnderInverter(hours, c.array.dc_kw, ceilingKw) / energyUnderInverter(hours, c.array.dc_kw, null)
    );
  };
  return [
    {
      what: 'array.inverter',
      effect: `its ceiling is not counted, which usually flatters trackers; at ${DC_PER_AC_EXAMPLE} DC per AC it would take ${each(c, share)}`,
    },
  ];
};

const skylineLine = (c: Counted): NotCounted[] => {
  if (c.shade) return [];
  const lowSun = (run: MountRun): number => {
    let [low, all] = [0, 0];
    for (let h = 0; h < c.sky.direct.length; h++) {
      const light = c.sky.direct[h] * run.views.rows.beam[h];
      all += light;
      if (c.sun.cosZenith[h] < LOW_SUN) low += light;
    }
    return all > 0 ? low / all : 0;
  };
  const effect = `no shade of hills, trees or buildings is counted; the share of the beam that comes from a sun lower than 10 degrees is ${each(c, lowSun)}`;
  return [{ what: 'site.skyline', effect }];
};

/** Snow where no mount has it; where some have, the others are named. */
const snowLine = (c: Counted): NotCounted[] => {
  const [blank, given] = [true, false].map((isBlank) =>
    c.runs.filter(({ mount }) => (mount.snow === null) === isBlank).map(({ mount }) => mount.id),
  );
  if (blank.length === 0) return [];
  if (given.length > 0)
    return [
      {
        what: `snow of ${blank.join(', ')}`,
        effect: `counted for ${given.join(', ')} and not here, which flatters ${blank.length === 1 ? 'it' : 'them'}; give snow for all ${c.runs.length} mounts`,
      },
    ];
  const air = c.year.temperatureC;
  if (!air)
    return [{ what: 'snow', effect: 'the weather file has no temperature, so it cannot be estimated' }];
  const energy = deliveredBy(c, c.reference);
  let first = 0;
  let [cold, lost] = [0, 0];
  for (const [m, kwhPerKw] of energy.energyMonthlyKwhPerKw.entries()) {
    const hours = MONTH_HOURS[m];
    let sum = 0;
    for (let h = first; h < first + hours; h++) sum += air[h];
    first += hours;
    if (sum / hours >= 0) continue;
    cold++;
    lost += kwhPerKw * SNOW_EXAMPLE;
  }
  return cold === 0
    ? []
    : [
        {
          what: 'snow',
          effect: `${percent(SNOW_EXAMPLE)} of the ${cold} months with a mean below 0 °C would take ${percent(lost / energy.energyKwhPerKw)} of the year from ${c.reference.mount.id}; steep and moving planes shed it sooner`,
        },
      ];
};
const MONTH_HOURS = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31].map((days) => days * 24);

const moneyLines = (c: Counted): NotCounted[] => {
  const { finance } = c.study;
  const priced = c.runs.filter((run) => run.mount.cost);
  const lines: NotCounted[] = [];
  for (const run of c.runs) {
    const { id, cost } = run.mount;
    if (!cost || (cost.capitalPerKw === null && cost.capital === null))
      lines.push({ what: `mounts.${id}.cost`, effect: `no cost per kWh for ${id}` });
    else if (cost.upkeepPerKw === null && cost.upkeep === null)
      lines.push({ what: `mounts.${id}.cost.upkeep_per_kw`, effect: upkeepEffect(c, run) });
    lines.push(...renewalLine(c, run));
  }
  if (priced.length === 0) return lines;
  if (finance.years === null)
    lines.push({ what: 'finance.years', effect: 'no cost per kWh without a life in years' });
  if (finance.realRate === null)
    lines.push({ what: 'finance.real_rate', effect: 'cost per kWh is shown at 4, 7 and 10 % instead' });
  if (finance.ageing === null && finance.years !== null) {
    const [rate, years] = [finance.realRate ?? 0.07, finance.years];
    const share = presentEnergy(1, 0, rate, years) / presentEnergy(1, AGEING_EXAMPLE, rate, years) - 1;
    lines.push({
      what: 'finance.ageing',
      effect: `${percent(AGEING_EXAMPLE)} a year would raise every cost per kWh by ${percent(share)}`,
    });
  }
  return lines;
};

/** A tracker's drive wears out; a quote without renewals leaves that out. */
const renewalLine = (c: Counted, run: MountRun): NotCounted[] => {
  const { cost, id } = run.mount;
  const { realRate, years, ageing } = c.study.finance;
  if (!cost || cost.renewals.length > 0 || !isTracker(run.geometry)) return [];
  const what = `mounts.${id}.cost.renewals`;
  const { capitalPerKw } = mountCost(cost, c.array.dc_kw);
  if (years === null || capitalPerKw === null || years < RENEWAL_EXAMPLE.year)
    return [{ what, effect: `no renewal of the drive of ${id} is counted` }];
  const rate = realRate ?? 0.07;
  const present = (capitalPerKw * RENEWAL_EXAMPLE.share) / (1 + rate) ** RENEWAL_EXAMPLE.year;
  const energy = presentEnergy(deliveredBy(c, run).energyKwhPerKw, ageing ?? 0, rate, years);
  return [
    {
      what,
      effect: `renewing ${percent(RENEWAL_EXAMPLE.share)} of its capital in year ${RENEWAL_EXAMPLE.year} would add ${(present / energy).toFixed(4)} to the cost per kWh of ${id}`,
    },
  ];
};

const upkeepEffect = ({ study }: Counted, run: MountRun): string => {
  const { years, realRate, currency } = study.finance;
  if (years === null) return 'cost per kWh is from capital and renewals alone';
  const rate = realRate ?? 0.07;
  const perYear = presentEnergy(1, 0, rate, years);
  const energy = presentEnergy(
    run.delivered[study.sky.model].energyKwhPerKw,
    study.finance.ageing ?? 0,
    rate,
    years,
  );
  return `each 10${currency === null ? '' : ` ${currency}`} per kW and year would add ${((10 * perYear) / energy).toFixed(4)} to the cost per kWh of ${run.mount.id}`;
};

const heatLine = ({ year }: Counted): NotCounted[] =>
  year.temperatureC
    ? []
    : [
        {
          what: 'heat',
          effect:
            'the weather file has no temperature; in warm sunny places heat takes 3 to 10 % (common practice, no source)',
        },
      ];

/** What the study leaves blank and trackworth does not count, each with what one plausible value would do. */
export const notCounted = (c: Counted): NotCounted[] => [
  // What moves one mount against another comes first; what takes alike from all comes last.
  ...driveLines(c),
  ...moneyLines(c),
  ...inverterLine(c),
  ...skylineLine(c),
  ...snowLine(c),
  ...heatLine(c),
  ...lossLines(c),
];
