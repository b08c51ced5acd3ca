import type { Comparison } from '../../shared/index.ts';
import { md, mdList } from '../markdown.ts';
import { listed } from '../plain-text.ts';
import { showsWind } from '../wind-words.ts';
import { nameOf } from '../words.ts';
import { section } from './section.ts';

const namesWhere = (c: Comparison, test: (mount: Comparison['mounts'][number]) => boolean): string =>
  md(listed(c.mounts.filter(test).map((mount) => nameOf(c, mount))));

/** What would make the answer firmer, worked out from what these results lack. */
export const nextSteps = (c: Comparison): string => {
  const serious = c.weather.findings.filter(({ severity }) => severity !== 'note').length;
  const unpriced = namesWhere(c, (m) => m.capital === null);
  const partlyPriced = namesWhere(c, (m) => m.capital !== null && m.cost_incomplete);
  const unchecked = namesWhere(c, (m) => m.limits.some(({ status }) => status === 'not_checked'));
  const close = namesWhere(c, (m) => m.limits.some(({ status }) => status === 'within_reading_error'));
  return section(
    'Next steps',
    mdList(
      [
        serious > 0 ? 'Settle the warnings about weather file and readings above, then compare again.' : '',
        unpriced ? `Get quotes for ${unpriced}.` : '',
        partlyPriced ? `Complete the costs of ${partlyPriced}.` : '',
        c.not_counted.length > 0
          ? 'Fill in what is listed under "Not counted", the largest effect first.'
          : '',
        unchecked
          ? `Give the limits and lengths that are missing for ${unchecked}: see wind and height above.`
          : '',
        close ? `Measure again where a limit is within the reading error: ${close}.` : '',
        showsWind(c)
          ? 'Put structure, attachments, foundation and wind before a licensed engineer and the local code.'
          : '',
      ].filter((step) => step !== ''),
    ),
  );
};
