import type { Comparison, MountResult } from '../shared/index.ts';
import { type Chart, frame, GROUPED_AXIS_LABEL, plotWidth, textLayer } from './frame.ts';
import { axisValues, forSpec, percentSize, whole } from './numbers.ts';
import { HAIRLINE, INK, LIGHT, MUTED, ON_LIGHT } from './palette.ts';
import { ROW_HEIGHT, rowNames, rowPosition } from './rows.ts';
import { textWidth } from './text.ts';
import { highest, labelOf, listed, moreThan, named, ranked, referenceOf, sentence } from './words.ts';

const PARTS = [
  { part: 'beam', words: 'beam', value: (m: MountResult) => m.beam_kwh_m2 },
  { part: 'sky', words: 'sky', value: (m: MountResult) => m.sky_diffuse_kwh_m2 },
  { part: 'ground', words: 'reflected by the ground', value: (m: MountResult) => m.ground_reflected_kwh_m2 },
] as const;
const RIGHT = 166;
const VALUE_SIZE = 11;

/** Yearly light on each mount, stacked by where it comes from: beam, sky, ground. */
export const irradiationChart = (comparison: Comparison): Chart => {
  const mounts = ranked(comparison.mounts, (m) => m.irradiation_kwh_m2);
  const title = headline(mounts, referenceOf(comparison.mounts, comparison.reference_id));
  const finding = `${title}. ${beamSentence(mounts)}`;
  const figures = mounts.map(
    (m) =>
      `${labelOf(m)} ${whole(m.irradiation_kwh_m2)} (${PARTS.map((p) => `${p.words} ${whole(p.value(m))}`).join(', ')})`,
  );
  const altText = `Stacked bars of yearly light by mount, kWh per m². ${finding} ${figures.join('; ')}.`;

  const names = rowNames(mounts.map(labelOf));
  const width = plotWidth(names.left, RIGHT);
  const most = Math.max(...mounts.map((m) => m.irradiation_kwh_m2));
  const scaleTop = most > 0 ? most : 1;
  const segments = mounts.flatMap((m, row) => segmentsOf(m, row, width / scaleTop));
  const x = {
    type: 'quantitative',
    scale: { domain: [0, forSpec(scaleTop)], nice: false },
    axis: {
      title: 'kWh/m² a year',
      grid: false,
      ticks: true,
      tickColor: HAIRLINE,
      values: axisValues(scaleTop),
      labelExpr: GROUPED_AXIS_LABEL,
    },
  };
  return {
    name: 'irradiation',
    title,
    finding,
    altText,
    spec: frame({
      title,
      subtitle:
        'Yearly light on the front of each plane before shade and losses, by where it comes from; the bright ring round the sun counts as sky.',
      altText,
      left: names.left,
      right: RIGHT,
      height: mounts.length * ROW_HEIGHT,
      above: 30,
      below: 56,
      layers: [
        {
          data: { values: segments },
          mark: { type: 'bar', stroke: '#FFFFFF', strokeWidth: 1 },
          encoding: {
            y: rowPosition,
            x: { field: 'from_kwh_m2', ...x },
            x2: { field: 'to_kwh_m2' },
            color: {
              field: 'part',
              type: 'nominal',
              scale: { domain: Object.keys(LIGHT), range: Object.values(LIGHT) },
              legend: null,
            },
          },
        },
        textLayer(
          segments.filter((s) => s.text !== ''),
          {
            y: rowPosition,
            x: { field: 'middle_kwh_m2', ...x },
            color: {
              field: 'part',
              type: 'nominal',
              scale: { domain: Object.keys(ON_LIGHT), range: Object.values(ON_LIGHT) },
              legend: null,
            },
          },
          { fontSize: VALUE_SIZE },
        ),
        textLayer(
          mounts.map((m, row) => ({
            row,
            end: forSpec(m.irradiation_kwh_m2),
            text: whole(m.irradiation_kwh_m2),
          })),
          { y: rowPosition, x: { field: 'end', ...x } },
          { align: 'left', dx: 6, fontWeight: 'bold' },
        ),
        ...outsideGroundValues(mounts, segments, x),
        ...partHeads(mounts[0], width / scaleTop),
        names.layer,
      ],
      rest: { resolve: { scale: { color: 'independent' } } },
    }),
  };
};

