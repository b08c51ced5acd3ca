import { oneLine } from './plain-text.ts';

/**
 * Characters that CommonMark or its table, strike-through, formula and link extensions would act upon. An underscore
 * inside a word is plain text, so file names stay readable.
 */
const ACTIVE = /[\\`*[\]<>|~$#]|(?<![\p{L}\p{N}])_|_(?![\p{L}\p{N}])|&(?=[#\p{L}])/gu;
/** What would begin a list, a quotation or a heading underline at the start of a line. */
const ACTIVE_FIRST = /^(?:[-+=:]|\d{1,9}(?=[.)]))/;
/** Bare addresses that some readers turn into links. */
const ADDRESS = /:\/\/|www\.|@/giu;

/** Any text as one line of inert Markdown: it reads as it was written and starts nothing. */
export const md = (text: string): string =>
  oneLine(text)
    .replace(ACTIVE, '\\$&')
    .replace(ADDRESS, (found) => (found.endsWith('.') ? `${found.slice(0, -1)}\\.` : `\\${found}`))
    .replace(ACTIVE_FIRST, (found) => (/\d/.test(found) ? found : `\\${found}`))
    .replace(/^(\d{1,9})([.)])(?=\s|$)/, '$1\\$2');

/** A number's spaces kept on one line in a rendered page. */
const unbroken = (cell: string): string => cell.replace(/(?<=\d) (?=\d|%)/g, '\u00a0');

export type Align = 'left' | 'right';

/** A Markdown table. Cells must be inert already (see {@link md}); numbers need no escape. */
export const mdTable = (
  head: readonly string[],
  align: readonly Align[],
  rows: readonly (readonly string[])[],
): string => {
  const line = (cells: readonly string[]) => `| ${cells.map(unbroken).join(' | ')} |`;
  const rule = `|${align.map((a) => (a === 'right' ? ' ---: ' : ' --- ')).join('|')}|`;
  return [line(head), rule, ...rows.map(line)].join('\n');
};

/** A list; empty where there is nothing to list. Items must be inert already. */
export const mdList = (items: readonly string[]): string => items.map((item) => `- ${item}`).join('\n');

/** An image whose title and alternative text are inert, and whose address cannot end the brackets. */
export const mdImage = (altText: string, path: string): string => {
  const address = encodeURI(path).replace(/[()]/g, (c) => (c === '(' ? '%28' : '%29'));
  return `![${md(altText)}](${address})`;
};
