import type { Finding } from '../shared/index.ts';

/** Gaps up to this many hours are bridged with a straight line without further ado. */
const SHORT_GAP_H = 6;
/** A column with more than this share of its hours in longer gaps is taken as absent. Both are trackworth's choice. */
const LONG_GAP_SHARE = 0.1;
/** More missing hours than this share make a warning of the note. */
const WARNING_SHARE = 0.01;

interface Gap {
  readonly first: number;
  readonly length: number;
}

/** Runs of NaN; a typical year is a ring, so a gap may run over the end of December. */
const gapsIn = (column: Float64Array): Gap[] => {
  const n = column.length;
  const gaps: Gap[] = [];
  const begin = column.findIndex((v) => !Number.isNaN(v));
  for (let i = 0; i < n; ) {
    let length = 0;
    while (i + length < n && Number.isNaN(column[(begin + i + length) % n])) length++;
    if (length > 0) gaps.push({ first: (begin + i) % n, length });
    i += length + 1;
  }
  return gaps;
};

const bridge = (column: Float64Array, { first, length }: Gap): void => {
  const n = column.length;
  const before = column[(first - 1 + n) % n];
  const after = column[(first + length) % n];
  for (let k = 0; k < length; k++)
    column[(first + k) % n] = before + ((after - before) * (k + 1)) / (length + 1);
};

/**
 * Fills the gaps (NaN) of a column such as temperature by straight lines and says so in `notes`. Returns null,
 * with a finding, for a column that is missing altogether or in long gaps for more than a tenth of the year.
 */
export const fillGaps = (
  column: Float64Array | null,
  what: string,
  code: string,
  notes: Finding[],
): Float64Array | null => {
  const missing = column ? column.reduce((n, v) => n + (Number.isNaN(v) ? 1 : 0), 0) : 0;
  if (column && missing === 0) return column;
  if (!column || missing === column.length) {
    notes.push({ code: `no-${code}`, severity: 'note', text: `The file gives no ${what}.`, fix: '' });
    return null;
  }
  const gaps = gapsIn(column);
  const inLongGaps = gaps.reduce((sum, gap) => sum + (gap.length > SHORT_GAP_H ? gap.length : 0), 0);
  const hours = missing === 1 ? '1 hour' : `${missing} hours`;
  const longest = Math.max(...gaps.map((gap) => gap.length));
  if (inLongGaps > LONG_GAP_SHARE * column.length) {
    const text = `The ${what} is missing in ${hours}, up to ${longest} in a row: the column is not used.`;
    notes.push({ code: `no-${code}`, severity: 'warning', text, fix: 'Use a file with fewer gaps.' });
    return null;
  }
  const filled = column.slice();
  for (const gap of gaps) bridge(filled, gap);
  const grave = inLongGaps > 0 || missing > WARNING_SHARE * column.length;
  notes.push({
    code: `${code}-gaps`,
    severity: grave ? 'warning' : 'note',
    text: `The ${what} was missing in ${hours} (up to ${longest} in a row) and was filled by straight lines.`,
    fix: '',
  });
  return filled;
};
