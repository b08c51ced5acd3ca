import { type Comparison, MONTH_DAYS, MONTH_NAMES, type MountResult } from '../shared/index.ts';
import {
  type Chart,
  frame,
  LABEL_SIZE,
  type Layer,
  LINE_HEIGHT,
  MARGIN,
  plotWidth,
  textLayer,
} from './frame.ts';
import { axisValues, fixed, forSpec } from './numbers.ts';
import { HAIRLINE, INK, MUTED, type SeriesStyle, seriesStyle } from './palette.ts';
import { spreadLabels } from './spread.ts';
import { wrap } from './text.ts';
import { highest, labelOf, named, referenceOf, sentence } from './words.ts';

const LEFT = 58;
const RIGHT = 196;
const WIDTH = plotWidth(LEFT, RIGHT);
/** January stands at 1; half a step of air on either side. */
const MONTHS_SHOWN = [0.6, 12.4] as const;
const pxPerMonth = WIDTH / (MONTHS_SHOWN[1] - MONTHS_SHOWN[0]);
const LABEL_X = WIDTH + 26;
const REFERENCE_NAME = 'best fixed plane tilted anew for each month';
const REFERENCE_STYLE: SeriesStyle = { color: MUTED, dash: [1, 3], shape: 'stroke' };

interface Series {
  readonly name: string;
  readonly style: SeriesStyle;
  readonly kwhPerKwDay: number[];
}

/** What each mount delivers on a day of each month, against the fixed plane tilted for that month. */
export const monthsChart = (comparison: Comparison): Chart => {
  const series: Series[] = comparison.mounts.map((mount, i) => ({
    name: labelOf(mount),
    style: seriesStyle(i),
    kwhPerKwDay: mount.energy_monthly_kwh_per_kw.map((kwh, month) => kwh / MONTH_DAYS[month]),
  }));
  if (comparison.tilted_for_month.length === 12)
    series.push({
      name: REFERENCE_NAME,
      style: REFERENCE_STYLE,
      kwhPerKwDay: comparison.tilted_for_month.map((m) => m.kwh_per_kw_day),
    });
  const most = Math.max(...series.flatMap((s) => s.kwhPerKwDay));
  const top = forSpec(most > 0 ? most * 1.04 : 1);
  const labels = series.map((s) => wrap(s.name, 680 - LEFT - LABEL_X - MARGIN, LABEL_SIZE, 2));
  const height = Math.max(
    260,
    labels.reduce((sum, lines) => sum + roomFor(lines), 0),
  );
  const title = headline(comparison);
  const finding = `${title}. ${againstMonthly(comparison)}`;
  const altText =
    `Lines of energy delivered by month, kWh per kW per day. ${finding} ` +
    `${series.map((s) => `${s.name}: ${s.kwhPerKwDay.map((v, m) => `${MONTH_NAMES[m]} ${fixed(v, 2)}`).join(', ')}`).join('; ')}.`;
  return {
    name: 'months',
    title,
    finding,
    altText,
    spec: frame({
      title,
      subtitle: 'Energy delivered after every counted loss, mean of each month, kWh per kW per day.',
      altText,
      left: LEFT,
      right: RIGHT,
      height,
      above: 24,
      below: 44,
      layers: [
        ...series.toReversed().flatMap((s) => lineLayers(s, top)),
        ...endLabels(series, labels, top, height),
      ],
    }),
  };
};

const roomFor = (lines: readonly string[]): number => lines.length * LINE_HEIGHT + 4;

