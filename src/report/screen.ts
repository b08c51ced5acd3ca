import { type Comparison, darkMonthsWords, isNothing, monthInFull } from '../shared/index.ts';
import { columnsOf, hanging, shorten, wrap } from './columns.ts';
import { costLack } from './cost-columns.ts';
import { downtimeSentences } from './downtime-words.ts';
import { gainSentences } from './gain-words.ts';
import { formatDaily, formatNumber, formatPlace } from './numbers.ts';
import { capitalised, oneLine } from './plain-text.ts';
import { tableLines, tableNotes } from './screen-table.ts';
import { stowSentences } from './stow-words.ts';
import { shadingLine } from './survey-words.ts';
import { showsWind, windDeferral } from './wind-words.ts';
import { mountById, mountNames, nameOf, ratingWords, yearWords } from './words.ts';

export interface ScreenOptions {
  /** Where the memo lies, as the user would type it; null or absent: no report was written. */
  readonly reportPath?: string | null;
  /** What `trackworth weather` can be given to see more of the year, as the user would type it; absent: the source. */
  readonly weatherArgument?: string;
  /** Terminal columns. */
  readonly width?: 100;
}

const INDENT = 16;
const TITLE_COLUMNS = 48;
/** A screen has room for so many paragraphs of one sort; the memo has them all. */
const MOST_NOT_COUNTED = 4;
const MOST_DOUBTS = 2;
const MOST_DOWNTIMES = 3;
const MOST_STOWS = 2;
const MOST_GAINS = 3;
const MOST_SWITCH_POINTS = 3;
/** The design's limit for a clock that a recommendation can stand on. */
const CLOCK_LIMIT_MIN = 20;

export const clockWords = (shiftMin: number | null): string => {
  if (shiftMin === null) return 'clock cannot be checked';
  const minutes = Math.round(Math.abs(shiftMin));
  if (minutes < CLOCK_LIMIT_MIN) return 'clock fits the sun';
  return `clock ${minutes} min ${shiftMin > 0 ? 'behind' : 'ahead of'} the sun`;
};

/** Facts that share a line while they fit it. */
const flowed = (facts: readonly string[], width: number): string[] => {
  const lines: string[] = [];
  for (const fact of facts.map((text) => shorten(text, width))) {
    const last = lines.at(-1);
    if (last !== undefined && columnsOf(last) + 3 + columnsOf(fact) <= width)
      lines[lines.length - 1] = `${last}   ${fact}`;
    else lines.push(fact);
  }
  return lines;
};

/** The last part of a path. */
const fileName = (path: string): string => oneLine(path.split(/[/\\]/).at(-1) ?? path);

const placeLines = (c: Comparison, width: number): string[] =>
  flowed(
    [
      `${shorten(oneLine(c.title), TITLE_COLUMNS)}  ${formatPlace(c.site.latitude_deg, c.site.longitude_deg)}`,
      ratingWords(c),
      `${yearWords(c.weather.format)} ${shorten(fileName(c.weather.source), 40)}, ${clockWords(c.weather.time_shift_min)}`,
    ],
    width,
  );

/** The choice, what each other mount gains and costs, and what would reverse the choice. */
const answerLines = (c: Comparison, width: number): string[] =>
  [
    c.advice.headline,
    ...gainSentences(c).slice(0, MOST_GAINS),
    ...c.advice.switch_points.slice(0, MOST_SWITCH_POINTS),
  ].flatMap((text) => wrap(capitalised(oneLine(text), mountNames(c)), width));

/** What the month that is worst for the chosen mount (else the reference) could give at its best fixed tilt. */
const monthLine = (c: Comparison, width: number): string[] => {
  const { month } = mountById(c, c.advice.choice ?? c.reference_id).worst_month;
  const plane = c.tilted_for_month.find((entry) => entry.month === month);
  const dark = darkMonthsWords(c);
  if (dark !== null && (!plane || isNothing(plane.kwh_per_kw_day))) return hanging('', dark, 2, width);
  if (!plane) return [];
  const text =
    `a fixed plane tilted for ${monthInFull(month)} (${formatNumber(plane.tilt_deg)}°) would give ` +
    `${formatDaily(plane.kwh_per_kw_day)} in that month`;
  return hanging('', text, 2, width);
};

