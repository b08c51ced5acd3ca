import { wrap360 } from '../shared/index.ts';
import { declinationShort } from './declination-words.ts';
import { refuse, shown } from './refuse.ts';
import { plain } from './words.ts';

/** True bearing (0 included .. 360 excluded) of a magnetic one; declination east positive. */
export const trueFromMagnetic = (magneticDeg: number, declinationDeg: number): number =>
  wrap360(magneticDeg + declinationDeg);

/** Magnetic bearing of a true one. */
export const magneticFromTrue = (trueDeg: number, declinationDeg: number): number =>
  wrap360(trueDeg - declinationDeg);

const toHundredths = (x: number): number => Number(x.toFixed(2));

/** `366 = 6`, or the number alone where it lies on the circle; 360 is shown as it is read on a dial, `360 = 0`. */
const wrapShown = (sum: number): string => {
  const wrapped = toHundredths(wrap360(sum));
  return wrapped === sum ? plain(sum) : `${plain(sum)} = ${plain(wrapped)}`;
};

/** `150 + 16 E = 166 true`, `135 - 13 W = 122 true`, `350 + 16 E = 366 = 6 true`; what is printed adds up. */
export const sumToTrue = (magneticDeg: number, declinationDeg: number): string => {
  const [reading, declination] = [toHundredths(magneticDeg), toHundredths(declinationDeg)];
  const sign = declination < 0 ? '-' : '+';
  const sum = toHundredths(reading + declination);
  return `${plain(reading)} ${sign} ${declinationShort(declination)} = ${wrapShown(sum)} true`;
};

/** `180 true - 17.5 E = 162.5 magnetic`, `180 true + 7 W = 187 magnetic`. */
export const sumToMagnetic = (trueDeg: number, declinationDeg: number): string => {
  const [bearing, declination] = [toHundredths(trueDeg), toHundredths(declinationDeg)];
  const sign = declination < 0 ? '+' : '-';
  const sum = toHundredths(bearing - declination);
  return `${plain(bearing)} true ${sign} ${declinationShort(declination)} = ${wrapShown(sum)} magnetic`;
};

const BEARING = /^(\d+(?:\.\d*)?|\.\d+) ?(?:°|º|deg|degrees?)?$/i;

/** A bearing of 0 to 360 degrees as a number or text (`150`, `150.5 deg`); refuses all else (code `wrong-bearing`). */
export const parseBearing = (raw: unknown): number => {
  const text = typeof raw === 'string' ? BEARING.exec(raw.trim()) : null;
  const value = typeof raw === 'number' ? raw : Number(text?.[1] ?? Number.NaN);
  if (value >= 0 && value <= 360) return value;
  return refuse({
    code: 'wrong-bearing',
    expected: 'a bearing from 0 to 360 degrees, clockwise from north',
    found: shown(raw),
    fix: 'Read the dial again: 90 is east, 180 south, 270 west; 10 degrees west of north is 350.',
  });
};

/** The true azimuths that two common mistakes would give. */
export interface DeclinationMistakes {
  /** The magnetic reading taken for true. */
  readonly forgottenDeg: number;
  /** Declination taken off where it is to be added, or the other way. */
  readonly reversedDeg: number;
}

/** For a true azimuth that rests on a magnetic reading; any turn (facing, ridge) is already in it and does not matter. */
export const declinationMistakes = (azimuthDeg: number, declinationDeg: number): DeclinationMistakes => ({
  forgottenDeg: wrap360(azimuthDeg - declinationDeg),
  reversedDeg: wrap360(azimuthDeg - 2 * declinationDeg),
});
