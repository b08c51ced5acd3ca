import type { Comparison, MountResult } from '../../shared/index.ts';
import { costLack, currencyOf, hasCapital, incompleteNote, lcoeColumns } from '../cost-columns.ts';
import type { ChartFile } from '../extras.ts';
import { limitsInWords } from '../limit-words.ts';
import { type Align, md, mdImage, mdTable } from '../markdown.ts';
import { formatDaily, formatGain, formatNumber } from '../numbers.ts';
import { capitalised } from '../plain-text.ts';
import { arrayWords, KIND_WORDS, mountById, nameOf } from '../words.ts';
import { section } from './section.ts';

interface Column {
  readonly head: string;
  readonly align: Align;
  readonly cell: (mount: MountResult) => string;
}

const columnsFor = (c: Comparison): Column[] => {
  const reference = md(nameOf(c, mountById(c, c.reference_id)));
  const money = md(currencyOf(c));
  const right = (head: string, cell: Column['cell']): Column => ({ head, align: 'right', cell });
  return [
    { head: 'Mount', align: 'left', cell: (m) => `${md(nameOf(c, m))}, ${KIND_WORDS[m.kind]}` },
    right('Delivered, kWh/kW·yr', (m) => formatNumber(m.energy_kwh_per_kw)),
    ...(c.mounts.length > 1
      ? [
          right(`Against ${reference}`, (m) =>
            m.id === c.reference_id ? 'reference' : formatGain(m.gain_over_reference),
          ),
        ]
      : []),
    right(
      'Worst month, kWh/kW·day',
      ({ worst_month: w }) => `${formatDaily(w.kwh_per_kw_day)} in ${w.month}`,
    ),
    ...(hasCapital(c) ? [right(`Capital, ${money}/kW`, (m) => formatNumber(m.capital_per_kw))] : []),
    ...lcoeColumns(c).map(({ name, cell }) => right(`Cost, ${money}/kWh, ${name}`, (m) => md(cell(m)))),
    { head: 'Limits', align: 'left', cell: (m) => md(limitsInWords(m)) },
  ];
};

/** A chart with its finding as a caption. */
export const figure = ({ title, altText, file }: ChartFile): string =>
  `${mdImage(altText, file)}\n\n*${md(title)}*`;

const notes = (c: Comparison): string => {
  const lack = costLack(c);
  const incomplete = incompleteNote(c);
  return [
    `Energy is what leaves the inverter (AC) in the first year, per kW of DC rating: ${md(arrayWords(c))}.`,
    lack === null ? '' : `${md(capitalised(lack))}.`,
    incomplete === null ? '' : `${md(incomplete)}.`,
  ]
    .filter((text) => text !== '')
    .join(' ');
};

/** The one table and the two charts of page one. */
export const overview = (c: Comparison, charts: readonly ChartFile[]): string => {
  const columns = columnsFor(c);
  return section(
    'Results at a glance',
    mdTable(
      columns.map(({ head }) => head),
      columns.map(({ align }) => align),
      c.mounts.map((mount) => columns.map(({ cell }) => cell(mount))),
    ),
    notes(c),
    ...charts.map(figure),
  );
};
