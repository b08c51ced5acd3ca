const LONGEST = 60;

/** Text in quotes on one line, control characters escaped, cut to a length that a terminal can show. */
export const shown = (text: string): string => {
  const cut = text.length > LONGEST ? `${text.slice(0, LONGEST)}...` : text;
  return JSON.stringify(cut).replace(
    /[\u007f-\u009f\u2028\u2029\u202a-\u202e\u2066-\u2069]/g,
    (c) => `\\u${c.charCodeAt(0).toString(16).padStart(4, '0')}`,
  );
};

/** A raw value in a few words, for `found`. */
export const found = (raw: unknown): string => {
  if (raw === undefined || raw === null) return 'nothing';
  if (typeof raw === 'string') return raw.trim() === '' ? 'an empty text' : shown(raw);
  if (typeof raw === 'number') return Number.isNaN(raw) ? 'no number (.nan)' : String(raw);
  if (Array.isArray(raw)) return raw.length === 0 ? 'an empty list' : `a list of ${raw.length}`;
  return typeof raw === 'object' ? 'a group of keys' : String(raw);
};
