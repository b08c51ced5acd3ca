import type { Comparison, MountResult } from '../shared/index.ts';
import { energyInPlaceOfCost } from './energy.ts';
import { type Chart, frame, GROUPED_AXIS_LABEL, type Layer, textLayer } from './frame.ts';
import { axisValues, forSpec, money, percentSize } from './numbers.ts';
import { HAIRLINE, INK, MUTED, seriesStyle } from './palette.ts';
import { ROW_HEIGHT, rowNames, rowPosition } from './rows.ts';
import { labelOf, listed, named, ranked, sentence } from './words.ts';

const RIGHT = 150;

/** What is known of one mount's cost per kWh: one likely value, or one for each of several rates. */
interface CostRow {
  readonly mount: MountResult;
  readonly likely: number | null;
  /** From the lowest rate to the highest. */
  readonly atRates: readonly { rate: string; cost: number }[];
}

/** Cost per kWh by mount; delivered energy instead where no mount has a cost. */
export const costChart = (comparison: Comparison): Chart => {
  const rows = costRows(comparison.mounts);
  if (!rows.some(hasCost)) return energyInPlaceOfCost(comparison);
  const unit = `${comparison.currency ?? 'money'} per kWh`;
  const title = headline(comparison, rows, unit);
  const incomplete = rows.filter((r) => hasCost(r) && r.mount.cost_incomplete).map((r) => named(r.mount));
  const finding = `${title}.${incomplete.length > 0 ? ` Some costs are blank for ${listed(incomplete)}: from what is known only.` : ''}`;
  const altText = `Points on a common scale: cost per kWh by mount, ${unit}. ${finding} ${rows.map((r) => `${labelOf(r.mount)}: ${inWords(r)}`).join('; ')}.`;
  const names = rowNames(rows.map((r) => labelOf(r.mount)));
  const top = Math.max(...rows.flatMap((r) => [r.likely ?? 0, ...r.atRates.map((a) => a.cost)]));
  const x = {
    type: 'quantitative',
    scale: { domain: [0, forSpec(top > 0 ? top : 1)], nice: false },
    axis: {
      title: unit,
      grid: false,
      ticks: true,
      tickColor: HAIRLINE,
      values: axisValues(top > 0 ? top : 1),
      labelExpr: GROUPED_AXIS_LABEL,
    },
  };
  const withRates = rows.some((r) => r.likely === null && r.atRates.length > 0);
  return {
    name: 'cost',
    title,
    finding,
    altText,
    spec: frame({
      title,
      subtitle: withRates
        ? 'Cost per kWh over the life of each mount. The study gives no rate, so it is shown at several real rates.'
        : 'Cost per kWh over the life of each mount, likely value.',
      altText,
      left: names.left,
      right: RIGHT,
      height: rows.length * ROW_HEIGHT,
      above: 30,
      below: 56,
      layers: [...rowGuides(rows, x), ...rateRanges(rows, x), ...likelyPoints(rows, comparison, x), endTexts(rows, x), names.layer],
    }), // biome-ignore format: the layers on one line
  };
};

const hasCost = (row: CostRow): boolean => row.likely !== null || row.atRates.length > 0;
/** What a row is ranked by: its likely cost, else its cost at the middle rate. */
const middle = (row: CostRow): number =>
  row.likely ?? row.atRates[Math.floor(row.atRates.length / 2)]?.cost ?? Number.POSITIVE_INFINITY;

const costRows = (mounts: readonly MountResult[]): CostRow[] =>
  ranked(
    mounts.map((mount) => ({
      mount,
      likely: finite(mount.lcoe_per_kwh),
      atRates: Object.entries(mount.lcoe_at_rates)
        .filter(([, cost]) => Number.isFinite(cost))
        .map(([rate, cost]) => ({ rate: rateWords(rate), cost }))
        .sort((a, b) => Number.parseFloat(a.rate) - Number.parseFloat(b.rate)),
    })),
    (row) => -middle(row),
  );

