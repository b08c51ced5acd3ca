import { type Finding, HOURS, type HourlyYear, monthlySums, yearlySum } from '../shared/index.ts';
import { estimateClock } from './clock.ts';
import { clockFindings } from './clock-findings.ts';
import { type Closure, closureOf } from './closure.ts';
import { breaches } from './limits.ts';
import { thousands } from './numbers.ts';
import { placeFindings } from './place-findings.ts';
import type { SunHours } from './sun-hours.ts';

/** How far to trust a year. */
export interface WeatherFindings {
  /** Minutes to add to the file's times so that the year fits the sun; null where it cannot be told. */
  readonly timeShiftMin: number | null;
  /** Whether the clock could be judged; `timeShiftMin` is null where not. */
  readonly sure: boolean;
  /** Global light recorded in hours without sun, kWh/m2; the study drops it. */
  readonly droppedNightKwhM2: number;
  readonly annual: { readonly ghiKwhM2: number; readonly dniKwhM2: number; readonly dhiKwhM2: number };
  readonly ghiMonthlyKwhM2: readonly number[];
  readonly closure: Closure | null;
  readonly findings: readonly Finding[];
}

/**
 * More hours than this share of daylight beyond what is possible are a warning; public typical years have up to 0.017.
 * All limits here are trackworth's choice.
 */
const BREACH_SHARE = 0.03;
/** So many measured hours of more light than the sun sends may be glitches; public typical years have none. */
const BEYOND_SUN_HOURS = 5;
const NIGHT_SHARE = 0.002;
/** Public typical years close to 15 W/m2 rms or better. */
const CLOSURE_LIMIT = { biasWm2: 10, rmsWm2: 30 };
/** Yearly share of the sunlight outside the air that reaches the ground: cloudiest basins 0.28, high deserts 0.75. */
const CLEARNESS = { low: 0.22, high: 0.8 };

/**
 * Everything that trackworth notices about a year: what the reader did, impossible values, light at night, closure,
 * sums, clock and place. Severity `block` withholds the recommendation.
 *
 * @param sunAt the sun over the same hours, all beginning so many minutes later than their index says
 * @param addedMin minutes that the study has already added to the file's times (they are in `year.offsetMin`)
 */
export const weatherFindings = (
  year: HourlyYear,
  sunAt: (offsetMin: number) => SunHours,
  addedMin = 0,
): WeatherFindings => {
  const sun = sunAt(year.offsetMin);
  const clock = estimateClock(year, (offset) => (offset === year.offsetMin ? sun : sunAt(offset)));
  const kwh = (column: Float64Array): number => yearlySum(column) / 1000;
  const annual = { ghiKwhM2: kwh(year.ghi), dniKwhM2: kwh(year.dni), dhiKwhM2: kwh(year.dhi) };
  const night = nightLight(year, sun);
  const closure = closureOf(year, sun);
  const findings: Finding[] = [
    ...clockFindings(clock, year, addedMin),
    ...placeFindings(year),
    ...sumFindings(annual, sun),
    ...closureFindings(closure),
    ...limitFindings(year, sun),
    ...nightFindings(night, annual.ghiKwhM2),
    readFinding(year, addedMin),
    ...year.notes,
  ];
  return {
    timeShiftMin: clock.timeShiftMin,
    sure: clock.timeShiftMin !== null,
    droppedNightKwhM2: night.kwhM2,
    annual,
    ghiMonthlyKwhM2: monthlySums(year.ghi).map((wh) => wh / 1000),
    closure,
    findings: bySeverity(findings),
  };
};

const ORDER: readonly Finding['severity'][] = ['block', 'warning', 'note'];
const bySeverity = (findings: readonly Finding[]): Finding[] =>
  ORDER.flatMap((severity) => findings.filter((f) => f.severity === severity));

const nightLight = (year: HourlyYear, sun: SunHours): { hours: number; kwhM2: number } => {
  let [hours, wh] = [0, 0];
  for (let h = 0; h < HOURS; h++) {
    if (sun.sunlit[h] > 0 || year.ghi[h] <= 0) continue;
    hours++;
    wh += year.ghi[h];
  }
  return { hours, kwhM2: wh / 1000 };
};

