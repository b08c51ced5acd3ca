import { expect, test } from 'vitest';
import {
  isReportMarker,
  memoMarkdown,
  REPORT_MARKER,
  reportFiles,
  resultsJson,
} from '../../src/report/index.ts';
import { EXTRAS, invented } from './invented.ts';

test('the report folder holds memo, results, data, the charts that the caller adds, and the marker', () => {
  const files = reportFiles(invented(), { ...EXTRAS, files: new Map([['charts/cost.svg', '<svg/>']]) });
  expect([...files.keys()].sort()).toEqual(
    [
      REPORT_MARKER,
      'charts/cost.svg',
      'data/monthly.csv',
      'data/mounts.csv',
      'memo.md',
      'results.json',
    ].sort(),
  );
  expect(files.get('memo.md')).toBe(memoMarkdown(invented(), EXTRAS));
  expect(files.get('results.json')).toBe(resultsJson(invented()));
  expect(files.get('charts/cost.svg')).toBe('<svg/>');
});

test('the same results give the same bytes', () => {
  expect([...reportFiles(invented(), EXTRAS)]).toEqual([...reportFiles(invented(), EXTRAS)]);
});

test('trackworth knows its own marker and no other file', () => {
  const marker = reportFiles(invented(), EXTRAS).get(REPORT_MARKER)!;
  expect(isReportMarker(marker)).toBe(true);
  expect(isReportMarker(marker.replaceAll('\n', '\r\n'))).toBe(true);
  expect(isReportMarker('')).toBe(false);
  expect(isReportMarker('my notes\ntrackworth report folder')).toBe(false);
});

test('the results are not changed by writing them', () => {
  const c = invented();
  const before = structuredClone(c);
  reportFiles(c, EXTRAS);
  expect(c).toEqual(before);
});
