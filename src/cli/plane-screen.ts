import { MONTH_NAMES, type Severity } from '../shared/index.ts';
import { trimmed } from './figures.ts';
import { mindWords } from './mind.ts';
import { INDENT, named, printable } from './plain.ts';
import type { PlaneReport } from './plane-facts.ts';

const percent = (share: number): string => `${(100 * share).toFixed(1)} %`;

const plusMinus = (errorDeg: number | null): string =>
  errorDeg === null ? '' : `, give or take ${trimmed(errorDeg, 1)}`;

/** A name once, and the lines that belong to it. */
const group = (name: string, lines: readonly string[]): string[] =>
  lines.map((line, i) => named(i === 0 ? name : '', line));

/** How the azimuth follows from the readings; the slope's own step is on the line of the tilt. */
const azimuth = (p: PlaneReport): string[] => {
  const steps = p.survey_steps.filter((step) => !step.startsWith(p.slope));
  const lines = steps.length > 0 ? steps : [`${trimmed(p.azimuth_deg)} true, faces ${p.faces}`];
  return lines.with(-1, `${lines.at(-1)}${plusMinus(p.azimuth_error_deg)}`);
};

const tof = ({ orientation_factor: factor, orientation_factor_band: band }: PlaneReport): string =>
  `${percent(factor)} of the light on the best plane of the site, unshaded${
    band ? `; ${percent(band.low)} to ${percent(band.high)} within the reading errors` : ''
  }`;

const shading = (p: PlaneReport): string => {
  if (p.skyline_points === 0) return 'no skyline given: counted as open all round';
  const all = p.skyline_points > 1 ? `, over ${p.skyline_points} points of the array` : '';
  const worst = p.worst_point
    ? `; ${percent(p.shading_worst_point)} at its worst point, ${printable(p.worst_point)}`
    : '';
  return `${percent(p.shading_fraction)} of the year's light is lost to the skyline${all}${worst}`;
};

const tsrf = (p: PlaneReport): string =>
  `${percent(p.tsrf)} = TOF x (1 - shading)${
    p.worst_point ? `; ${percent(p.tsrf_worst_point)} at the worst point, ${printable(p.worst_point)}` : ''
  }`;

const hours = ({ peak_sun_hours_per_day: { year }, worst_month: worst }: PlaneReport): string =>
  `${year.toFixed(2)} a day over the year, ${worst.peak_sun_hours_per_day.toFixed(2)} in ${worst.month} (kWh/m² a day, past the skyline)`;

const months = ({ peak_sun_hours_per_day: { months: values } }: PlaneReport): string[] => [
  ' '.repeat(INDENT) + MONTH_NAMES.map((name) => name.padStart(6)).join(''),
  ' '.repeat(INDENT) + values.map((value) => value.toFixed(2).padStart(6)).join(''),
];

/** Shows at a glance whether a slip with the declination matters here. */
const mistakes = (p: PlaneReport): string[] =>
  p.declination_forgotten === null || p.declination_reversed === null
    ? []
    : [
        named(
          'If it were',
          `forgotten, TOF would read ${percent(p.declination_forgotten)}; applied the wrong way, ${percent(p.declination_reversed)}; as it is, ${percent(p.orientation_factor)}`,
        ),
      ];

const LIMIT_WORDS = {
  kept: 'kept',
  broken: 'BROKEN',
  within_reading_error: 'within the reading error',
  not_checked: 'not checked',
} as const;

/** How one plane is turned to the light: at most 100 columns. */
export const planeScreen = (p: PlaneReport): string => {
  const found = (severity: Severity, name: string) =>
    p.findings
      .filter((finding) => finding.severity === severity)
      .map(({ text, fix }) => named(name, printable(fix ? `${text} ${fix}` : text)));
  const blocks = found('block', 'BLOCKS');
  const lines = [
    `${p.slope}, faces ${p.faces} (${trimmed(p.azimuth_deg, 1)} degrees true)   typical year ${printable(p.weather)}`,
    '',
    // Nothing below holds before this is settled.
    ...(blocks.length > 0 ? [...blocks, ''] : []),
    named('TOF', tof(p)),
    named('Shading', shading(p)),
    named('TSRF', tsrf(p)),
    named('Peak sun hours', hours(p)),
    ...months(p),
    named(
      'Best plane here',
      `tilt ${trimmed(p.best_orientation.tilt_deg, 1)}, azimuth ${trimmed(p.best_orientation.azimuth_deg, 1)} degrees`,
    ),
    ...p.limits.map(({ name, status, detail }) =>
      named('Limit', `${name} ${LIMIT_WORDS[status]}: ${detail}`),
    ),
    '',
    ...group('Read', p.readings.map(printable)),
    named('Tilt', `${p.slope}${plusMinus(p.tilt_error_deg)}`),
    ...group('Azimuth', azimuth(p)),
    ...group('Declination', p.declinations),
    ...mistakes(p),
    ...found('warning', 'Warning'),
    ...(p.cautions.length > 0 ? [named('Mind', mindWords(p.cautions))] : []),
  ];
  return `${lines.join('\n')}\n`;
};
