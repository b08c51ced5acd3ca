import type { Comparison } from '../shared/index.ts';
import type { ReportExtras } from './extras.ts';
import { answer, reasons } from './memo/answer.ts';
import { appendix, cautions, notCountedAndDoubts } from './memo/closing.ts';
import { cost, skySpread, trackerOrModules } from './memo/cost.ts';
import { energy } from './memo/energy.ts';
import { mountsCompared } from './memo/mounts.ts';
import { nextSteps } from './memo/next-steps.ts';
import { orientationAndShading } from './memo/orientation.ts';
import { overview } from './memo/overview.ts';
import { readings } from './memo/readings.ts';
import { blocks } from './memo/section.ts';
import { siteAndWeather } from './memo/site.ts';
import { wind } from './memo/wind.ts';

/** Page one holds two charts: cost and months, or the first others where one of them is lacking. */
const pageOne = ({ chartFiles }: ReportExtras) => {
  const wanted = ['cost', 'months'].flatMap((name) => chartFiles.filter((chart) => chart.name === name));
  return [...wanted, ...chartFiles.filter((chart) => !wanted.includes(chart))].slice(0, 2);
};

/**
 * The memo as Markdown, for a client and a reviewer: answer first, proof after, no date. Text from the study and the
 * weather file is inert.
 */
export const memoMarkdown = (c: Comparison, extras: ReportExtras): string => {
  const first = pageOne(extras);
  const skyline = extras.chartFiles.filter((chart) => chart.name === 'skyline' && !first.includes(chart));
  const memo = blocks(
    answer(c),
    overview(c, first),
    reasons(c),
    siteAndWeather(c),
    readings(c),
    mountsCompared(c),
    orientationAndShading(c, skyline),
    energy(c),
    wind(c),
    cost(c),
    trackerOrModules(c),
    skySpread(c),
    notCountedAndDoubts(c),
    nextSteps(c),
    cautions(c),
    appendix(
      c,
      extras,
      [...first, ...skyline].map(({ name }) => name),
    ),
  );
  return `${memo}\n`;
};
