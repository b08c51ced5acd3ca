import { editDistance } from '../shared/index.ts';
import type { Problems } from './problems.ts';
import type { TableColumns } from './spec.ts';

/** How a plain table is laid out: found from its header and first rows. */
export interface TableLayout {
  /** Index into the lines of the header. */
  readonly headerAt: number;
  readonly header: readonly string[];
  /** `,`, `;`, tab, or a blank for any run of blanks. */
  readonly delimiter: string;
}

const DELIMITERS = [';', '\t', ',', ' '];
const unquote = (cell: string): string =>
  cell
    .trim()
    .replace(/^"(.*)"$/, '$1')
    .trim();

/** Cells of a line; quotation marks around a name may hold the delimiter only in the body, where csv-parse reads them. */
const splitHeader = (line: string, delimiter: string): string[] =>
  (delimiter === ' ' ? line.trim().split(/\s+/) : line.split(delimiter)).map(unquote);

/**
 * Finds header and delimiter: the header is the first line that is neither blank nor a `#` comment, and the
 * delimiter is the one that shows most of the named columns, then most cells.
 */
export const tableLayout = (lines: readonly string[], table: TableColumns): TableLayout => {
  const headerAt = lines.findIndex((line) => line.trim() !== '' && !line.startsWith('#'));
  const names = namedColumns(table).map((c) => c.name);
  const line = lines[headerAt] ?? '';
  const score = (delimiter: string): number => {
    const header = splitHeader(line, delimiter);
    return names.filter((name) => header.includes(name)).length * 1000 + header.length;
  };
  const delimiter = DELIMITERS.reduce((best, next) => (score(next) > score(best) ? next : best));
  return { headerAt, header: splitHeader(line, delimiter), delimiter };
};

export const namedColumns = (table: TableColumns) =>
  (['time', 'ghi', 'dni', 'dhi', 'temperature', 'wind'] as const).flatMap((quantity) => {
    const column = table[quantity];
    return column ? [{ quantity, name: column.name }] : [];
  });

/** Reports columns that the study names and the table lacks, or has twice. */
export const checkNames = (layout: TableLayout, table: TableColumns, problems: Problems): void => {
  for (const { quantity, name } of namedColumns(table)) {
    const times = layout.header.filter((cell) => cell === name).length;
    if (times === 1) continue;
    problems.add({
      code: times === 0 ? 'no-such-column' : 'ambiguous-column',
      line: layout.headerAt + 1,
      field: `weather.table.${quantity}`,
      expected: times === 0 ? `a column ${JSON.stringify(name)}` : `one column ${JSON.stringify(name)}`,
      found: times === 0 ? `the columns ${nearestFirst(name, layout.header).join(', ')}` : `${times} of them`,
      fix: times === 0 ? 'Write the name as it stands in the header.' : 'Rename one of them in the file.',
    });
  }
};

const nearestFirst = (name: string, header: readonly string[]): string[] =>
  header
    .map((cell, i) => ({ cell, i, distance: editDistance(name.toLowerCase(), cell.toLowerCase()) }))
    .sort((a, b) => a.distance - b.distance || a.i - b.i)
    .map(({ cell }) => JSON.stringify(cell));
