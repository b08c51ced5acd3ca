import type { Problems } from './problems.ts';

/**
 * A number written in a weather file: blank is missing (NaN), anything but a plain decimal number is `null`.
 * `Number` alone would also take hexadecimal, `Infinity` and blanks.
 */
export const parseCell = (cell: string): number | null => {
  const value = Number(cell);
  if (value === 0 && cell.trim() === '') return Number.NaN;
  if (!Number.isFinite(value)) return null;
  return isPrefixed(cell) ? null : value;
};

/** 0x1F, 0b1, 0o7: what JavaScript takes for a number besides decimals begins, blanks aside, with 0 and a letter. */
const isPrefixed = (cell: string): boolean => {
  const text = cell.charCodeAt(0) === 48 ? cell : cell.trim();
  return text.charCodeAt(0) === 48 && text.charCodeAt(1) > 64;
};

/** 8760 as 8,760. */
export const thousands = (n: number): string => String(n).replace(/\B(?=(?:\d{3})+$)/g, ',');

/** Reports text where a number belongs, and counts the cell as missing so that reading can go on. */
export const notANumber = (
  cell: string,
  where: { line: number; column?: number | undefined; field: string },
  problems: Problems,
): number => {
  problems.add({
    code: 'not-a-number',
    ...where,
    expected: 'a number',
    found: JSON.stringify(cell.trim().slice(0, 40)),
    fix: 'Correct the value, or leave it blank where it is missing.',
  });
  return Number.NaN;
};
