import type { Comparison } from '../../shared/index.ts';
import { gainSentences } from '../gain-words.ts';
import { md, mdList, mdTable } from '../markdown.ts';
import { oneLine } from '../plain-text.ts';
import { CONFIDENCE_WORDS, mountById, nameOf } from '../words.ts';
import { blocks, section } from './section.ts';
import { sentences } from './sentences.ts';

/** Findings that withhold the recommendation, where the headline does not tell them already. */
const blocking = (c: Comparison): string =>
  mdList(
    c.weather.findings
      .filter(({ severity, text }) => severity === 'block' && !c.advice.headline.includes(text))
      .map(({ text, fix }) => `**Blocked:** ${md(`${text} ${fix}`)}`),
  );

/** The answer, its margin, and what would reverse it: the first thing that a reader meets. */
export const answer = (c: Comparison): string =>
  blocks(
    `# ${md(c.title) || 'Untitled study'}`,
    `**${md(c.advice.headline)}**`,
    blocking(c),
    sentences(c, gainSentences(c)),
    c.advice.switch_points.length > 0
      ? blocks('What would reverse it:', sentences(c, c.advice.switch_points))
      : '',
  );

/** How sure the choice is, mount by mount; nothing where there is no choice or no other mount. */
const leads = (c: Comparison): string => {
  if (c.advice.choice === null || c.advice.leads.length === 0) return '';
  const choice = md(nameOf(c, mountById(c, c.advice.choice)));
  const rows = c.advice.leads.map(({ over, confidence, why }) => [
    md(nameOf(c, mountById(c, over))),
    CONFIDENCE_WORDS[confidence],
    md(oneLine(why)),
  ]);
  return blocks(
    `How sure the lead of ${choice} is. The doubt is half the range, over the Perez, Hay-Davies and Reindl skies, of the ` +
      'difference between the two mounts. A lead is clear above twice the doubt where like is compared with like, and likely above the doubt. ' +
      (c.mounts.some((m) => m.orientation_factor_band !== null)
        ? 'Where angles were read on site with an error, what that leaves open is added in quadrature. '
        : '') +
      'The doubt holds nothing else: ' +
      'prices, upkeep, life and downtime are taken as given, and what they may move stands under "What would reverse it".',
    mdTable(['Over', 'The lead is', 'Why'], ['left', 'left', 'left'], rows),
  );
};

/** Why, with every number that the answer rests on. */
export const reasons = (c: Comparison): string =>
  section('Reasons', sentences(c, c.advice.reasons), leads(c));
