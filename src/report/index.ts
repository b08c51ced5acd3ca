export type { ChartFile, ReportExtras } from './extras.ts';
export { isReportMarker, REPORT_MARKER, reportFiles } from './files.ts';
export { resultsJson } from './json.ts';
export { memoMarkdown } from './memo.ts';
export { type ScreenOptions, screenTable } from './screen.ts';
export { monthlyCsv, mountsCsv } from './tables-csv.ts';
