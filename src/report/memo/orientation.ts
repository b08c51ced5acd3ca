import {
  type Comparison,
  compassWords,
  MONTH_NAMES,
  type MountResult,
  type SkylineResult,
} from '../../shared/index.ts';
import type { ChartFile } from '../extras.ts';
import { limitsOf, limitWords } from '../limit-words.ts';
import { type Align, md, mdList, mdTable } from '../markdown.ts';
import { formatNumber, formatPercent, UNKNOWN } from '../numbers.ts';
import { hasSeveralPoints } from '../survey-words.ts';
import { nameOf } from '../words.ts';
import { figure } from './overview.ts';
import { blocks, section } from './section.ts';

/** `93.5 %`, with what the reading errors allow: `93.5 % (92.1 to 94.7 %)`. */
const factorWords = ({ orientation_factor, orientation_factor_band: band }: MountResult): string => {
  const text = formatPercent(orientation_factor);
  if (orientation_factor === null || band === null) return text;
  return `${text} (${formatNumber(100 * band.low, 1)} to ${formatPercent(band.high)})`;
};

type Column = readonly [head: string, cell: (mount: MountResult) => string];

const factorColumns = (c: Comparison): Column[] => {
  const several = hasSeveralPoints(c);
  const columns: (Column | null)[] = [
    ['TOF', factorWords],
    c.skyline && ['Shading, year', (m) => formatPercent(m.shading_fraction)],
    several
      ? [
          'Shading at the worst point',
          (m) => `${formatPercent(m.shading_worst_point)} at ${md(m.worst_point ?? '') || 'unnamed point'}`,
        ]
      : null,
    ['TSRF', (m) => formatPercent(m.tsrf)],
    several ? ['TSRF at the worst point', (m) => formatPercent(m.tsrf_worst_point)] : null,
  ];
  return columns.filter((column) => column !== null);
};

const factorTable = (c: Comparison): string => {
  const columns = factorColumns(c);
  return mdTable(
    ['Mount', ...columns.map(([head]) => head)],
    ['left', ...columns.map((): Align => 'right')],
    c.mounts.map((m) => [md(nameOf(c, m)), ...columns.map(([, cell]) => cell(m))]),
  );
};

const howToRead = (c: Comparison): string =>
  'The orientation factor (TOF) is the light on the unshaded plane over that on the best fixed plane of the site; in brackets what ' +
  'the reading errors allow. ' +
  (c.skyline === null
    ? 'The study gives no skyline: the horizon is taken as open, so TSRF equals TOF, and the shade of hills, trees and buildings is ' +
      'not counted.'
    : 'Shading is the share of the light on the front over the year that the skyline takes: of the sun, of the bright ring round it ' +
      'and of the sky. TSRF is TOF times what the shading leaves.' +
      (hasSeveralPoints(c)
        ? ' Where no point is named, shading is the mean over the points of the array; the worst point is the one where the mount loses most.'
        : '')) +
  (c.mounts.some((m) => m.orientation_factor === null)
    ? ` ${UNKNOWN}: a tracker has no one orientation, so neither factor applies to it.`
    : '');

/** What a programme asks at least. */
const programme = (c: Comparison): string => {
  const items = c.mounts.flatMap((m) =>
    limitsOf(m, 'least').map((limit) =>
      md(`${nameOf(c, m)}: ${limitWords(limit)}${limit.detail ? `: ${limit.detail}` : ''}.`),
    ),
  );
  return items.length === 0
    ? ''
    : blocks(
        `What the programme asks${hasSeveralPoints(c) ? ', its TSRF held against the worst point of the array' : ''}:`,
        mdList(items),
      );
};

const pointTable = ({ profiles, worst_point }: SkylineResult): string =>
  mdTable(
    ['Skyline seen from', 'Highest', 'Toward', 'Takes of an even sky'],
    ['left', 'right', 'left', 'right'],
    profiles.map((p) => {
      const highest = p.elevations_deg.indexOf(Math.max(...p.elevations_deg));
      const azimuth = p.azimuths_deg[highest];
      const worst = profiles.length > 1 && p.name === worst_point ? ' (least sky)' : '';
      return [
        (md(p.name) || 'unnamed point') + worst,
        `${formatNumber(p.elevations_deg[highest], 1)}°`,
        `${formatNumber(azimuth, 1)}° (${compassWords(azimuth)})`,
        formatPercent(p.sky_blocked),
      ];
    }),
  );

const monthTable = (c: Comparison): string =>
  mdTable(
    ['Shading', ...c.mounts.map((m) => md(nameOf(c, m)))],
    ['left', ...c.mounts.map((): Align => 'right')],
    MONTH_NAMES.map((month, i) => [
      month,
      ...c.mounts.map((m) =>
        m.shading_monthly[i] === null ? 'no light' : formatPercent(m.shading_monthly[i]),
      ),
    ]),
  );

/** How each mount is turned to the light and what the skyline takes; nothing for trackers under an open horizon. */
export const orientationAndShading = (c: Comparison, charts: readonly ChartFile[]): string => {
  if (c.skyline === null && c.mounts.every((m) => m.orientation_factor === null)) return '';
  return section(
    'Orientation and shading',
    howToRead(c),
    factorTable(c),
    programme(c),
    ...(c.skyline === null
      ? []
      : [pointTable(c.skyline), ...charts.map(figure), 'Shading month by month:', monthTable(c)]),
  );
};
