import stringWidth from 'string-width';

/** Latin letters, figures, dashes, dots and the ellipsis: one column each. The general count is 100 times slower. */
const NARROW = /^[ -~\u00a0-\u00a8\u00aa-\u00ac\u00af-\u024f\u2010-\u2027]*$/;

/** How many terminal columns a text takes; Chinese, Japanese and Korean characters take two. */
export const columnsOf = (text: string): number => (NARROW.test(text) ? text.length : stringWidth(text));

const graphemes = new Intl.Segmenter('en', { granularity: 'grapheme' });

/** The longest start of `text` that fits `columns`, never splitting a character. */
const headOf = (text: string, columns: number): string => {
  let head = '';
  let used = 0;
  for (const { segment } of graphemes.segment(text)) {
    used += columnsOf(segment);
    if (used > columns) break;
    head += segment;
  }
  return head;
};

/** `text` if it fits, else its start and an ellipsis. */
export const shorten = (text: string, columns: number): string =>
  columnsOf(text) <= columns ? text : `${headOf(text, columns - 1).trimEnd()}…`;

export const padLeft = (text: string, columns: number): string =>
  ' '.repeat(Math.max(0, columns - columnsOf(text))) + text;

export const padRight = (text: string, columns: number): string =>
  text + ' '.repeat(Math.max(0, columns - columnsOf(text)));

/** Words of `text`; one too wide for a line of its own is cut into pieces that fit. */
const wordsOf = (text: string, columns: number): string[] =>
  text.split(' ').flatMap((word) => {
    const pieces: string[] = [];
    let rest = word;
    while (columnsOf(rest) > columns) {
      const head = headOf(rest, columns);
      pieces.push(head);
      rest = rest.slice(head.length);
    }
    return [...pieces, rest];
  });

/** Spaces inside a number, and before its per cent sign, do not end a line. */
const glued = (text: string): string => text.replace(/(?<=\d) (?=%|\d{3}(?!\d))/g, GLUE);
const GLUE = '\u00a0';

/** Breaks one line of text at spaces so that none exceeds `columns` (at least 2). */
export const wrap = (text: string, columns: number): string[] => {
  const lines: string[] = [];
  let line: string | null = null;
  for (const word of wordsOf(glued(text), columns)) {
    if (line === null) line = word;
    else if (columnsOf(line) + 1 + columnsOf(word) <= columns) line += ` ${word}`;
    else {
      lines.push(line);
      line = word;
    }
  }
  if (line !== null) lines.push(line);
  return lines.map((whole) => whole.replaceAll(GLUE, ' ').trimEnd());
};

/** A paragraph behind a name in a left column: `Doubt     the text goes on\n          and on`. */
export const hanging = (name: string, text: string, indent: number, width: number): string[] =>
  wrap(text, width - indent).map((line, i) => padRight(i === 0 ? name : '', indent) + line);
