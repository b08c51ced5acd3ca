import { type Finding, type HourLabel, MONTH_NAMES, type Severity } from '../shared/index.ts';
import { placeWords } from './figures.ts';
import { INDENT, named, printable } from './plain.ts';
import type { WeatherFacts } from './weather-facts.ts';

const LABEL_WORDS: Record<HourLabel, string> = {
  end: 'Times mark the end of each hour.',
  start: 'Times mark the start of each hour.',
  middle: 'Times mark the middle of each hour.',
};
const SEVERITY_WORDS: Record<Severity, string> = { block: 'BLOCKS', warning: 'Warning', note: 'Note' };

const whole = (x: number): string => x.toFixed(0).replace(/\B(?=(\d{3})+$)/g, ' ');
const place = ({ site: s }: WeatherFacts): string =>
  `${placeWords(s.latitude_deg, s.longitude_deg)}, ${whole(s.elevation_m)} m above sea ` +
  `level, standard time UTC${s.utc_offset_h < 0 ? '' : '+'}${s.utc_offset_h} h`;

/** One line that says how far to trust the year. */
const verdict = (findings: readonly Finding[]): string => {
  const count = (severity: Severity) => findings.filter((f) => f.severity === severity).length;
  const [blocks, warnings] = [count('block'), count('warning')];
  if (blocks > 0) return 'DO NOT rest a choice of mount on this year before what blocks below is settled.';
  if (warnings > 0) return `Use with care: ${warnings === 1 ? 'one warning' : `${warnings} warnings`} below.`;
  return 'Nothing found that speaks against this year.';
};

const row = (name: string, months: readonly number[], year: number): string =>
  name.padEnd(INDENT) + months.map((x) => x.toFixed(0).padStart(6)).join('') + whole(year).padStart(8);

const sums = (f: WeatherFacts): string[] => [
  'kWh/m²'.padEnd(INDENT) + MONTH_NAMES.map((name) => name.padStart(6)).join('') + 'Year'.padStart(8),
  row('  GHI global', f.ghi_monthly_kwh_m2, f.ghi_kwh_m2),
  row('  DNI direct', f.dni_monthly_kwh_m2, f.dni_kwh_m2),
  row('  DHI diffuse', f.dhi_monthly_kwh_m2, f.dhi_kwh_m2),
];

const components = ({ components: c }: WeatherFacts): string => {
  if (c.split_from_global)
    return 'only global light is in the file; direct and diffuse were split from it (Erbs 1982), which widens the doubt';
  const derived = (['ghi', 'dni', 'dhi'] as const).filter((key) => c[key] !== 'given');
  return derived.length === 0
    ? 'GHI, DNI and DHI are all in the file'
    : `${derived.map((key) => key.toUpperCase()).join(' and ')} worked out from the other components`;
};

const air = ({ temperature_c: t, wind_10m_ms: w }: WeatherFacts): string => {
  const temperature = t
    ? `${t.least.toFixed(1)} to ${t.most.toFixed(1)} °C, mean ${t.mean.toFixed(1)}`
    : 'no temperature';
  const wind = w
    ? `wind at 10 m mean ${w.mean.toFixed(1)}, largest hour ${w.most.toFixed(1)} m/s`
    : 'no wind';
  return `${temperature}; ${wind}`;
};

/**
 * What a weather file holds, how far to trust it and why: at most 100 columns.
 * @param next what to do with it
 */
export const weatherScreen = (f: WeatherFacts, next: string): string => {
  const lines = [
    `${printable(f.source)}   ${f.format}${f.station ? `   ${printable(f.station)}` : ''}`,
    `${place(f)}. ${LABEL_WORDS[f.label]}`,
    '',
    verdict(f.findings),
    '',
    ...sums(f),
    '',
    named('Components', components(f)),
    named('Air', air(f)),
    ...(f.findings.length > 0 ? [''] : []),
    ...f.findings.map(({ severity, text, fix }) =>
      named(SEVERITY_WORDS[severity], printable(fix ? `${text} ${fix}` : text)),
    ),
    '',
    named('Next', next),
  ];
  return `${lines.join('\n')}\n`;
};
