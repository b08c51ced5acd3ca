import type { Cells } from './cells.ts';
import { notANumber, parseCell } from './numbers.ts';
import type { Problems } from './problems.ts';

/** How one column of numbers is read. */
export interface NumberColumn {
  /** Name for error messages, as the file or format has it. */
  readonly name: string;
  /** Whether a value is the format's sign for missing. */
  readonly missing: (value: number) => boolean;
  /** From the file's unit to trackworth's. */
  readonly convert?: ((value: number) => number) | undefined;
  /** The file writes 1,5 for one and a half. */
  readonly decimalComma?: boolean | undefined;
}

/** Reads one column of cells into numbers; missing is NaN. Text in place of a number is reported with its line. */
export const readNumbers = (
  cells: Cells,
  slot: number,
  column: NumberColumn,
  problems: Problems,
): Float64Array => {
  const out = new Float64Array(cells.count).fill(Number.NaN);
  const { missing, convert } = column;
  for (let row = 0; row < cells.count; row++) {
    if (cells.faulty[row]) continue;
    const cell = cells.cell(slot, row);
    const plain = column.decimalComma ? cell.replace(',', '.') : cell;
    const value =
      parseCell(plain) ?? notANumber(cell, { line: cells.line[row], field: column.name }, problems);
    if (!Number.isNaN(value) && !missing(value)) out[row] = convert ? convert(value) : value;
  }
  return out;
};
