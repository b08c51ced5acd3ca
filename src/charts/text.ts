/** Labels of unknown origin and length made fit to draw: one line, inert, wrapped or shortened to a width in pixels. */

/** Advance widths of code points 32 to 126 in Inter Regular, hundredths of the font size (checked against the font in the tests). */
const ADVANCES = [
  28, 29, 47, 63, 64, 98, 64, 30, 36, 36, 50, 66, 29, 46, 29, 36, 63, 41, 61, 62, 65, 59, 62, 57, 62, 62, 29, 30,
  66, 66, 66, 51, 97, 69, 65, 73, 72, 60, 59, 75, 74, 27, 57, 67, 57, 90, 75, 76, 64, 76, 64, 64, 65, 74, 69, 99,
  68, 68, 63, 36, 36, 36, 47, 46, 32, 56, 61, 57, 61, 58, 37, 61, 59, 24, 24, 55, 24, 88, 59, 60, 61, 61, 38, 53,
  33, 59, 56, 82, 55, 56, 55, 43, 33, 43, 66,
]; // biome-ignore format: a table of one column
/** No-break space, degree, minus and ellipsis. */
const OTHERS: Record<number, number> = { 160: 0.28, 176: 0.46, 8722: 0.66, 8230: 0.87 };
/** Bold letters are this much wider. */
const BOLD = 1.06;
const ELLIPSIS = '\u2026';

const advance = (codePoint: number): number => {
  if (codePoint >= 32 && codePoint <= 126) return ADVANCES[codePoint - 32] / 100;
  if (codePoint in OTHERS) return OTHERS[codePoint];
  return codePoint < 0x1100 ? 0.68 : 1;
};

/** Width of a line in pixels, near enough to lay out labels before any font is at hand. */
export const textWidth = (text: string, fontSize: number, bold = false): number => {
  let ems = 0;
  for (const letter of text) ems += advance(letter.codePointAt(0)!);
  return ems * fontSize * (bold ? BOLD : 1);
};

/**
 * Control (Cc), direction-override and zero-width (Cf), line-break (Zl, Zp), unpaired surrogate (Cs) and unassigned
 * (Cn) characters: not drawable, or forbidden in XML.
 */
const UNDRAWABLE = /[\p{Cc}\p{Cf}\p{Zl}\p{Zp}\p{Cs}\p{Cn}]/gu;

/** A user's text as one line: what cannot be drawn becomes a space, runs of space become one. */
export const oneLine = (text: string): string => text.replace(UNDRAWABLE, ' ').replace(/\s+/g, ' ').trim();

/** Cuts a line with an ellipsis so that it fits. */
export const shorten = (line: string, widthPx: number, fontSize: number, bold = false): string => {
  if (textWidth(line, fontSize, bold) <= widthPx) return line;
  const letters = [...line];
  while (letters.length > 1 && textWidth(letters.join('') + ELLIPSIS, fontSize, bold) > widthPx)
    letters.pop();
  return letters.join('').trimEnd() + ELLIPSIS;
};

/** Breaks a text at its spaces into at most `maxLines` lines that fit; the last one is shortened. */
export const wrap = (
  text: string,
  widthPx: number,
  fontSize: number,
  maxLines: number,
  bold = false,
): string[] => {
  const words = text.split(' ');
  const lines: string[] = [];
  while (words.length > 0 && lines.length < maxLines - 1) {
    let line = words.shift()!;
    while (words.length > 0 && textWidth(`${line} ${words[0]}`, fontSize, bold) <= widthPx)
      line += ` ${words.shift()}`;
    lines.push(shorten(line, widthPx, fontSize, bold));
  }
  if (words.length > 0) lines.push(shorten(words.join(' '), widthPx, fontSize, bold));
  return lines;
};
