/** Text that came from a user or a file, made fit to stand on one line. */

/** Control characters, line ends, escape sequences' first byte, and marks that turn the reading direction. */
const UNPRINTABLE = /[\p{Cc}\p{Zl}\p{Zp}\u061c\u200b\u200e\u200f\u202a-\u202e\u2066-\u2069\ufeff]+/gu;

/** One line: every run of control characters and blanks becomes one space, ends trimmed. */
export const oneLine = (text: string): string => text.replace(UNPRINTABLE, ' ').replace(/\s+/gu, ' ').trim();

/** A sentence begins with a capital where it begins with a plain word, not with one of `names`, which stand as they are. */
export const capitalised = (text: string, names: readonly string[] = []): string =>
  names.some(
    (name) => name !== '' && text.startsWith(name) && !/^[\p{L}\p{N}_-]/u.test(text.slice(name.length)),
  )
    ? text
    : text.replace(/^[a-z]/, (letter) => letter.toUpperCase());

/** `a`, `a and b`, `a, b and c`. */
export const listed = (items: readonly string[]): string =>
  items.length < 2 ? (items[0] ?? '') : `${items.slice(0, -1).join(', ')} and ${items.at(-1)}`;