const axes = (top: number) => ({
  x: {
    field: 'month',
    type: 'quantitative',
    scale: { domain: [...MONTHS_SHOWN], nice: false, zero: false },
    axis: {
      title: null,
      grid: false,
      values: MONTH_NAMES.map((_, m) => m + 1),
      labelExpr: `${JSON.stringify(MONTH_NAMES)}[datum.value - 1]`.replace(/"/g, "'"),
    },
  },
  y: {
    field: 'kwh_per_kw_day',
    type: 'quantitative',
    scale: { domain: [0, top], nice: false },
    axis: { title: 'kWh per kW per day', titlePadding: 8, grid: true, values: axisValues(top) },
  },
});

const lineLayers = ({ name, style, kwhPerKwDay }: Series, top: number): Layer[] => {
  const data = {
    values: kwhPerKwDay.map((v, m) => ({ series: name, month: m + 1, kwh_per_kw_day: forSpec(v) })),
  };
  const line = {
    data,
    mark: { type: 'line', color: style.color, strokeWidth: 2, strokeDash: style.dash, strokeCap: 'butt' },
    encoding: axes(top),
  };
  if (style === REFERENCE_STYLE) return [line];
  const point = {
    data,
    mark: { type: 'point', shape: style.shape, size: 34, filled: true, opacity: 1, color: style.color, stroke: '#FFFFFF', strokeWidth: 0.6 },
    encoding: axes(top),
  }; // biome-ignore format: a mark on one line
  return [line, point];
};

/** Names at the ends of the lines, moved apart, each tied to its line by a thin rule and repeating its mark. */
const endLabels = (
  series: readonly Series[],
  labels: readonly string[][],
  top: number,
  height: number,
): Layer[] => {
  const yOf = (value: number) => height * (1 - value / top);
  const centres = spreadLabels(
    series.map((s) => yOf(s.kwhPerKwDay[11])),
    labels.map(roomFor),
    -12,
    height + 12,
  );
  const lineEnd = (12 - MONTHS_SHOWN[0]) * pxPerMonth + 5;
  const rules = series.map((s, i) => ({
    data: { values: [{ series: s.name }] },
    mark: { type: 'rule', color: HAIRLINE, strokeWidth: 1 },
    encoding: {
      x: { value: forSpec(lineEnd) },
      x2: { value: LABEL_X - 14 },
      y: { value: forSpec(yOf(s.kwhPerKwDay[11])) },
      y2: { value: forSpec(centres[i]) },
    },
  }));
  const marks = series.map((s, i) => {
    const at = { x: { value: LABEL_X - 7 }, y: { value: forSpec(centres[i]) } };
    const data = { values: [{ series: s.name }] };
    return s.style === REFERENCE_STYLE
      ? { data, mark: { type: 'rule', color: s.style.color, strokeWidth: 2, strokeDash: s.style.dash }, encoding: { ...at, x: { value: LABEL_X - 13 }, x2: { value: LABEL_X - 2 } } }
      : { data, mark: { type: 'point', shape: s.style.shape, size: 44, filled: true, opacity: 1, color: s.style.color }, encoding: at };
  }); // biome-ignore format: two marks, one line each
  const texts = labels.map((lines, i) =>
    textLayer(
      [{ text: lines.join('\n') }],
      { x: { value: LABEL_X + 3 }, y: { value: forSpec(centres[i]) } },
      { align: 'left', dy: ((1 - lines.length) * LINE_HEIGHT) / 2, color: INK },
    ),
  );
  return [...rules, ...marks, ...texts];
};

const worst = (mount: MountResult) =>
  `${fixed(mount.worst_month.kwh_per_kw_day, 1)} kWh per kW a day in ${mount.worst_month.month}`;

const headline = (comparison: Comparison): string => {
  const { mounts } = comparison;
  const best = highest(mounts, (m) => m.worst_month.kwh_per_kw_day);
  const reference = referenceOf(mounts, comparison.reference_id);
  if (mounts.length === 1)
    return sentence(`${named(best)} delivers least in its worst month, ${worst(best)}`);
  const other =
    best.id === reference.id
      ? highest(mounts.filter((m) => m.id !== best.id), (m) => m.worst_month.kwh_per_kw_day)
      : reference; // biome-ignore format: one choice
  const same = best.worst_month.month === other.worst_month.month;
  return sentence(
    `${named(best)} has the best worst month, ${worst(best)}; ${named(other)} gives ${fixed(other.worst_month.kwh_per_kw_day, 1)}${same ? '' : ` in ${other.worst_month.month}`}`,
  );
};

/** The reference in its worst month against the plane tilted for that month. */
const againstMonthly = (comparison: Comparison): string => {
  const reference = referenceOf(comparison.mounts, comparison.reference_id);
  const { month, kwh_per_kw_day } = reference.worst_month;
  const tilted = comparison.tilted_for_month.find((m) => m.month === month);
  if (tilted === undefined) return `The worst month of ${named(reference)} is ${month}.`;
  return `A fixed plane tilted for ${month} would give ${fixed(tilted.kwh_per_kw_day, 1)} in that month, where ${named(reference)} gives ${fixed(kwh_per_kw_day, 1)}.`;
};
