import { inWords } from '../cost/index.ts';
import type { AdviceMount } from './input.ts';
import type { Lead } from './leads.ts';
import type { Ranking } from './ranking.ts';
import { describeMount, listWords, nameOf } from './words.ts';

/** `CLEAR over tracker, LIKELY over roof`, surest first. */
const leadWords = (leads: readonly Lead[], names: (id: string) => string): string =>
  (['clear', 'likely'] as const)
    .map((confidence) => ({ confidence, over: leads.filter((lead) => lead.confidence === confidence) }))
    .filter(({ over }) => over.length > 0)
    .map(
      ({ confidence, over }) =>
        `${confidence.toUpperCase()} over ${listWords(over.map((l) => names(l.over)))}`,
    )
    .join(', ');

/** The answer in one or two sentences, no surer than the least sure lead. */
export const headlineOf = (ranking: Ranking, leads: readonly Lead[], someExcluded: boolean): string => {
  const [chosen] = ranking.order;
  const names = (id: string): string => nameOf(ranking.order.find((m) => m.id === id) as AdviceMount);
  const onEnergy = ranking.lacking === null ? '' : ' on energy alone, costs not weighed';
  if (leads.length === 0) {
    const only = someExcluded ? 'the only mount that keeps its limits' : 'the only mount compared';
    return `ONLY ${nameOf(chosen)}: ${describeMount(chosen)}. It is ${only}, so nothing is ranked`;
  }
  const close = leads.filter((lead) => lead.confidence === 'too_close');
  const surer = leadWords(leads, names);
  if (close.length === 0) {
    return `CHOOSE ${nameOf(chosen)}${onEnergy}: ${describeMount(chosen)}. Lead: ${surer}`;
  }
  const [nearest] = close;
  const both = listWords([nameOf(chosen), ...close.map((lead) => names(lead.over))]);
  const size =
    nearest.lead === 0
      ? `${nameOf(chosen)} and ${names(nearest.over)} are equal in ${ranking.metric.words}`
      : `${nameOf(chosen)} is ahead of ${names(nearest.over)} by ${inWords(nearest.lead)} ${nearest.unit}, ` +
        `within the doubt of ${inWords(nearest.doubt)}`;
  const rest = surer === '' ? '' : `. Lead of ${nameOf(chosen)}: ${surer}`;
  return `TOO CLOSE TO CALL${onEnergy}: ${both}. ${size}${rest}`;
};
