import { inWords } from '../cost/index.ts';
import type { AdviceMount } from './input.ts';
import { doubtWords, type Lead, turnsOnRate } from './leads.ts';
import { notHeldAgainst } from './programme.ts';
import { onEnergyAlone, type Ranking, unrankedWords } from './ranking.ts';
import { winnersWords } from './rates.ts';
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

/** Why nothing is ranked: one mount is left. */
const onlyOne = ({ order: [chosen], unranked }: Ranking, mounts: readonly AdviceMount[]): string => {
  const someExcluded = mounts.length > 1 + unranked.length;
  const exempt = someExcluded ? notHeldAgainst(chosen, mounts) : null;
  const keeps = `keeps its limits${exempt === null ? '' : ` (${exempt})`}`;
  const has = 'a cost per kWh';
  const only =
    unranked.length > 0
      ? `the only mount that ${someExcluded ? `${keeps} and has ${has}` : `has ${has}`}`
      : someExcluded
        ? `the only mount that ${keeps}`
        : 'the only mount compared';
  return `ONLY ${nameOf(chosen)}: ${describeMount(chosen)}. It is ${only}, so nothing is ranked`;
};

/** Why the nearest of the others is too close. */
const closeness = (chosen: AdviceMount, other: AdviceMount, lead: Lead, ranking: Ranking): string => {
  if (turnsOnRate(chosen, other, ranking)) {
    return `It turns on the discount rate, which is not given: the cheaper one is ${winnersWords([chosen, other])}`;
  }
  return lead.lead === 0
    ? `${nameOf(chosen)} and ${nameOf(other)} are equal in ${ranking.metric.words}`
    : `${nameOf(chosen)} is ahead of ${nameOf(other)} by ${inWords(lead.lead)} ${lead.unit}, within ` +
        doubtWords(chosen, other, lead.doubt);
};

const rankedHeadline = (ranking: Ranking, leads: readonly Lead[]): string => {
  const [chosen] = ranking.order;
  const mountOf = (id: string): AdviceMount => ranking.order.find((m) => m.id === id) as AdviceMount;
  const names = (id: string): string => nameOf(mountOf(id));
  const onEnergy = onEnergyAlone(ranking) ? ' on energy alone, costs not weighed' : '';
  const close = leads.filter((lead) => lead.confidence === 'too_close');
  const surer = leadWords(leads, names);
  if (close.length === 0) {
    return `CHOOSE ${nameOf(chosen)}${onEnergy}: ${describeMount(chosen)}. Lead: ${surer}`;
  }
  const [nearest] = close;
  const both = listWords([nameOf(chosen), ...close.map((lead) => names(lead.over))]);
  const why = closeness(chosen, mountOf(nearest.over), nearest, ranking);
  const rest = surer === '' ? '' : `. Lead of ${nameOf(chosen)}: ${surer}`;
  return `TOO CLOSE TO CALL${onEnergy}: ${both}. ${why}${rest}`;
};

/** The answer in a few sentences, no surer than the least sure lead; `mounts` are all that the study compares. */
export const headlineOf = (
  ranking: Ranking,
  leads: readonly Lead[],
  mounts: readonly AdviceMount[],
): string => {
  const answer = leads.length === 0 ? onlyOne(ranking, mounts) : rankedHeadline(ranking, leads);
  const unranked = unrankedWords(ranking);
  return unranked === null ? answer : `${answer}. ${unranked}`;
};
