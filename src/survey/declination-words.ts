import { refuse, shown } from './refuse.ts';
import { degreesText, plain } from './words.ts';

/** `16 E`, `13 W`, `0 E`; two decimals. */
export const declinationShort = (declinationDeg: number): string =>
  `${plain(Math.abs(declinationDeg))} ${Number(declinationDeg.toFixed(2)) < 0 ? 'W' : 'E'}`;

/** `16.1 degrees east`, `13 degrees west`. */
export const declinationWords = (declinationDeg: number): string => {
  const size = degreesText(Math.abs(declinationDeg));
  if (size === '0 degrees') return size;
  return `${size} ${declinationDeg < 0 ? 'west' : 'east'}`;
};

/** `0.11 degrees a year toward west`, or `no change to speak of`. */
export const yearlyChangeWords = (perYearDeg: number): string => {
  const size = plain(Math.abs(perYearDeg));
  return size === '0'
    ? 'no change to speak of'
    : `${size} degrees a year toward ${perYearDeg < 0 ? 'west' : 'east'}`;
};

const NUMBER = String.raw`\d+(?:\.\d*)?|\.\d+`;
const DECLINATION = new RegExp(
  String.raw`^(${NUMBER})\s*(?:°|º|deg(?:rees?)?)?\s*(?:(${NUMBER})\s*(?:['’′]|min(?:utes?)?)\s*)?(E|W|east|west)(?:[\s,(]+((?:19|20)\d\d)\)?)?$`,
  'i',
);
const BARE = new RegExp(`^[+-]?(?:${NUMBER})$`);

/** A declination entered by hand, with the year that its map prints beside it. */
export interface MapDeclination {
  /** East positive. */
  readonly declinationDeg: number;
  /** Null where none is given. */
  readonly year: number | null;
}

/**
 * A declination as maps print it, with its side and perhaps its year: `16 E`, `16.5° E`, `16°30' E`, `13W`, `13 west`,
 * `16 E 1998`, `16 E (1998)`. Degrees, 0 to 180 either way. Refuses a bare number (code `wrong-declination`): a lost
 * sign doubles the error.
 */
export const parseMapDeclination = (raw: unknown): MapDeclination => {
  const text = typeof raw === 'string' ? raw.replace(/\s+/g, ' ').trim() : '';
  const parts = DECLINATION.exec(text);
  const minutes = Number(parts?.[2] ?? 0);
  const size = Number(parts?.[1] ?? Number.NaN) + minutes / 60;
  if (parts && minutes < 60 && size <= 180)
    return {
      declinationDeg: /^w/i.test(parts[3]) && size > 0 ? -size : size,
      year: parts[4] ? Number(parts[4]) : null,
    };
  return refuse({
    code: 'wrong-declination',
    expected: 'a declination from 0 to 180 degrees with its side, E or W',
    found: shown(raw),
    fix: fixFor(typeof raw === 'number' ? String(raw) : text),
  });
};

/** The same without its year: degrees, east positive. */
export const parseDeclination = (raw: unknown): number => parseMapDeclination(raw).declinationDeg;

const fixFor = (text: string): string => {
  if (!BARE.test(text) || Math.abs(Number(text)) > 180) return 'Write for example 16 E or 13 W.';
  const size = text.replace(/^[+-]/, '');
  return `Write ${size} E or ${size} W: a sign alone is read both ways.`;
};
