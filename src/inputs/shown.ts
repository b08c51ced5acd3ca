const LONGEST = 60;
/** What could drive a terminal, break a line or turn its direction. */
// biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is looked for
const CONTROLS = /[\u0000-\u001f\u007f-\u009f\u2028\u2029\u202a-\u202e\u2066-\u2069]/g;

/** Control characters as \\u001b, and no more than `longest` characters. */
export const tame = (text: string, longest: number): string => {
  const cut = text.length > longest ? `${text.slice(0, longest)}...` : text;
  return cut.replace(CONTROLS, (c) => `\\u${c.charCodeAt(0).toString(16).padStart(4, '0')}`);
};

/** Text in quotes on one line, cut to a length that a terminal can show. */
export const shown = (text: string): string => {
  const cut = text.length > LONGEST ? `${text.slice(0, LONGEST)}...` : text;
  return tame(JSON.stringify(cut), Number.POSITIVE_INFINITY);
};

/** A raw value in a few words, for `found`. */
export const found = (raw: unknown): string => {
  if (raw === undefined || raw === null) return 'nothing';
  if (typeof raw === 'string') return raw.trim() === '' ? 'an empty text' : shown(raw);
  if (typeof raw === 'number') return Number.isNaN(raw) ? 'no number (.nan)' : String(raw);
  if (Array.isArray(raw)) return raw.length === 0 ? 'an empty list' : `a list of ${raw.length}`;
  return typeof raw === 'object' ? 'a group of keys' : String(raw);
};
