import type { Finding, HourlyYear } from '../shared/index.ts';
import { BLOCKING_SHIFT_MIN, type Clock, FAR_MIN } from './clock.ts';
import { EXCESS_SHARE } from './clock-estimates.ts';
import { labelThatShifts } from './labels.ts';

/** Clocks are off by whole or half hours as a rule: within so many minutes of one, that one is meant. */
const ROUND_TO_MIN = 30;
const ROUND_WITHIN_MIN = 10;
/** The centre of the day may lie so far from noon before it is worth a note. */
const LEAN_MIN = 10;

/** The shift to write into the study: the half hour that the estimate lies close to, else the estimate. */
export const likelyShiftMin = (estimateMin: number): number => {
  const round = Math.round(estimateMin / ROUND_TO_MIN) * ROUND_TO_MIN;
  return Math.abs(estimateMin - round) <= ROUND_WITHIN_MIN ? round : estimateMin;
};

const minutes = (n: number): string => {
  const whole = Math.abs(Math.round(n));
  return `${whole} ${whole === 1 ? 'minute' : 'minutes'}`;
};
const lateOrEarly = (shiftMin: number): string => (shiftMin > 0 ? 'behind' : 'ahead of');
const percent = (share: number): string => `${(share * 100).toFixed(1)} %`;

/** What the clock's evidence comes to: a blocking shift, a fit, or that it cannot be told. */
export const clockFindings = (clock: Clock, year: HourlyYear, addedMin: number): Finding[] => {
  const { asFiled, seasonsApartMin, lightAheadMin, timeShiftMin } = clock;
  const main = seasonsApartMin === null ? mainFinding(clock, year, addedMin) : seasonFinding(seasonsApartMin);
  const findings = [main];
  if (timeShiftMin === null && seasonsApartMin === null && lightAtBothEnds(clock))
    findings.push({
      code: 'day-too-long',
      severity: 'block',
      text: `Light comes before sunrise and stays after sunset (${percent(asFiled.morning + asFiled.evening)} of the year's light is more than a clear sky gives at that hour), and no other clock mends both: the year does not belong to this place.`,
      fix: `Check the place, ${placeInWords(year)}, and correct it in the study: site: { latitude: ..., longitude: ..., utc_offset: ... } (north and east are positive); or write weather: { accept_clock: true } to stand by the file as it is.`,
    });
  const lean = lightAheadMin - (timeShiftMin ?? 0);
  if (Math.abs(lean) >= LEAN_MIN)
    findings.push({
      code: 'day-leans',
      severity: 'note',
      text: `The year's light is centred ${minutes(lean)} ${lean > 0 ? 'before' : 'after'} solar noon${timeShiftMin ? ', that shift allowed for' : ''}: ${lean > 0 ? 'clearer mornings' : 'clearer afternoons'}, which weather alone can do.`,
      fix: '',
    });
  if (year.origin.dni !== 'given' || year.origin.dhi !== 'given' || year.origin.ghi !== 'given')
    findings.push({
      code: 'clock-by-edges',
      severity: 'note',
      text: 'The clock was judged by the first and last light of the days alone, since not all three components are given.',
      fix: '',
    });
  return findings;
};

const lightAtBothEnds = ({ asFiled }: Clock): boolean =>
  Math.min(asFiled.morning, asFiled.evening) > EXCESS_SHARE;

const placeInWords = ({ place }: HourlyYear): string =>
  `latitude ${place.latitudeDeg.toFixed(2)}, longitude ${place.longitudeDeg.toFixed(2)}, UTC${place.utcOffsetH < 0 ? '' : '+'}${place.utcOffsetH}`;

const mainFinding = (clock: Clock, year: HourlyYear, addedMin: number): Finding => {
  const { timeShiftMin } = clock;
  if (timeShiftMin === null)
    return {
      code: 'clock-unknown',
      severity: 'warning',
      text: 'Whether the clock of the file fits the sun cannot be told from its light.',
      fix: 'Check the time zone and what the time labels stand for (weather.label).',
    };
  if (Math.abs(timeShiftMin) < BLOCKING_SHIFT_MIN)
    return {
      code: 'clock-fits',
      severity: 'note',
      text: `${addedMin === 0 ? 'The' : `With the ${minutes(addedMin)} that the study ${addedMin > 0 ? 'adds' : 'takes off'} the`} clock fits the sun ${timeShiftMin === 0 ? 'to the minute' : `within ${minutes(timeShiftMin)}`}.`,
      fix: '',
    };
  const likely = likelyShiftMin(timeShiftMin);
  const total = addedMin + likely;
  const placeFirst = Math.abs(timeShiftMin) > FAR_MIN ? 'Check longitude and offset from UTC first. ' : '';
  return {
    code: 'clock-shift',
    severity: 'block',
    text: `The file's clock is about ${minutes(timeShiftMin)} ${lateOrEarly(timeShiftMin)} the sun, which flatters trackers: ${evidence(clock, timeShiftMin).join('; ')}.`,
    fix: `${placeFirst}Write weather: { add_minutes: ${total} } in the study${otherLabel(year, likely, addedMin)}, or weather: { accept_clock: true } to stand by the file's times.`,
  };
};

/**
 * Where another label would move the hours as much, that may be the cause. The formats with a manual say themselves what
 * their times stand for: only a table's label, or one that the study has set against the manual, is open to doubt.
 */
const otherLabel = (year: HourlyYear, shiftMin: number, addedMin: number): string => {
  const open = year.format === 'table' || year.label !== 'end';
  const label = open && addedMin === 0 ? labelThatShifts(year.label, shiftMin) : null;
  return label === null
    ? ''
    : ` (or weather: { label: ${label} }, if the printed times mark the ${label} of the hour)`;
};

const evidence = (clock: Clock, shiftMin: number): string[] => {
  const { asFiled, shifted, closure, edges } = clock;
  const seen: string[] = [];
  if (closure?.sure && shifted)
    seen.push(
      `GHI = DNI cos z + DHI fails by ${Math.sqrt(asFiled.closure).toFixed(0)} W/m2 rms as the file stands and by ${Math.sqrt(shifted.closure).toFixed(0)} with the shift`,
    );
  if (edges?.sure && Math.abs(edges.shiftMin) >= BLOCKING_SHIFT_MIN) {
    const [share, when] =
      shiftMin > 0
        ? [asFiled.morning, 'before sunrise or too strong just after it']
        : [asFiled.evening, 'after sunset or too strong just before it'];
    seen.push(`${percent(share)} of the year's light comes ${when}`);
  }
  return seen;
};

const seasonFinding = (apartMin: number): Finding => ({
  code: 'clock-shift',
  severity: 'block',
  text: `The clock of May to August is ${minutes(apartMin)} ${lateOrEarly(apartMin)} that of November to February, as daylight saving time makes it.`,
  fix: "Write the file's times in standard time all year, or weather: { accept_clock: true } to stand by them.",
});
