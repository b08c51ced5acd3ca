/**
 * A plain table: one header line, one row an hour, columns named (and their units given) in the study. The
 * delimiter (comma, semicolon, tab, blanks) and a decimal comma are found out.
 */
import type { Finding } from '../shared/index.ts';
import { type Cells, cutCells } from './cells.ts';
import { readNumbers } from './columns.ts';
import type { Problems } from './problems.ts';
import type { ColumnName, ReaderInput, Reading, WeatherReader } from './raw-year.ts';
import type { TableColumns } from './spec.ts';
import { looksLikeDate } from './table-dates.ts';
import { checkNames, namedColumns, type TableLayout, tableLayout } from './table-layout.ts';
import { tableTimes } from './table-times.ts';
import { unitConverter } from './table-units.ts';

/** Signs for missing that are common in tables; none of them is a possible value, in any unit that is read here. */
const MISSING_CODES = new Set([-99, -99.9, -999, -999.9, -9900, -9999, -99999, 9999, 99999]);
const QUANTITIES = ['ghi', 'dni', 'dhi', 'temperature', 'wind'] as const;

const readTable = async ({ lines, table, label: wantedLabel, problems }: ReaderInput): Promise<Reading> => {
  const columns = table as TableColumns;
  const layout = tableLayout(lines, columns);
  checkNames(layout, columns, problems);
  const converters = QUANTITIES.map((q) => (columns[q] ? unitConverter(q, columns[q], problems) : undefined));
  problems.throwIfAny();
  const cells = await bodyCells(lines, layout, columns, problems);
  const label = wantedLabel ?? 'end';
  const { offsetMin, notes: timeNotes, ...times } = tableTimes(cells, columns.time.name, label, problems);
  const names = namedColumns(columns);
  const decimalComma = hasDecimalComma(cells, names.length);
  const codes = { count: 0 };
  const missing = (value: number): boolean => MISSING_CODES.has(value) && ++codes.count > 0;
  const read = (quantity: (typeof QUANTITIES)[number]): Float64Array | null => {
    const slot = names.findIndex((n) => n.quantity === quantity);
    if (slot < 0) return null;
    const convert = converters[QUANTITIES.indexOf(quantity)];
    return readNumbers(cells, slot, { name: names[slot].name, missing, convert, decimalComma }, problems);
  };
  const values: Record<ColumnName, Float64Array | null> = {
    ghi: read('ghi'),
    dni: read('dni'),
    dhi: read('dhi'),
    temperature: read('temperature'),
    wind: read('wind'),
    albedo: null,
  };
  return {
    station: '',
    place: { latitudeDeg: null, longitudeDeg: null, elevationM: null, utcOffsetH: null },
    placeLine: undefined,
    rows: { count: cells.count, line: cells.line, ...times, columns: values },
    label,
    offsetMin,
    begins: 'any hour',
    notes: [...timeNotes, ...notesOn(codes.count, decimalComma)],
  };
};

const bodyCells = (
  lines: readonly string[],
  layout: TableLayout,
  columns: TableColumns,
  problems: Problems,
): Promise<Cells> => {
  const { header, headerAt } = layout;
  const wanted = namedColumns(columns).map(({ name }) => header.indexOf(name));
  const from = headerAt + 1;
  if (layout.delimiter !== ' ')
    return cutCells({ lines, from, delimiter: layout.delimiter, wanted, width: header.length }, problems);
  return cutCells(
    { lines: tabbed(lines, from, wanted[0]), from, delimiter: '\t', wanted, width: header.length },
    problems,
  );
};

/** Blank-separated rows with tabs in place of the blanks, but for the one between date and time. */
const tabbed = (lines: readonly string[], from: number, timeColumn: number): string[] =>
  lines.map((line, i) => {
    if (i < from) return line;
    const cells = line.trim().split(/\s+/);
    if (looksLikeDate(cells[timeColumn] ?? '') && /^\d+:\d/.test(cells[timeColumn + 1] ?? ''))
      cells.splice(timeColumn, 2, `${cells[timeColumn]} ${cells[timeColumn + 1]}`);
    return cells.join('\t');
  });

/** A decimal comma shows in cells such as 1,5. A file that has 1.5 as well fails at the first cell with a comma. */
const hasDecimalComma = (cells: Cells, columns: number): boolean => {
  let commas = false;
  for (let slot = 1; slot < columns; slot++)
    for (let row = 0; row < cells.count; row++) {
      const cell = cells.cell(slot, row);
      if (cell.includes('.')) return false;
      if (cell.includes(',')) commas = true;
    }
  return commas;
};

const notesOn = (missingCodes: number, decimalComma: boolean): Finding[] => {
  const notes: Finding[] = [];
  if (decimalComma)
    notes.push({
      code: 'decimal-comma',
      severity: 'note',
      text: 'Numbers were read with a decimal comma.',
      fix: '',
    });
  if (missingCodes > 0)
    notes.push({
      code: 'missing-codes',
      severity: 'note',
      text: `${missingCodes} cells hold a sign for missing (-999, 9999 or the like) and count as blank.`,
      fix: '',
    });
  return notes;
};

export const table: WeatherReader = {
  format: 'table',
  recognises: () => true,
  read: readTable,
};
