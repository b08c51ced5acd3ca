import { type Comparison, MONTH_DAYS, MONTH_NAMES, type Severity } from '../../shared/index.ts';
import { md, mdTable } from '../markdown.ts';
import { formatNumber, formatPlace, formatSigned } from '../numbers.ts';
import { capitalised } from '../plain-text.ts';
import { SKY_WORDS, yearWords } from '../words.ts';
import { blocks, section } from './section.ts';

const SEVERITY_WORDS: Record<Severity, string> = {
  block: 'blocks the recommendation',
  warning: 'warning',
  note: 'note',
};
const SEVERITIES: readonly Severity[] = ['block', 'warning', 'note'];

const objective = (c: Comparison): string =>
  `${capitalised(c.objective)}. ` +
  (c.ranked_by === c.objective
    ? 'The mounts are ranked by it.'
    : `What it needs is not all given, so the mounts are ranked by: ${c.ranked_by}.`);

const clock = (shiftMin: number | null): string => {
  if (shiftMin === null) return 'The clock of the file cannot be checked against the sun.';
  if (Math.abs(shiftMin) < 0.5) return 'Its clock fits the sun to the minute.';
  return `Its clock fits the sun best with ${formatSigned(shiftMin)} min added to its times.`;
};

/** `+05:45`. */
const offset = (hours: number): string => {
  const minutes = Math.round(Math.abs(hours) * 60);
  const two = (n: number) => String(n).padStart(2, '0');
  return `${hours < 0 ? '-' : '+'}${two(Math.floor(minutes / 60))}:${two(minutes % 60)}`;
};

const site = ({ site: s }: Comparison): string =>
  `Site: ${formatPlace(s.latitude_deg, s.longitude_deg)}, ${formatNumber(s.elevation_m)} m above sea level, ` +
  `standard time UTC${offset(s.utc_offset_h)}. Azimuths are degrees clockwise from true north; tilts are from horizontal.`;

const sums = ({ weather: w }: Comparison): string =>
  blocks(
    `Weather: ${md(w.source)}${w.station ? `, station ${md(w.station)}` : ''}. Format: ${md(w.format)}, one ` +
      `${yearWords(w.format)} of 8 760 hours. ${clock(w.time_shift_min)}`,
    `Light over the year: ${formatNumber(w.ghi_kwh_m2)} kWh/m² global horizontal (GHI), ${formatNumber(w.dni_kwh_m2)} kWh/m² ` +
      `direct normal (DNI), ${formatNumber(w.dhi_kwh_m2)} kWh/m² diffuse horizontal (DHI). ` +
      (w.dropped_night_kwh_m2 > 0
        ? `Light recorded in hours without sun was dropped: ${formatNumber(w.dropped_night_kwh_m2, 2)} kWh/m² over the year.`
        : 'No light was recorded in hours without sun.'),
    mdTable(
      ['GHI', ...MONTH_NAMES],
      ['left', ...MONTH_NAMES.map(() => 'right' as const)],
      [['kWh/m²·day', ...w.ghi_monthly_kwh_m2.map((sum, m) => formatNumber(sum / MONTH_DAYS[m], 2))]],
    ),
  );

const findings = ({ weather }: Comparison): string => {
  if (weather.findings.length === 0) return 'The checks of the weather file found nothing to report.';
  const sorted = SEVERITIES.flatMap((severity) => weather.findings.filter((f) => f.severity === severity));
  return mdTable(
    ['Finding', 'What was found', 'What to do'],
    ['left', 'left', 'left'],
    sorted.map(({ severity, text, fix }) => [
      SEVERITY_WORDS[severity],
      md(text),
      fix ? md(fix) : 'nothing needed',
    ]),
  );
};

const best = ({ best_orientation: b, sky_model }: Comparison): string =>
  `Light on a tilted plane is worked out hour by hour with the ${SKY_WORDS[sky_model]} model. The unshaded fixed plane that ` +
  `collects most faces ${formatNumber(b.azimuth_deg, 1)}° at ${formatNumber(b.tilt_deg, 1)}° tilt and ` +
  `receives ${formatNumber(b.irradiation_kwh_m2)} kWh/m² a year.`;

/** Where, on which weather, and how far the weather can be trusted. */
export const siteAndWeather = (c: Comparison): string =>
  blocks(
    section('Objective', objective(c)),
    section('Site and weather', site(c), sums(c), findings(c), best(c)),
  );