const finite = (x: number | null): number | null => (x !== null && Number.isFinite(x) ? x : null);
/** Keys of `lcoe_at_rates` as `7 %`, whether they were written `7 %`, `7` or `0.07`. */
const rateWords = (key: string): string => {
  const value = Number.parseFloat(key);
  return Number.isFinite(value) ? `${forSpec(value < 1 ? value * 100 : value)}\u00A0%` : key;
};

/** A dotted line from each name to its point. */
const rowGuides = (rows: readonly CostRow[], x: Record<string, unknown>): Layer[] => [
  {
    data: { values: rows.filter(hasCost).map((r, row) => ({ row, from: 0, to: forSpec(start(r)) })) },
    mark: { type: 'rule', color: MUTED, opacity: 0.5, strokeDash: [1, 3] },
    encoding: { y: rowPosition, x: { field: 'from', ...x }, x2: { field: 'to' } },
  },
];

const start = (row: CostRow): number => row.likely ?? Math.min(...row.atRates.map((a) => a.cost));

const rateRanges = (rows: readonly CostRow[], x: Record<string, unknown>): Layer[] => {
  const shown = rows
    .map((r, row) => ({ ...r, row }))
    .filter((r) => r.likely === null && r.atRates.length > 0);
  if (shown.length === 0) return [];
  const points = shown.flatMap(({ row, mount, atRates }) =>
    atRates.map(({ rate, cost }) => ({
      row,
      mount: labelOf(mount),
      rate,
      cost_per_kwh: forSpec(cost),
      text: rate,
    })),
  );
  return [
    {
      data: {
        values: shown.map(({ row, atRates }) => {
          const costs = atRates.map((a) => a.cost);
          return { row, low: forSpec(Math.min(...costs)), high: forSpec(Math.max(...costs)) };
        }),
      },
      mark: { type: 'rule', strokeWidth: 2, color: MUTED },
      encoding: { y: rowPosition, x: { field: 'low', ...x }, x2: { field: 'high' } },
    },
    {
      data: { values: points },
      mark: { type: 'tick', thickness: 2, size: 14, color: INK, opacity: 1 },
      encoding: { y: rowPosition, x: { field: 'cost_per_kwh', ...x } },
    },
    textLayer(
      points,
      { y: rowPosition, x: { field: 'cost_per_kwh', ...x } },
      { dy: -14, fontSize: 10, color: MUTED },
    ),
  ];
};

const likelyPoints = (
  rows: readonly CostRow[],
  comparison: Comparison,
  x: Record<string, unknown>,
): Layer[] =>
  rows.flatMap(({ mount, likely }, row) => {
    if (likely === null) return [];
    const { color, shape } = seriesStyle(comparison.mounts.indexOf(mount));
    return [
      {
        data: { values: [{ row, mount: labelOf(mount), cost_per_kwh: forSpec(likely) }] },
        mark: {
          type: 'point',
          shape,
          size: 110,
          opacity: 1,
          stroke: color,
          strokeWidth: 2,
          fill: mount.cost_incomplete ? '#FFFFFF' : color,
        },
        encoding: { y: rowPosition, x: { field: 'cost_per_kwh', ...x } },
      },
    ];
  });

const endTexts = (rows: readonly CostRow[], x: Record<string, unknown>): Layer =>
  textLayer(
    rows.map((r, row) => ({
      row,
      end: forSpec(r.likely ?? Math.max(0, ...r.atRates.map((a) => a.cost))),
      text: valueWords(r),
    })),
    { y: rowPosition, x: { field: 'end', ...x } },
    { align: 'left', dx: 12, fontWeight: 'bold' },
  );

/** Short, at the point. */
const valueWords = (row: CostRow): string => {
  if (!hasCost(row)) return 'no cost known';
  const costs = row.atRates.map((a) => a.cost);
  const figure =
    row.likely !== null ? money(row.likely) : `${money(Math.min(...costs))} to ${money(Math.max(...costs))}`;
  return row.mount.cost_incomplete ? `${figure}, in part` : figure;
};

