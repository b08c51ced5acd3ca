/** Numbers in charts: written here and not by a locale, so that every machine draws the same bytes. */

const NARROW_GAP = '\u00A0';
const MINUS = '\u2212';

const signed = (x: number, digits: string): string => (x < 0 && /[1-9]/.test(digits) ? MINUS : '') + digits;

/** `1 792`: rounded to whole units, thousands apart. */
export const whole = (x: number): string =>
  signed(
    x,
    Math.abs(Math.round(x))
      .toString()
      .replace(/\B(?=(\d{3})+$)/g, NARROW_GAP),
  );

/** `2.90`: a fixed count of decimals. */
export const fixed = (x: number, decimals: number): string => signed(x, Math.abs(x).toFixed(decimals));

/** `18 %` from 10 % up, `7.4 %` below: the size of a fraction, its sign left to the sentence. */
export const percentSize = (fraction: number): string => {
  const size = Math.abs(fraction) * 100;
  return `${size < 9.95 ? fixed(size, 1) : whole(size)}${NARROW_GAP}%`;
};

/** `0.109`, `12.3`, `1 240`: money per kWh to a thousandth, in three significant digits where that says more or is enough. */
export const money = (x: number): string => {
  const size = Math.abs(x);
  if (size >= 100) return whole(x);
  if (size >= 0.01 && size < 1) return fixed(x, 3);
  const decimals = size === 0 ? 0 : Math.min(8, Math.max(0, 2 - Math.floor(Math.log10(size))));
  return fixed(x, decimals);
};

/** Round numbers from 0 to `top` for an axis, four to ten steps (1, 2, 2.5 or 5 times a power of ten). */
export const axisValues = (top: number): number[] => {
  const power = 10 ** Math.floor(Math.log10(top / 4));
  const step = [5, 2.5, 2, 1].find((s) => s * power <= (top / 4) * (1 + 1e-9)) ?? 1;
  return Array.from({ length: Math.floor(top / (step * power) + 1e-9) + 1 }, (_, i) =>
    forSpec(i * step * power),
  );
};

/** For data inside a spec: six significant digits, which no chart can show more of. */
export const forSpec = (x: number): number => Number(x.toPrecision(6));
