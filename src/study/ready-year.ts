import type { Study } from '../inputs/index.ts';
import type { Finding, HourlyYear } from '../shared/index.ts';
import { splitGlobal } from '../sky/index.ts';
import { type SunHours, sunOverHours } from '../sun/index.ts';
import { fillByClosure, type RawYear, type WeatherFindings, weatherFindings } from '../weather/index.ts';

/** A year ready for the sky models, its sun, and what was found about it. */
export interface ReadyYear {
  readonly year: HourlyYear;
  readonly sun: SunHours;
  readonly found: WeatherFindings;
  /** True where beam and diffuse were split from global light. */
  readonly globalOnly: boolean;
}

/** What `accept_clock` stands by: the file's times as they are, at the place as it is. */
const ABOUT_CLOCK = ['clock-shift', 'day-too-long'];

/** The user has looked at the clock and stands by the file: the finding stays, but no longer blocks. */
const withClockAccepted = (findings: readonly Finding[]): Finding[] =>
  findings.map((f) =>
    ABOUT_CLOCK.includes(f.code) && f.severity === 'block'
      ? {
          ...f,
          severity: 'warning',
          text: `${f.text} The study accepts the clock as it is.`,
          fix: "Take weather.accept_clock out of the study unless the file's times were checked elsewhere.",
        }
      : f,
  );

/** Applies the study's clock, fills and splits what the file lacks, and looks for trouble. */
export const readyYear = (
  raw: RawYear,
  weather: Pick<Study['weather'], 'addMinutes' | 'acceptClock'>,
): ReadyYear => {
  const offsetMin = raw.offsetMin + weather.addMinutes;
  const sun = sunOverHours(raw.place, raw.calendarYear, offsetMin);
  // Trial shifts of the clock need no more than two positions an hour.
  const sunAt = (trialMin: number) =>
    trialMin === offsetMin ? sun : sunOverHours(raw.place, raw.calendarYear, trialMin, 2);
  const filled: HourlyYear = { ...fillByClosure(raw, sun), offsetMin };
  const globalOnly = filled.origin.dni === 'missing' && filled.origin.dhi === 'missing';
  const year: HourlyYear = globalOnly
    ? {
        ...filled,
        ...splitGlobal(filled.ghi, sun),
        origin: { ...filled.origin, dni: 'derived', dhi: 'derived' },
      }
    : filled;
  const found = weatherFindings(year, sunAt, weather.addMinutes);
  const findings = weather.acceptClock ? withClockAccepted(found.findings) : found.findings;
  return { year, sun, found: { ...found, findings }, globalOnly };
};
