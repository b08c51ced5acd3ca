import type { Comparison, MountResult } from '../shared/index.ts';
import { columnsOf, hanging, padLeft, padRight, shorten, wrap } from './columns.ts';
import { currencyOf, hasCapital, INCOMPLETE_MARK, incompleteNote, lcoeColumns } from './cost-columns.ts';
import { limitsInWords } from './limit-words.ts';
import { formatDaily, formatGain, formatNumber, UNKNOWN } from './numbers.ts';
import { oneLine } from './plain-text.ts';
import { mountById, nameOf } from './words.ts';

interface Column {
  /** Two lines. */
  readonly head: readonly [string, string];
  readonly cell: (mount: MountResult) => string;
}

const NAME_COLUMNS = 20;
/** Less room than this at the right, and the limits stand below the table. */
const LIMITS_NEED = 22;
const GAP = '  ';

const perKwDecimals = (c: Comparison): number =>
  Math.max(...c.mounts.map((m) => m.capital_per_kw ?? 0)) < 100 ? 2 : 0;

/** The columns that this study can fill. */
const columnsFor = (c: Comparison): Column[] => {
  const reference = shorten(nameOf(c, mountById(c, c.reference_id)), 12);
  const currency = shorten(oneLine(currencyOf(c)), 10);
  const costs = lcoeColumns(c);
  return [
    { head: ['delivered', 'kWh/kW·yr'], cell: (m) => formatNumber(m.energy_kwh_per_kw) },
    ...(c.mounts.length > 1
      ? [
          {
            head: ['against', reference] as const,
            cell: (m: MountResult) => (m.id === c.reference_id ? UNKNOWN : formatGain(m.gain_over_reference)),
          },
        ]
      : []),
    {
      head: ['worst month', 'kWh/kW·day'],
      cell: ({ worst_month: w }) => `${formatDaily(w.kwh_per_kw_day)} ${w.month}`,
    },
    ...(hasCapital(c)
      ? [
          {
            head: ['capital', `${currency}/kW`] as const,
            cell: (m: MountResult) => formatNumber(m.capital_per_kw, perKwDecimals(c)),
          },
        ]
      : []),
    ...costs.map((column, i) => ({
      head: [i === 0 ? `${currency}/kWh` : '', column.name] as const,
      cell: column.cell,
    })),
  ];
};

/** A cell that carries the mark of an incomplete cost hangs it outside, so that the digits stay in line. */
const aligned = (cells: readonly string[], width: number): string[] => {
  const marked = cells.some((cell) => cell.endsWith(INCOMPLETE_MARK));
  return cells.map((cell) => padLeft(marked && !cell.endsWith(INCOMPLETE_MARK) ? `${cell} ` : cell, width));
};

/** The columns as text, each padded to its widest cell. */
const paddedColumns = (c: Comparison) =>
  columnsFor(c).map(({ head, cell }) => {
    const raw = c.mounts.map(cell);
    const widest = Math.max(...[...head, ...aligned(raw, 0)].map(columnsOf));
    return { head: head.map((text) => padLeft(text, widest)), cells: aligned(raw, widest) };
  });

/** Limits at the right of their rows, wrapped, or below the table where there is no room. */
const withLimits = (
  c: Comparison,
  heads: string[],
  rows: string[],
  names: string[],
  width: number,
): string[] => {
  const at = columnsOf(heads[0]) + GAP.length;
  const words = c.mounts.map((m) => limitsInWords(m, true));
  if (width - at < LIMITS_NEED) {
    const text = words.map((limits, i) => `${names[i]}: ${limits}`).join('; ');
    return [...heads, ...rows, ...hanging('  limits', text, 10, width)];
  }
  const body = rows.flatMap((row, i) => {
    const [first, ...more] = wrap(words[i], width - at);
    return [row + GAP + first, ...more.map((line) => ' '.repeat(at) + line)];
  });
  return [`${heads[0]}${GAP}limits`, heads[1], ...body];
};

/** The table of mounts, a row a mount, at most `width` columns wide. */
export const tableLines = (c: Comparison, width: number): string[] => {
  const names = c.mounts.map((mount) => shorten(nameOf(c, mount), NAME_COLUMNS));
  const nameWidth = Math.max(8, ...names.map(columnsOf));
  const columns = paddedColumns(c);
  const line = (name: string, cells: readonly string[]) =>
    [`  ${padRight(name, nameWidth)}`, ...cells].join(GAP);
  const heads = [0, 1].map((half) =>
    line(
      '',
      columns.map(({ head }) => head[half]),
    ),
  );
  const rows = names.map((name, i) =>
    line(
      name,
      columns.map(({ cells }) => cells[i]),
    ),
  );
  const limited = c.mounts.some((mount) => mount.limits.length > 0);
  const lines = limited ? withLimits(c, heads, rows, names, width) : [...heads, ...rows];
  return lines.map((text) => shorten(text.trimEnd(), width));
};

/** What the marks in the table mean; empty where it has none. */
export const tableNotes = (c: Comparison): string[] => {
  const note = incompleteNote(c);
  return note === null ? [] : [note];
};
