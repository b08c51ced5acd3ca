import type { Comparison } from '../../shared/index.ts';
import { md, mdList, mdTable } from '../markdown.ts';
import { decimalsFor, formatNumber } from '../numbers.ts';
import { capitalised, oneLine } from '../plain-text.ts';
import { CONFIDENCE_WORDS, mountById, nameOf } from '../words.ts';
import { blocks } from './section.ts';

const inertSentences = (texts: readonly string[]) =>
  mdList(texts.map((text) => md(capitalised(oneLine(text)))));

/** Findings that withhold the recommendation, in front of everything else. */
const blocking = (c: Comparison): string =>
  mdList(
    c.weather.findings
      .filter(({ severity }) => severity === 'block')
      .map(({ text, fix }) => `**Blocked:** ${md(`${text} ${fix}`)}`),
  );

const leadTable = (c: Comparison): string => {
  if (c.advice.choice === null || c.advice.leads.length === 0) return '';
  const choice = md(nameOf(c, mountById(c, c.advice.choice)));
  const rows = c.advice.leads.map(({ over, confidence, lead, doubt, unit, why }) => [
    md(nameOf(c, mountById(c, over))),
    CONFIDENCE_WORDS[confidence],
    ...figures([lead, doubt], unit),
    md(why),
  ]);
  return blocks(
    `The lead of ${choice} over each other mount, and the doubt in it:`,
    mdTable(['Over', 'Lead is', 'Lead', 'Doubt', 'Why'], ['left', 'left', 'right', 'right', 'left'], rows),
  );
};

/** Two figures to the precision of the greater one. */
const figures = (values: readonly number[], unit: string): string[] =>
  values.map((value) => `${formatNumber(value, decimalsFor(values))} ${md(unit)}`);

/** The answer, its margin, and what would reverse it: the first thing that a reader meets. */
export const answer = (c: Comparison): string =>
  blocks(
    `# ${md(c.title) || 'Untitled study'}`,
    `**${md(c.advice.headline)}**`,
    blocking(c),
    inertSentences(c.advice.reasons),
    c.advice.switch_points.length > 0
      ? blocks('What would reverse it:', inertSentences(c.advice.switch_points))
      : '',
    leadTable(c),
  );
