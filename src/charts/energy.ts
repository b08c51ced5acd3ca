import type { Comparison, MountResult } from '../shared/index.ts';
import { type Chart, frame, GROUPED_AXIS_LABEL, textLayer } from './frame.ts';
import { axisValues, forSpec, whole } from './numbers.ts';
import { BAR } from './palette.ts';
import { ROW_HEIGHT, rowNames, rowPosition } from './rows.ts';
import { labelOf, moreThan, named, ranked, referenceOf } from './words.ts';

const RIGHT = 90;

/** Delivered energy by mount, drawn in place of the cost where the study gives none; the title says so. */
export const energyInPlaceOfCost = (comparison: Comparison): Chart => {
  const mounts = ranked(comparison.mounts, (m) => m.energy_kwh_per_kw);
  const title = headline(mounts, referenceOf(comparison.mounts, comparison.reference_id));
  const finding = `${title}.`;
  const altText = `Bars of energy delivered in the first year by mount, kWh per kW. ${finding} ${mounts.map((m) => `${labelOf(m)} ${whole(m.energy_kwh_per_kw)}`).join('; ')}.`;
  const names = rowNames(mounts.map(labelOf));
  const most = mounts[0].energy_kwh_per_kw;
  const top = most > 0 ? most : 1;
  const x = {
    field: 'kwh_per_kw',
    type: 'quantitative',
    scale: { domain: [0, forSpec(top)], nice: false },
    axis: { title: 'kWh per kW in the first year', grid: false, ticks: true, values: axisValues(top), labelExpr: GROUPED_AXIS_LABEL },
  }; // biome-ignore format: one axis
  const values = mounts.map((m, row) => ({
    row,
    mount: labelOf(m),
    kwh_per_kw: forSpec(m.energy_kwh_per_kw),
    text: whole(m.energy_kwh_per_kw),
  }));
  return {
    name: 'cost',
    title,
    finding,
    altText,
    spec: frame({
      title,
      subtitle:
        'Energy delivered in the first year after every counted loss, kWh per kW. Costs per kWh need prices.',
      altText,
      left: names.left,
      right: RIGHT,
      height: mounts.length * ROW_HEIGHT,
      above: 20,
      below: 56,
      layers: [
        { data: { values }, mark: { type: 'bar', color: BAR }, encoding: { y: rowPosition, x } },
        textLayer(values, { y: rowPosition, x }, { align: 'left', dx: 6, fontWeight: 'bold' }),
        names.layer,
      ],
    }),
  };
};

const headline = (mounts: readonly MountResult[], reference: MountResult): string => {
  const best = mounts[0];
  const other = best.id === reference.id ? mounts[1] : reference;
  const figure = `${whole(best.energy_kwh_per_kw)} kWh per kW a year`;
  const more =
    other === undefined ? null : moreThan(best.energy_kwh_per_kw, other.energy_kwh_per_kw, 'energy');
  return more === null
    ? `No costs given: ${named(best)} delivers ${figure}`
    : `No costs given: ${named(best)} delivers ${more} ${named(other)}, ${figure}`;
};
