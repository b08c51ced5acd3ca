import type { Problems } from './problems.ts';

/**
 * A number written in a weather file: blank is missing (NaN), anything but a plain decimal number is `null`.
 * `Number` alone would also take hexadecimal, `Infinity` and blanks.
 */
export const parseCell = (cell: string): number | null => {
  const value = Number(cell);
  if (value === 0 && cell.trim() === '') return Number.NaN;
  if (!Number.isFinite(value)) return null;
  return /^\s*[-+]?0[xbo]/i.test(cell) ? null : value;
};

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
