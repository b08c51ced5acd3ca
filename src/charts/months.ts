import {
  type Comparison,
  darkMonthsWords,
  isNothing,
  MONTH_DAYS,
  MONTH_NAMES,
  type MountResult,
  monthInFull,
} from '../shared/index.ts';
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
  const finding = `${title}.${bestWorstMonth(comparison)}`;
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

/** Two figures of one sentence may differ in the second decimal only. */
const daily = (kwhPerKwDay: number): string => (isNothing(kwhPerKwDay) ? 'nothing' : fixed(kwhPerKwDay, 2));

/** The mount that is chosen, else the reference. */
const subjectOf = ({ mounts, advice, reference_id }: Comparison): MountResult =>
  mounts.find(({ id }) => id === advice.choice) ?? referenceOf(mounts, reference_id);

/** The chosen mount in its worst month against the plane tilted for that month; words where the sun stays down. */
const headline = (comparison: Comparison): string => {
  const subject = subjectOf(comparison);
  const { month, kwh_per_kw_day } = subject.worst_month;
  const tilted = comparison.tilted_for_month.find((m) => m.month === month);
  const dark = darkMonthsWords(comparison);
  if (dark !== null && isNothing(tilted?.kwh_per_kw_day ?? 0)) return sentence(dark);
  const least = isNothing(kwh_per_kw_day)
    ? `${named(subject)} delivers nothing in ${monthInFull(month)}`
    : `${named(subject)} delivers least in ${monthInFull(month)}, ${daily(kwh_per_kw_day)} kWh per kW a day`;
  return tilted === undefined
    ? least
    : `${least}; a fixed plane tilted for that month would give ${daily(tilted.kwh_per_kw_day)}`;
};

/** Which of the mounts that keep their limits has the best worst month; empty where there is none to name. */
const bestWorstMonth = ({ mounts, advice }: Comparison): string => {
  const kept = mounts.filter(({ id }) => !advice.excluded.some((e) => e.id === id));
  if (kept.length < 2) return '';
  const best = highest(kept, (m) => m.worst_month.kwh_per_kw_day);
  if (isNothing(best.worst_month.kwh_per_kw_day)) return '';
  const whom = kept.length < mounts.length ? 'Of the mounts that keep their limits' : 'Of all mounts';
  return ` ${whom}, ${named(best)} has the best worst month: ${daily(best.worst_month.kwh_per_kw_day)} in ${monthInFull(best.worst_month.month)}.`;
};