/** The classic objection, answered for every tracker. */
const insteadLines = (c: Comparison, width: number): string[] => {
  const { same_energy } = c.comparisons;
  return same_energy.flatMap((answer, i) => {
    const tracker = nameOf(c, mountById(c, answer.tracker_id));
    return [
      ...(i === 0 ? [''] : []),
      shorten(`Instead of ${tracker}`, width),
      ...hanging('  same energy', oneLine(answer.text), INDENT, width),
    ];
  });
};

/** Blocks and warnings, save those that the headline already tells. */
const findingLines = (c: Comparison, width: number): string[] =>
  c.weather.findings
    .filter(({ severity, text }) => severity !== 'note' && !c.advice.headline.includes(text))
    .sort((a, b) => Number(b.severity === 'block') - Number(a.severity === 'block'))
    .flatMap(({ severity, text, fix }) =>
      hanging(severity === 'block' ? 'BLOCKED' : 'Warning', oneLine(`${text} ${fix}`), INDENT, width),
    );

/** Paragraphs under one name, the first few, and how many the memo adds. */
const namedLines = (name: string, texts: readonly string[], most: number, width: number): string[] => {
  const shown = texts.slice(0, most);
  const left = texts.length - shown.length;
  const all = left > 0 ? [...shown, `and ${left} more, in the memo and in --json`] : shown;
  return all.flatMap((text, i) => hanging(i === 0 ? name : '', oneLine(text), INDENT, width));
};

/** A file name as it may be pasted into a shell. */
const quoted = (file: string): string =>
  /^[\w./\\:-]+$/.test(file) && !file.startsWith('-') ? file : `'${file.replaceAll("'", "'\\''")}'`;

const closingLines = (reportPath: string | null, weatherArgument: string, width: number): string[] => [
  ...(reportPath === null ? [] : hanging('Report', oneLine(reportPath), INDENT, width)),
  ...hanging('Next', `trackworth weather ${quoted(oneLine(weatherArgument))}`, INDENT, width),
];

/**
 * The first screen of `compare`: the answer, the table, what it does not count and where the memo lies. No line is
 * wider than `width` terminal columns; long names end in an ellipsis. Ends with a line end.
 */
export const screenTable = (
  c: Comparison,
  { reportPath = null, weatherArgument = c.weather.source, width = 100 }: ScreenOptions = {},
): string => {
  const lack = costLack(c);
  const findings = findingLines(c, width);
  const shading = shadingLine(c);
  const lines = [
    ...placeLines(c, width),
    '',
    ...answerLines(c, width),
    ...(findings.length > 0 ? ['', ...findings] : []),
    '',
    ...tableLines(c, width),
    ...monthLine(c, width),
    ...(shading === null ? [] : hanging('', shading, 2, width)),
    ...tableNotes(c).flatMap((note) => hanging('', note, 2, width)),
    ...insteadLines(c, width),
    '',
    ...(lack === null ? [] : hanging('Costs', lack, INDENT, width)),
    ...namedLines('Stow', stowSentences(c), MOST_STOWS, width),
    ...namedLines('Downtime', downtimeSentences(c), MOST_DOWNTIMES, width),
    ...namedLines(
      'Not counted',
      c.not_counted.map(({ what, effect }) => (effect ? `${what}: ${effect}` : what)),
      MOST_NOT_COUNTED,
      width,
    ),
    ...namedLines('Doubt', c.advice.doubts, MOST_DOUBTS, width),
    ...(showsWind(c) ? hanging('Wind', oneLine(windDeferral(c)), INDENT, width) : []),
    ...closingLines(reportPath, weatherArgument, width),
  ];
  return `${lines.map((line) => shorten(line.trimEnd(), width)).join('\n')}\n`;
};