const inWords = (row: CostRow): string =>
  row.likely === null && row.atRates.length > 0
    ? row.atRates.map((a) => `${money(a.cost)} at ${a.rate}`).join(', ')
    : valueWords(row);

/** The title names the cheapest of those that keep their limits, and is no surer than the verdict. */
const headline = (comparison: Comparison, rows: readonly CostRow[], unit: string): string => {
  const costed = rows.filter(hasCost);
  const { excluded } = comparison.advice;
  const keeping = costed.filter(({ mount }) => !excluded.some(({ id }) => id === mount.id));
  const candidates = keeping.length > 0 ? keeping : costed;
  const parts = [
    keeping.length === 0 ? 'no mount with costs keeps its limits' : '',
    keeping.length > 0 && candidates[0] !== costed[0] ? 'of the mounts that keep their limits' : '',
    costed.some(({ mount }) => mount.cost_incomplete) ? 'from the costs given' : '',
  ].filter((part) => part !== '');
  const start = parts.length > 0 ? `${parts.join(', ')}, ` : '';
  const rest =
    candidates[0].likely === null
      ? headlineAtRates(candidates, unit)
      : headlineAtRate(comparison, candidates, unit);
  return sentence(
    start + rest,
    costed.map((row) => named(row.mount)),
  );
};

/** Whether the verdict finds these two too close to call by their costs. */
const tooClose = ({ advice, ranked_by }: Comparison, a: CostRow, b: CostRow): boolean =>
  ranked_by === 'lowest cost per kWh' &&
  [[a, b], [b, a]].some(
    ([chosen, other]) =>
      advice.choice === chosen.mount.id &&
      advice.leads.some((lead) => lead.over === other.mount.id && lead.confidence === 'too_close'),
  ); // biome-ignore format: the two orders on one line

const headlineAtRate = (comparison: Comparison, [best, next]: readonly CostRow[], unit: string): string => {
  const currency = comparison.currency ?? 'money';
  const figure = `${money(middle(best))} ${unit}`;
  if (next === undefined) return `energy from ${named(best.mount)} costs ${figure}`;
  if (tooClose(comparison, best, next))
    return `cost per kWh: ${named(best.mount)} and ${named(next.mount)} are too close to call (${money(middle(best))} and ${money(middle(next))} ${currency})`;
  const ahead = middle(next) > 0 ? 1 - middle(best) / middle(next) : 0;
  return Math.abs(ahead) < 0.0005
    ? `${named(best.mount)} and ${named(next.mount)} cost the same, ${figure}`
    : `${named(best.mount)} makes the cheapest energy: ${figure}, ${percentSize(ahead)} below ${named(next.mount)}`;
};

/** Which mount is cheapest at which rate. */
const headlineAtRates = (rows: readonly CostRow[], unit: string): string => {
  const rates = rows[0].atRates.map((a) => a.rate);
  const costAt = (row: CostRow, rate: string) =>
    row.atRates.find((a) => a.rate === rate)?.cost ?? Number.POSITIVE_INFINITY;
  const winners = rates.map((rate) =>
    rows.reduce((best, row) => (costAt(row, rate) < costAt(best, rate) ? row : best)),
  );
  const spans = rows
    .map((row) => ({ row, won: rates.filter((_, i) => winners[i] === row) }))
    .filter(({ won }) => won.length > 0);
  if (spans.length > 1)
    return `cheapest energy: ${listed(spans.map(({ row, won }) => `${named(row.mount)} at ${listed(won)}`))}`;
  const costs = rows[0].atRates.map((a) => a.cost);
  return `${named(spans[0].row.mount)} makes the cheapest energy at ${listed(rates)}: ${money(Math.min(...costs))} to ${money(Math.max(...costs))} ${unit}`;
};
