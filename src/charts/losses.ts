import { type Comparison, groupedStages, type MountResult, type StageGroup } from '../shared/index.ts';
import {
  CHART_WIDTH,
  type Chart,
  frame,
  LABEL_SIZE,
  type Layer,
  LINE_HEIGHT,
  MARGIN,
  textLayer,
} from './frame.ts';
import { forSpec, whole } from './numbers.ts';
import { BAR, HAIRLINE, MUTED } from './palette.ts';
import { oneLine, shorten, textWidth, wrap } from './text.ts';
import { highest, labelOf, listed, named } from './words.ts';

const MOUNTS_ABREAST = 4;
const STAGE_ROOM = 120;
const ROW = 22;
const BAR_THICK = 13;
const HEAD = 40;
const BLOCK_GAP = 18;
const GROUP_GAP = 6;
const VALUE_SIZE = 11;
const VALUE_ROOM = 38;

interface StageLoss {
  readonly stage: string;
  /** kWh per kW that the stage takes; negative where it gives. Null where the mount has no such stage. */
  readonly taken: number | null;
}

/** What each stage takes from each mount, kWh per kW: small multiples on one scale. */
export const lossesChart = (comparison: Comparison): Chart => {
  const { mounts } = comparison;
  const groups = groupedStages(stageOrder(mounts));
  const stages = groups.flatMap((group) => group.stages);
  const { places, heads, height: rowsHeight } = placesOf(groups);
  const losses = mounts.map((mount) => lossesOf(mount, stages));
  const title = headline(mounts, losses);
  const finding = `${title}. ${totals(mounts)}`;
  const altText = `Bars of what each stage takes by mount, kWh per kW a year. ${finding} ${mounts.map((m, i) => `${labelOf(m)}: ${losses[i].map((l) => `${l.stage} ${l.taken === null ? 'not counted' : whole(l.taken)}`).join(', ')}`).join('; ')}.`;

  const abreast = Math.min(MOUNTS_ABREAST, mounts.length);
  const stageWidth = Math.ceil(
    Math.max(
      ...stages.map((s) => Math.min(STAGE_ROOM, textWidth(s, LABEL_SIZE))),
      ...heads.map(({ head }) => textWidth(head, VALUE_SIZE, true)),
    ),
  );
  const left = MARGIN + stageWidth + 14;
  const columnWidth = (CHART_WIDTH - left - MARGIN) / abreast;
  const taken = losses.flat().map((l) => l.taken ?? 0);
  const scaleTop = Math.max(1e-9, ...taken);
  const scaleLow = Math.min(0, ...taken);
  // A lone mount needs no bars across the whole page: three columns' room at most.
  const barRoom = Math.min(columnWidth, 300) - VALUE_ROOM - 12 - (scaleLow < 0 ? VALUE_ROOM : 0);
  const pxPerUnit = barRoom / (scaleTop - scaleLow);
  const zero = -scaleLow * pxPerUnit + (scaleLow < 0 ? VALUE_ROOM : 0);
  const blockHeight = HEAD + rowsHeight + BLOCK_GAP;
  const blocks = Math.ceil(mounts.length / abreast);

  const layers = mounts.flatMap((mount, i) => {
    const x0 = (i % abreast) * columnWidth + zero;
    const y0 = Math.floor(i / abreast) * blockHeight + HEAD;
    return panel(mount, losses[i], { x0, y0, pxPerUnit, columnWidth, zero, places, height: rowsHeight });
  });
  const names = Array.from({ length: blocks }, (_, b) => {
    const top = b * blockHeight + HEAD;
    return [
      textLayer(
        stages.map((stage, s) => ({ y: top + places[s], text: shorten(stage, STAGE_ROOM, LABEL_SIZE) })),
        { y: pixels('y'), x: { value: -14 } },
        { align: 'right', color: MUTED },
      ),
      textLayer(
        heads.map(({ head, at }) => ({ y: top + at, text: head })),
        { y: pixels('y'), x: { value: -14 } },
        { align: 'right', fontSize: VALUE_SIZE, fontWeight: 'bold' },
      ),
    ];
  }).flat();
  return {
    name: 'losses',
    title,
    finding,
    altText,
    spec: frame({
      title,
      subtitle: howToRead(losses.flat()),
      altText,
      left,
      right: MARGIN,
      height: blocks * blockHeight - BLOCK_GAP,
      above: 12,
      below: MARGIN,
      layers: [...names, ...layers],
    }),
  };
};

/** Middles of the stages' rows and of the heads above each group, pixels below the first row's top. */
const placesOf = (groups: readonly StageGroup[]) => {
  const places: number[] = [];
  const heads: { head: string; at: number }[] = [];
  let y = 0;
  for (const { head, stages } of groups) {
    heads.push({ head, at: y + ROW / 2 });
    y += ROW;
    for (const _ of stages) {
      places.push(y + ROW / 2);
      y += ROW;
    }
    y += GROUP_GAP;
  }
  return { places, heads, height: Math.max(0, y - GROUP_GAP) };
};

/** Signs are explained only where they occur. */
const howToRead = (losses: readonly StageLoss[]): string =>
  [
    'What each stage takes on the way from light to delivered energy, kWh per kW a year, all on one scale.',
    losses.some((l) => l.taken === null) ? 'A dash: no such stage is counted.' : '',
    losses.some((l) => (l.taken ?? 0) < -0.5) ? 'A plus: the stage gives.' : '',
  ]
    .filter((part) => part !== '')
    .join(' ');

