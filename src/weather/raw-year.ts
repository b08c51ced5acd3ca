import type { Finding, HourLabel, HourlyYear, Place, WeatherFormat } from '../shared/index.ts';
import type { Problems } from './problems.ts';
import type { TableColumns } from './spec.ts';

/** The columns that trackworth takes from a weather file. */
export type ColumnName = 'ghi' | 'dni' | 'dhi' | 'temperature' | 'wind' | 'albedo';

/**
 * A year as the file has it: shaped like an `HourlyYear`, but missing irradiance is NaN, and nothing is derived
 * yet, which needs the sun (`fillByClosure`). A component without a column is NaN throughout, its origin `missing`.
 */
export interface RawYear extends HourlyYear {
  /** Line of the file (1-based) that each hour stands on. */
  readonly line: Int32Array;
}

/** The rows of a file in the file's order, already in W/m2, degrees C, m/s and 0..1; NaN is missing. */
export interface Rows {
  readonly count: number;
  /** 1-based line of each row. */
  readonly line: Int32Array;
  /** Hour of the year 0..8759 that each row stands for; see `UNKNOWN_HOUR` and `LEAP_HOUR`. */
  readonly hour: Int32Array;
  /** Calendar year printed on each row. */
  readonly year: Int16Array;
  /** Null where the file has no such column. */
  readonly columns: Readonly<Record<ColumnName, Float64Array | null>>;
}

/** The row's time could not be read (and that has been reported). */
export const UNKNOWN_HOUR = -1;
/** The row stands for an hour of 29 February. */
export const LEAP_HOUR = -2;

/** What a file says of its place; null where it is silent. */
export type PartialPlace = { readonly [K in keyof Place]: Place[K] | null };

export interface ReaderInput {
  readonly lines: readonly string[];
  /** Columns of a plain table, from the study. */
  readonly table: TableColumns | null;
  /** What the study says the printed times stand for; null: as the format has it. */
  readonly label: HourLabel | null;
  readonly problems: Problems;
}

/** What one reader makes of a file; the common part (order of hours, place, gaps) comes after it. */
export interface Reading {
  readonly station: string;
  readonly place: PartialPlace;
  /** The line that states the place, for error messages; undefined where no line does. */
  readonly placeLine: number | undefined;
  readonly rows: Rows;
  readonly label: HourLabel;
  readonly offsetMin: number;
  /** A typical year runs from 1 January; a table may begin in any hour and wrap round. */
  readonly begins: 'first hour' | 'any hour';
  readonly notes: readonly Finding[];
}

/** One weather format. `recognises` looks at the first lines only and must not throw. */
export interface WeatherReader {
  readonly format: WeatherFormat;
  recognises(lines: readonly string[]): boolean;
  read(input: ReaderInput): Reading | Promise<Reading>;
}
