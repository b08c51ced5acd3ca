/** Text from files and names made fit for a terminal and a shell. */

/** Control characters, escape sequences' first byte, and marks that turn the reading direction. */
const UNPRINTABLE = /[\p{Cc}\p{Zl}\p{Zp}\u061c\u200e\u200f\u202a-\u202e\u2066-\u2069]+/gu;

/** One line without anything that a terminal would obey. */
export const printable = (text: string): string => text.replace(UNPRINTABLE, ' ').trim();

/** A path as one word for the user's shell. */
export const shellWord = (path: string): string =>
  /^[\p{L}\p{N}_./\\:@%+,-]+$/u.test(path) ? path : `'${printable(path).replaceAll("'", "'\\''")}'`;

/** Breaks a text at spaces into lines of at most `columns`, all but the first behind `indent` spaces. */
export const wrapped = (text: string, columns: number, indent: number): string => {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ')) {
    if (line !== '' && line.length + 1 + word.length > columns - indent) {
      lines.push(line);
      line = word;
    } else line = line === '' ? word : `${line} ${word}`;
  }
  return [...lines, line].join(`\n${' '.repeat(indent)}`);
};

/** Screens are at most this wide; what a line says begins behind its name. */
const COLUMNS = 100;
export const INDENT = 16;

/** A named line of a screen, broken below its own beginning. */
export const named = (name: string, text: string): string =>
  name.padEnd(INDENT) + wrapped(text, COLUMNS, INDENT);