interface Segment {
  row: number;
  mount: string;
  part: string;
  from_kwh_m2: number;
  to_kwh_m2: number;
  middle_kwh_m2: number;
  kwh_m2: number;
  text: string;
}

const segmentsOf = (mount: MountResult, row: number, pxPerUnit: number): Segment[] => {
  let from = 0;
  return PARTS.map(({ part, value }) => {
    const size = value(mount);
    const [start, end] = [from, from + size];
    from = end;
    const text = whole(size);
    return {
      row,
      mount: labelOf(mount),
      part,
      from_kwh_m2: forSpec(start),
      to_kwh_m2: forSpec(end),
      middle_kwh_m2: forSpec((start + end) / 2),
      kwh_m2: forSpec(size),
      text: textWidth(text, VALUE_SIZE) + 8 <= size * pxPerUnit ? text : '',
    };
  });
};

/** The light off the ground is mostly too little to print inside its bar: its figure stands behind the total. */
const outsideGroundValues = (
  mounts: readonly MountResult[],
  segments: readonly Segment[],
  x: Record<string, unknown>,
) => {
  const values = segments
    .filter((s) => s.part === 'ground' && s.text === '')
    .map((s) => {
      const total = whole(mounts[s.row].irradiation_kwh_m2);
      return {
        row: s.row,
        end: forSpec(mounts[s.row].irradiation_kwh_m2),
        text: `from the ground ${whole(s.kwh_m2)}`,
        shift: Math.ceil(textWidth(total, 12, true)) + 17,
      };
    });
  return values.length === 0
    ? []
    : [
        textLayer(
          values,
          { y: rowPosition, x: { field: 'end', ...x } },
          { align: 'left', dx: { expr: 'datum.shift' }, fontSize: VALUE_SIZE, color: MUTED },
        ),
      ];
};

/** Names of the parts above the first bar, each over its own part and pushed right where that is too short. */
const partHeads = (first: MountResult, pxPerUnit: number) => {
  let [from, free] = [0, 0];
  const heads = PARTS.map(({ part, words, value }) => {
    const at = Math.max(from * pxPerUnit, free);
    from += value(first);
    free = at + textWidth(words, VALUE_SIZE, true) + 22;
    return { part, x: forSpec(at), text: words };
  });
  const shared = {
    y: { value: -6 },
    color: {
      field: 'part',
      type: 'nominal',
      scale: { domain: Object.keys(LIGHT), range: Object.values(LIGHT) },
      legend: null,
    },
  };
  return heads.flatMap(({ part, x, text }) => [
    {
      data: { values: [{ part }] },
      mark: { type: 'square', size: 70, opacity: 1, filled: true },
      encoding: { ...shared, x: { value: x + 5 } },
    },
    textLayer(
      [{ text }],
      { y: shared.y, x: { value: x + 13 } },
      { align: 'left', fontSize: VALUE_SIZE, color: INK },
    ),
  ]);
};

const headline = (mounts: readonly MountResult[], reference: MountResult): string => {
  const best = mounts[0];
  const other = best.id === reference.id ? mounts[1] : reference;
  if (other === undefined)
    return `${named(best)} collects ${whole(best.irradiation_kwh_m2)} kWh/m² of light a year`;
  const more = moreThan(best.irradiation_kwh_m2, other.irradiation_kwh_m2, 'light');
  return more === null
    ? sentence(
        `no light falls on ${named(other)}; ${named(best)} collects ${whole(best.irradiation_kwh_m2)} kWh/m²`,
      )
    : `${named(best)} collects ${more} ${named(other)}`;
};

/** How much of the light is beam, which is what a tracker lives on. */
const beamSentence = (mounts: readonly MountResult[]): string => {
  const lit = mounts.filter((m) => m.irradiation_kwh_m2 > 0);
  if (lit.length === 0) return 'No light falls on any mount.';
  const share = (m: MountResult) => m.beam_kwh_m2 / m.irradiation_kwh_m2;
  const [most, least] = [highest(lit, share), highest(lit, (m) => -share(m))];
  const ends = most === least ? [most] : [most, least];
  return `Beam is ${listed(ends.map((m) => `${percentSize(share(m))} of the light on ${named(m)}`))}.`;
};
