import { toSignificant } from '../shared/index.ts';

/** What a cell may hold; null prints as an empty cell. */
export type Cell = string | number | boolean | null;

/** First characters that make a spreadsheet take text for a formula, their wide forms and leading blanks included. */
const FORMULA = /^[\s\p{Cc}]*[=+\-@\uff1d\uff0b\uff0d\uff20]|^[\t\r\n]/u;

const textCell = (text: string): string => {
  const inert = FORMULA.test(text) ? `'${text}` : text;
  return /[",\r\n]/.test(inert) ? `"${inert.replaceAll('"', '""')}"` : inert;
};

const cellText = (cell: Cell): string => {
  if (cell === null) return '';
  if (typeof cell === 'string') return textCell(cell);
  if (typeof cell === 'boolean') return cell ? 'true' : 'false';
  if (!Number.isFinite(cell)) throw new Error(`A fault in trackworth: a number of a table is ${cell}.`);
  return String(toSignificant(cell, 10) + 0);
};

/**
 * Records as comma-separated text with a header, quoted by RFC 4180 (lines end in LF). Text that a spreadsheet would
 * run as a formula is prefixed by an apostrophe; numbers stay numbers, at 10 significant digits.
 */
export const csvText = (records: readonly Readonly<Record<string, Cell>>[]): string => {
  const names = Object.keys(records[0] ?? {});
  const lines = records.map((record) => names.map((name) => cellText(record[name])).join(','));
  return [names.map(textCell).join(','), ...lines].map((line) => `${line}\n`).join('');
};
