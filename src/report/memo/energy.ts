import {
  type Comparison,
  darkMonthsWords,
  groupedStages,
  MONTH_DAYS,
  MONTH_NAMES,
  type MountResult,
  monthInFull,
} from '../../shared/index.ts';
import { downtimeSentences } from '../downtime-words.ts';
import { md, mdList, mdTable } from '../markdown.ts';
import { formatDaily, formatGain, formatNumber, formatPercent, UNKNOWN } from '../numbers.ts';
import { capitalised } from '../plain-text.ts';
import { snowSentences } from '../snow-words.ts';
import { stowMonths, stowSentences } from '../stow-words.ts';
import { mountById, nameOf } from '../words.ts';
import { blocks, section } from './section.ts';

/**
 * All stage names in the order of the chain, where mounts do not share every stage: a stage that only some have
 * stands after the stage that it follows there.
 */
export const stageOrder = (mounts: readonly MountResult[]): string[] => {
  const order: string[] = [];
  for (const { stages } of mounts) {
    let after = -1;
    for (const { name } of stages) {
      const known = order.indexOf(name);
      if (known < 0) order.splice(++after, 0, name);
      else after = known;
    }
  }
  return order;
};

const stageTable = (c: Comparison): string => {
  const share = (mount: MountResult, name: string): string => {
    const stage = mount.stages.find((s) => s.name === name);
    if (!stage) return UNKNOWN;
    const text = formatPercent(stage.efficiency, 2);
    return name === mount.weakest_stage ? `**${text}**` : text;
  };
  const together = (mount: MountResult, names: readonly string[]): string => {
    const own = mount.stages.filter((s) => names.includes(s.name));
    return own.length === 0
      ? UNKNOWN
      : `*${formatPercent(
          own.reduce((whole, s) => whole * s.efficiency, 1),
          2,
        )}*`;
  };
  const row = (name: string, cell: (mount: MountResult) => string) => [name, ...c.mounts.map(cell)];
  const product = (m: MountResult) => m.stages.reduce((whole, { efficiency }) => whole * efficiency, 1);
  return mdTable(
    ['Share kept', ...c.mounts.map((m) => md(nameOf(c, m)))],
    ['left', ...c.mounts.map(() => 'right' as const)],
    [
      row('Light on the plane, kWh/m²', (m) => formatNumber(m.irradiation_kwh_m2, 1)),
      ...groupedStages(stageOrder(c.mounts)).flatMap(({ head, stages }) => [
        row(`*${capitalised(head)}, together*`, (m) => together(m, stages)),
        ...stages.map((name) => row(md(name), (m) => share(m, name))),
      ]),
      row('All stages', (m) => formatPercent(product(m), 2)),
      row('Delivered, kWh/kW', (m) => formatNumber(m.energy_kwh_per_kw, 1)),
      row('Whole array, kWh', (m) => formatNumber(m.energy_kwh)),
      row('Weakest stage', (m) => md(m.weakest_stage)),
    ],
  );
};

const monthTable = (c: Comparison): string => {
  const rows = MONTH_NAMES.map((month, m) => {
    const plane = c.tilted_for_month.find((entry) => entry.month === month);
    return [
      month,
      plane ? `${formatDaily(plane.kwh_per_kw_day)} at ${formatNumber(plane.tilt_deg)}°` : UNKNOWN,
      ...c.mounts.map((mount) => {
        const daily = mount.energy_monthly_kwh_per_kw[m] / MONTH_DAYS[m];
        const against =
          plane && plane.kwh_per_kw_day > 0 ? ` (${formatGain(daily / plane.kwh_per_kw_day - 1, 0)})` : '';
        return formatDaily(daily) + against;
      }),
    ];
  });
  return mdTable(
    ['kWh/kW·day', 'Plane tilted for the month, and its tilt', ...c.mounts.map((m) => md(nameOf(c, m)))],
    ['left', ...[0, ...c.mounts].map(() => 'right' as const)],
    rows,
  );
};

/** The question of every off-grid owner: what does each mount do in its worst month? */
const worstMonths = (c: Comparison): string => {
  const dark = darkMonthsWords(c);
  return mdList([
    ...(dark === null ? [] : [`${capitalised(dark)}.`]),
    ...c.mounts.flatMap((mount) => {
      const { month, kwh_per_kw_day: daily } = mount.worst_month;
      const plane = c.tilted_for_month.find((entry) => entry.month === month);
      if (!plane || !(plane.kwh_per_kw_day > 0)) return [];
      const ratio = daily / plane.kwh_per_kw_day - 1;
      const against =
        Math.abs(ratio) < 0.0005
          ? 'the same as'
          : `${formatPercent(Math.abs(ratio))} ${ratio < 0 ? 'less' : 'more'} than`;
      return [
        `${md(nameOf(c, mount))} delivers least in ${monthInFull(month)}: ${formatDaily(daily)} kWh/kW·day, ${against} ` +
          `a fixed plane tilted for ${monthInFull(month)} (${formatDaily(plane.kwh_per_kw_day)} kWh/kW·day).`,
      ];
    }),
  ]);
};

/** Where the share of each stage comes from; mounts may differ. */
const stageSources = (c: Comparison): string =>
  mdTable(
    ['Stage', 'How it is worked out'],
    ['left', 'left'],
    stageOrder(c.mounts).map((name) => {
      const sources = c.mounts.flatMap((m) => m.stages.filter((s) => s.name === name).map((s) => s.source));
      return [md(name), [...new Set(sources)].map(md).join('; ')];
    }),
  );

const snow = (c: Comparison): string => {
  const sentences = snowSentences(c);
  return sentences.length === 0 ? '' : blocks('### Snow', mdList(sentences.map(md)));
};

const stow = (c: Comparison): string => {
  const { names, rows } = stowMonths(c);
  if (names.length === 0) return '';
  const table = mdTable(
    ['Taken by stow, kWh/kW', ...names.map(md)],
    ['left', ...names.map(() => 'right' as const)],
    rows,
  );
  return blocks('### Wind stow', mdList(stowSentences(c).map(md)), table);
};

const downtime = (c: Comparison): string => {
  const sentences = downtimeSentences(c);
  return sentences.length === 0 ? '' : blocks('### Downtime', mdList(sentences.map(md)));
};

/** Losses stage by stage, and each month against a fixed plane tilted for it. */
export const energy = (c: Comparison): string =>
  section(
    'Energy and losses',
    'The light on the plane times the share that each stage keeps is the energy delivered in the first year. The table is rounded; ' +
      `results.json holds the stages to ten digits. The weakest stage, which keeps the smallest share, is in bold; what a group of stages keeps together is in italics. ${UNKNOWN} means that the stage does not apply to the ` +
      'mount or is not counted.',
    stageTable(c),
    stageSources(c),
    snow(c),
    stow(c),
    downtime(c),
    '### Month by month',
    'Each mount against the fixed plane that would yield most in that month, on the rows and losses of ' +
      `${md(nameOf(c, mountById(c, c.reference_id)))}. In brackets: the mount over that plane.`,
    monthTable(c),
    worstMonths(c),
  );
