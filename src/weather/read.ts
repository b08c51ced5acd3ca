import type { Finding, HourLabel } from '../shared/index.ts';
import { assemble } from './assemble.ts';
import { epw } from './epw.ts';
import { Problems } from './problems.ts';
import type { PartialPlace, RawYear, WeatherReader } from './raw-year.ts';
import type { TableColumns } from './spec.ts';
import { table } from './table.ts';
import { linesOf } from './text.ts';
import { tmy2 } from './tmy2.ts';
import { tmy3 } from './tmy3.ts';

/** Formats that are known by their content, asked in this order. */
const READERS: readonly WeatherReader[] = [epw, tmy2, tmy3];

export interface WeatherInput {
  /** File name for messages and results, as the user gave it. */
  readonly source: string;
  /** The file's content, gzipped or not. */
  readonly bytes: Uint8Array;
  /** Columns of a plain table; null or absent for the other formats. */
  readonly table?: TableColumns | null;
  /** What the printed times stand for; null or absent: the end of the hour, as in all formats here. */
  readonly label?: HourLabel | null;
  /** What the study says of the place, which overrules the file; null or absent: as the file has it. */
  readonly place?: Partial<PartialPlace>;
}

/**
 * Reads one year of hourly weather, whatever of the known formats it is in. Irradiance that the file lacks is NaN
 * in the result; `fillByClosure` turns it into an `HourlyYear` with the help of the sun.
 *
 * @throws TrackworthError of kind `input`, with all problems of the file.
 */
export const readWeather = async (input: WeatherInput): Promise<RawYear> => {
  const problems = new Problems(input.source);
  const notes: Finding[] = [];
  const lines = await linesOf(input.bytes, problems, notes);
  const columns = input.table ?? null;
  const reader = READERS.find((r) => r.recognises(lines)) ?? (columns ? table : null);
  if (!reader) return unknownFormat(lines, problems);
  if (columns && reader !== table)
    notes.push({
      code: 'table-ignored',
      severity: 'note',
      text: `The file is in ${reader.format} format, so the columns under weather.table were not used.`,
      fix: 'Remove weather.table from the study.',
    });
  const reading = await reader.read({ lines, table: columns, label: input.label ?? null, problems });
  return assemble(reading, reader.format, input.source, input.place ?? {}, problems, notes);
};

const unknownFormat = (lines: readonly string[], problems: Problems): never =>
  problems.fail({
    code: 'unknown-format',
    line: 1,
    expected: 'an EPW, TMY2 or TMY3 file',
    found: `a file that begins with ${JSON.stringify(lines[0].slice(0, 60))}, which is none of EPW, TMY2, TMY3`,
    fix: 'For a plain table name its columns under weather.table.',
  });
