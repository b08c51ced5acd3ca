import type { Comparison, MountResult } from '../../shared/index.ts';
import { isGrade, limitsOf, limitWords } from '../limit-words.ts';
import { md, mdList, mdTable } from '../markdown.ts';
import { formatNumber, formatUpTo, UNKNOWN } from '../numbers.ts';
import { showsWind, windDeferral } from '../wind-words.ts';
import { nameOf } from '../words.ts';
import { section } from './section.ts';

const basis = ({ wind_basis: w }: Comparison): string =>
  w === null
    ? 'The study gives no design gust and exposure, so no wind pressure was worked out: not counted.'
    : `Basis: ${md(w.edition)}; design gust ${formatNumber(w.design_gust_ms, 1)} m/s (3-second gust at 10 m, as entered; not the ` +
      `wind of the weather file); exposure ${w.exposure}; Kzt ${formatUpTo(w.kzt)}, Kd ${formatUpTo(w.kd)}, Ke ${formatUpTo(w.ke)}. ` +
      'Kz is by the height of the highest edge at the steepest working angle.';

const heights = (c: Comparison): string =>
  mdTable(
    ['Mount', 'Highest edge, m', 'Above the roof, m', 'Kz', 'Velocity pressure, Pa', 'Missing in the study'],
    ['left', 'right', 'right', 'right', 'right', 'left'],
    c.mounts.map((m) => [
      md(nameOf(c, m)),
      formatNumber(m.wind.highest_edge_m, 2),
      formatNumber(m.wind.roof_projection_m, 2),
      formatNumber(m.wind.kz, 3),
      formatNumber(m.wind.velocity_pressure_pa),
      m.wind.missing.length > 0 ? md(m.wind.missing.join(', ')) : 'nothing',
    ]),
  );

const inFull = (c: Comparison, m: MountResult, limit: MountResult['limits'][number]): string =>
  `${md(nameOf(c, m))}: ${md(limit.detail ? `${limit.name} ${limit.detail}` : limitWords(limit))}.`;

/** The maker's limits of the ground's slope; nothing where the study gives none. */
const grades = (c: Comparison): string => {
  const items = c.mounts.flatMap((m) => m.limits.filter(isGrade).map((limit) => inFull(c, m, limit)));
  return items.length === 0 ? '' : `The slope of the ground:\n\n${mdList(items)}`;
};

const limits = (c: Comparison): string => {
  const items = c.mounts.flatMap((m) =>
    limitsOf(m, 'most')
      .filter((limit) => !isGrade(limit))
      .map((limit) => inFull(c, m, limit)),
  );
  return items.length > 0 ? mdList(items) : 'The study gives no limit of height or projection: not checked.';
};

/** The screen for wind: heights, pressures and limits, with the sentence that defers to those who answer for it. */
export const wind = (c: Comparison): string =>
  showsWind(c)
    ? section(
        'Wind and height, a screen only',
        `**${md(windDeferral(c))}**`,
        basis(c),
        heights(c),
        limits(c),
        grades(c),
        legend(c),
      )
    : section(
        'Wind and height',
        'Not checked: the study gives no wind, heights or limits of height.',
        grades(c),
      );

const legend = (c: Comparison): string =>
  c.mounts.some(({ wind: w }) =>
    [w.highest_edge_m, w.roof_projection_m, w.kz, w.velocity_pressure_pa].includes(null),
  )
    ? `${UNKNOWN} means not worked out: it does not apply, or its geometry is missing.`
    : '';
