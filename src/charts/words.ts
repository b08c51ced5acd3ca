import { compassWords, type MountResult, wrap360 } from '../shared/index.ts';
import { percentSize, whole } from './numbers.ts';
import { oneLine, shorten } from './text.ts';

/** Names longer than this (pixels at size 12) are shortened within a sentence. */
const NAME_WIDTH = 210;

/** A mount's label as one drawable line; its id where the label is blank. */
export const labelOf = (mount: MountResult): string => oneLine(mount.label) || oneLine(mount.id) || 'mount';

/** A mount within a sentence, as its user calls it. */
export const named = (mount: MountResult): string => shorten(labelOf(mount), NAME_WIDTH, 12);

/** A capital for a sentence that begins with a plain word; one that begins with one of `names` is left as it is. */
export const sentence = (text: string, names: readonly string[] = []): string =>
  /^[a-z][a-z -]/.test(text) && !names.some((name) => text.startsWith(`${name} `))
    ? text[0].toUpperCase() + text.slice(1)
    : text;

/** `a`, `a and b`, `a, b and c`. */
export const listed = (items: readonly string[]): string =>
  items.length < 2 ? items.join('') : `${items.slice(0, -1).join(', ')} and ${items[items.length - 1]}`;

/** `12 % more light than`, `7.4 % less light than`, `as much light as`; null where there is nothing to compare with. */
export const moreThan = (value: number, other: number, what: string): string | null => {
  if (!(other > 0)) return null;
  const ratio = value / other - 1;
  if (Math.abs(ratio) < 0.0005) return `as much ${what} as`;
  return `${percentSize(ratio)} ${ratio > 0 ? 'more' : 'less'} ${what} than`;
};

/** `34° tilt facing 186° (south)`; a plane that lies flat faces nowhere. */
export const orientationWords = (tiltDeg: number, azimuthDeg: number): string =>
  tiltDeg < 0.5
    ? 'lying flat'
    : `${whole(tiltDeg)}° tilt facing ${whole(wrap360(Math.round(azimuthDeg)))}° (${compassWords(azimuthDeg)})`;

export const referenceOf = (mounts: readonly MountResult[], referenceId: string): MountResult =>
  mounts.find((mount) => mount.id === referenceId) ?? mounts[0];

/** The first of those with the highest score. */
export const highest = <T>(items: readonly T[], score: (item: T) => number): T =>
  items.reduce((best, item) => (score(item) > score(best) ? item : best));

/** A copy from the highest score to the lowest, equal ones in their old order. */
export const ranked = <T>(items: readonly T[], score: (item: T) => number): T[] =>
  [...items].sort((a, b) => score(b) - score(a));
