import type { Comparison } from '../shared/index.ts';
import type { ReportExtras } from './extras.ts';
import { resultsJson } from './json.ts';
import { memoMarkdown } from './memo.ts';
import { monthlyCsv, mountsCsv } from './tables-csv.ts';

/** The file by which trackworth knows a folder that it wrote, and may replace whole. */
export const REPORT_MARKER = '.trackworth';
const MARKER_FIRST_LINE = 'trackworth report folder';

/** True where the text of a folder's marker file is one that trackworth wrote. */
export const isReportMarker = (text: string): boolean => text.split(/\r?\n/, 1)[0] === MARKER_FIRST_LINE;

const markerText = (c: Comparison, version: string): string =>
  `${MARKER_FIRST_LINE}\n${c.schema}\ntrackworth ${version}\nThe next report replaces this folder whole: keep nothing of your own in it.\n`;

/** The report folder, path → text: memo, results, data, the caller's charts, and the marker. */
export const reportFiles = (c: Comparison, extras: ReportExtras): Map<string, string> =>
  new Map([
    [REPORT_MARKER, markerText(c, extras.version)],
    ['memo.md', memoMarkdown(c, extras)],
    ['results.json', resultsJson(c)],
    ['data/mounts.csv', mountsCsv(c)],
    ['data/monthly.csv', monthlyCsv(c)],
    ...(extras.files ?? []),
  ]);