const nightFindings = ({ hours, kwhM2 }: { hours: number; kwhM2: number }, ghiKwhM2: number): Finding[] =>
  hours === 0
    ? []
    : [
        {
          code: 'light-at-night',
          severity: kwhM2 > NIGHT_SHARE * ghiKwhM2 ? 'warning' : 'note',
          text: `${hours === 1 ? '1 hour without sun holds' : `${hours} hours without sun hold`} light, ${kwhM2.toFixed(3)} kWh/m2 in all, which is dropped.`,
          fix: '',
        },
      ];

const limitFindings = (year: HourlyYear, sun: SunHours): Finding[] => {
  const daylight = sun.sunlit.reduce((n, share) => n + (share > 0 ? 1 : 0), 0);
  return breaches(year, sun).map(({ code, hours, what, beyondSun }) => {
    const grave = hours > (beyondSun ? BEYOND_SUN_HOURS : BREACH_SHARE * daylight);
    return {
      code,
      severity: grave ? 'warning' : 'note',
      text: `${hours} of ${daylight} hours of daylight have ${what}.`,
      fix: grave ? 'Check units, columns and clock; the values are used as they are.' : '',
    };
  });
};

const closureFindings = (closure: Closure | null): Finding[] => {
  if (!closure) return [];
  const { biasWm2, rmsWm2, hours } = closure;
  const off = Math.abs(biasWm2) > CLOSURE_LIMIT.biasWm2 || rmsWm2 > CLOSURE_LIMIT.rmsWm2;
  const tenths = Math.round(biasWm2 * 10) + 0; // no -0
  const bias = `${tenths > 0 ? '+' : ''}${(tenths / 10).toFixed(1)}`;
  return [
    {
      code: 'closure',
      severity: off ? 'warning' : 'note',
      text: `GHI less DNI cos z + DHI: bias ${bias} W/m2, rms ${rmsWm2.toFixed(1)} W/m2 over ${hours} hours of daylight.`,
      fix: off ? 'The three components disagree: check columns, units and clock.' : '',
    },
  ];
};

const sumFindings = (annual: WeatherFindings['annual'], sun: SunHours): Finding[] => {
  let outside = 0;
  for (let h = 0; h < HOURS; h++) outside += sun.extraterrestrialWm2[h] * sun.cosZenith[h] * sun.sunlit[h];
  const clearness = annual.ghiKwhM2 / (outside / 1000);
  const [ghi, dni, dhi] = [annual.ghiKwhM2, annual.dniKwhM2, annual.dhiKwhM2].map((v) => v.toFixed(0));
  const sums: Finding = {
    code: 'sums',
    severity: 'note',
    text: `The year sums to GHI ${ghi}, DNI ${dni}, DHI ${dhi} kWh/m2; ${(clearness * 100).toFixed(0)} % of the sunlight outside the air reaches the ground.`,
    fix: '',
  };
  if (clearness >= CLEARNESS.low && clearness <= CLEARNESS.high) return [sums];
  return [
    {
      code: 'implausible-sum',
      severity: 'warning',
      text: `${sums.text} No place on earth has so ${clearness > CLEARNESS.high ? 'much' : 'little'}.`,
      fix: 'Check the units and columns of irradiance, and the latitude.',
    },
  ];
};

const readFinding = (year: HourlyYear, addedMin: number): Finding => ({
  code: 'year-read',
  severity: 'note',
  text: `${thousands(HOURS)} hours in ${year.format} format${year.station ? `, ${year.station}` : ''}; printed times stand for the ${year.label} of the hour${beginningInWords(year.offsetMin - addedMin, addedMin)}.`,
  fix: '',
});

/** Whole hours of the file's own offset follow from the label and need no words; what the study adds does. */
const beginningInWords = (filedMin: number, addedMin: number): string => {
  const pastMin = ((filedMin % 60) + 60) % 60;
  const past = pastMin === 0 ? '' : `, hours begin ${pastMin} minutes past the full hour`;
  if (addedMin === 0) return past;
  const count = `${Math.abs(addedMin)} ${Math.abs(addedMin) === 1 ? 'minute' : 'minutes'}`;
  return `${past}; as the study has it, hours begin ${count} ${addedMin > 0 ? 'later' : 'earlier'} than printed`;
};