/** Stages in the order of the chain, those of every mount merged. */
const stageOrder = (mounts: readonly MountResult[]): string[] => {
  const order: string[] = [];
  for (const mount of mounts) {
    let at = 0;
    for (const { name } of mount.stages) {
      const known = order.indexOf(oneLine(name));
      if (known >= 0) at = known + 1;
      else order.splice(at++, 0, oneLine(name));
    }
  }
  return order;
};

const lossesOf = (mount: MountResult, stages: readonly string[]): StageLoss[] => {
  const taken = new Map<string, number>();
  let before = mount.irradiation_kwh_m2;
  for (const stage of mount.stages) {
    taken.set(oneLine(stage.name), before - stage.kwh_per_kw_after);
    before = stage.kwh_per_kw_after;
  }
  return stages.map((stage) => ({ stage, taken: taken.get(stage) ?? null }));
};

interface Place {
  readonly x0: number;
  readonly y0: number;
  readonly pxPerUnit: number;
  readonly columnWidth: number;
  readonly zero: number;
  /** Middles of the rows below `y0`, and how far they reach. */
  readonly places: readonly number[];
  readonly height: number;
}

/** Positions that are worked out here, in pixels of the plot. */
const pixels = (field: string) => ({ field, type: 'quantitative', scale: null, axis: null });

const panel = (mount: MountResult, losses: readonly StageLoss[], place: Place): Layer[] => {
  const { x0, y0, pxPerUnit } = place;
  const left = x0 - place.zero;
  const rows = losses.map(({ stage, taken }, s) => {
    const y = y0 + place.places[s];
    const end = x0 + (taken ?? 0) * pxPerUnit;
    return { stage, mount: labelOf(mount), taken_kwh_per_kw: taken === null ? null : forSpec(taken), y, top: y - BAR_THICK / 2, bottom: y + BAR_THICK / 2, x: forSpec(x0), x2: forSpec(end), text: taken === null ? '\u2013' : taken < -0.5 ? `+${whole(-taken)}` : whole(Math.abs(taken)) };
  }); // biome-ignore format: one row
  const name = wrap(labelOf(mount), Math.min(place.columnWidth, 300) - 14, LABEL_SIZE, 2, true);
  const counted = rows.filter((r) => r.taken_kwh_per_kw !== null);
  const text = (values: object[], align: string, dx: number, mark = {}) =>
    textLayer(values, { x: pixels('x2'), y: pixels('y') }, { align, dx, fontSize: VALUE_SIZE, ...mark });
  return [
    textLayer(
      [{ text: name.join('\n') }],
      { x: { value: forSpec(left) }, y: { value: y0 - 14 - (name.length - 1) * LINE_HEIGHT } },
      { align: 'left', fontWeight: 'bold' },
    ),
    {
      data: { values: counted },
      mark: { type: 'rect', color: BAR },
      encoding: { x: pixels('x'), x2: { field: 'x2' }, y: pixels('top'), y2: { field: 'bottom' } },
    },
    text(counted.filter((r) => !r.text.startsWith('+')), 'left', 5),
    text(counted.filter((r) => r.text.startsWith('+')), 'right', -5),
    text(rows.filter((r) => r.taken_kwh_per_kw === null), 'left', 5, { color: MUTED }),
    {
      data: { values: [{ mount: labelOf(mount) }] },
      mark: { type: 'rule', color: HAIRLINE },
      encoding: {
        x: { value: forSpec(x0) },
        y: { value: y0 },
        y2: { value: y0 + place.height },
      },
    },
  ]; // biome-ignore format: a list of layers
};

/** The stage that takes most kWh, mount by mount; mounts that share it are named together. */
const headline = (mounts: readonly MountResult[], losses: readonly StageLoss[][]): string => {
  const worst = mounts.map((mount, i) => ({ mount, ...highest(losses[i], (l) => l.taken ?? 0) }));
  const real = worst.filter((w) => (w.taken ?? 0) > 0);
  if (real.length === 0) return 'No counted stage takes anything from any mount';
  const byStage = [...new Set(real.map((w) => w.stage))].map((stage) => real.filter((w) => w.stage === stage));
  const group = byStage.reduce((big, g) => (g.length > big.length ? g : big));
  const sizes = group.map((w) => w.taken ?? 0);
  const [low, high] = [whole(Math.min(...sizes)), whole(Math.max(...sizes))];
  const range = low === high ? high : `${low} to ${high}`;
  const every = group.length === mounts.length && group.length > 1;
  const many = group.length > 3;
  const whom = every ? 'Every mount' : many ? `${group.length} of ${mounts.length} mounts` : listed(group.map((w) => named(w.mount)));
  const lose = every || group.length === 1 ? 'loses' : 'lose';
  const rest = byStage.filter((g) => g !== group).map((g) => `${g.length > 2 ? `${g.length} others` : listed(g.map((w) => named(w.mount)))} at ${g[0].stage}`);
  return `${whom} ${lose} most kWh at ${group[0].stage}: ${range} per kW a year${rest.length > 0 ? `; ${listed(rest)}` : ''}`;
}; // biome-ignore format: one sentence

const totals = (mounts: readonly MountResult[]): string => {
  const parts = mounts
    .filter((m) => m.irradiation_kwh_m2 > 0)
    .map((m) => `${whole(m.energy_kwh_per_kw)} of ${whole(m.irradiation_kwh_m2)} from ${named(m)}`);
  return parts.length > 0 ? `What is left is ${listed(parts)}.` : 'There is no light to lose.';
};
