import { inWords } from '../cost/index.ts';
import type { AdviceResult, Confidence, SkyModel } from '../shared/index.ts';
import type { AdviceMount } from './input.ts';
import type { Metric } from './metric.ts';
import { onEnergyAlone, type Ranking } from './ranking.ts';
import { holdsAtAllRates, ROUNDING, ratesOf, winnersWords } from './rates.ts';
import { isTracker, listWords, nameOf } from './words.ts';

export type Lead = AdviceResult['leads'][number];

/** The skies whose spread is the doubt. The isotropic sky is biased low and only ever shown as a lower bound. */
export const DOUBT_SKIES: readonly SkyModel[] = ['perez', 'hay-davies', 'reindl'];

/** Half the range, over the three skies, of the difference between two mounts in the metric; the same either way round. */
const skyDoubt = (a: AdviceMount, b: AdviceMount, metric: Metric): number => {
  const differences = DOUBT_SKIES.map(
    (sky) => (metric.underSky(a, sky) ?? Number.NaN) - (metric.underSky(b, sky) ?? Number.NaN),
  );
  return (Math.max(...differences) - Math.min(...differences)) / 2;
};

/** What the reading errors of a mount's angles leave open, in the metric, which goes with its light or with one over it. */
const readingDoubt = (m: AdviceMount, metric: Metric): number =>
  m.reading_error * Math.abs(metric.of(m) ?? 0);

/**
 * How far the difference between two mounts may be out: the spread of the sky models and, where angles were read on site
 * with an error, what that leaves open. They have nothing to do with each other, so they add in quadrature (JCGM
 * 100:2008, eq. 10). The same either way round.
 */
export const doubtBetween = (a: AdviceMount, b: AdviceMount, metric: Metric): number =>
  Math.hypot(skyDoubt(a, b, metric), readingDoubt(a, metric), readingDoubt(b, metric));

/** `clear` above twice the doubt, `likely` above the doubt, else `too_close`. */
export const confidenceOf = (lead: number, doubt: number): Confidence =>
  lead > 2 * doubt ? 'clear' : lead > doubt ? 'likely' : 'too_close';

const onGround = (m: AdviceMount): boolean => m.kind !== 'roof-plane';
export const isLoneMast = (m: AdviceMount): boolean =>
  (m.kind === 'dual-axis' || m.kind === 'turntable') && m.gcr === null;

/** Between ground mounts only one of which has rows; a lone mast never has any. */
export const rowsDiffer = (a: AdviceMount, b: AdviceMount): boolean =>
  onGround(a) && onGround(b) && !isLoneMast(a) && !isLoneMast(b) && (a.gcr === null) !== (b.gcr === null);

/** Whether the cheaper of the two is another one at another rate, where the study gives none. */
export const turnsOnRate = (chosen: AdviceMount, other: AdviceMount, ranking: Ranking): boolean =>
  ranking.withoutRate && !holdsAtAllRates([chosen, other]);

const rateClause = (chosen: AdviceMount, other: AdviceMount): string =>
  holdsAtAllRates([chosen, other])
    ? `no discount rate is given; the order holds at ${ratesOf([chosen, other])}`
    : `no discount rate is given, and the cheaper one is ${winnersWords([chosen, other])}`;

/** Why a lead is `likely` at most, whatever its size: one clause for each like-with-like rule that is not met. */
const caps = (chosen: AdviceMount, other: AdviceMount, ranking: Ranking): string[] => {
  const clauses: string[] = [];
  if (rowsDiffer(chosen, other)) {
    clauses.push(`rows differ: ${nameOf(chosen)} has ${chosen.rows}, ${nameOf(other)} ${other.rows}`);
  }
  const incomplete = [chosen, other].filter((m) => m.cost_incomplete).map(nameOf);
  if (ranking.rankedBy === 'lowest cost per kWh' && incomplete.length > 0) {
    clauses.push(`the costs of ${incomplete.join(' and ')} are incomplete, and blank is not zero`);
  }
  if (onEnergyAlone(ranking)) clauses.push(`costs were not weighed, for lack of ${ranking.lacking}`);
  if (ranking.unranked.length > 0) {
    clauses.push(`${listWords(ranking.unranked.map(nameOf))} could not be ranked and might be cheaper`);
  }
  if (ranking.withoutRate) clauses.push(rateClause(chosen, other));
  if (isTracker(chosen) && chosen.downtime_blank) {
    clauses.push(`downtime of ${nameOf(chosen)} is blank, and blank is not zero`);
  }
  if (chosen.snow_counted !== other.snow_counted) {
    const [counted, blank] = chosen.snow_counted ? [chosen, other] : [other, chosen];
    clauses.push(`snow is counted for ${nameOf(counted)} and blank for ${nameOf(blank)}`);
  }
  return clauses;
};

/** What differs without forbidding a clear lead, so that a reader sees it. */
const remarks = (chosen: AdviceMount, other: AdviceMount): string[] => {
  if (!onGround(chosen) || !onGround(other)) return [];
  if (isLoneMast(chosen) !== isLoneMast(other)) {
    return [`${nameOf(isLoneMast(chosen) ? chosen : other)} is a lone mast without rows`];
  }
  return chosen.gcr !== null && other.gcr !== null && chosen.gcr !== other.gcr
    ? [`GCR ${chosen.gcr.toFixed(2)} against ${other.gcr.toFixed(2)}`]
    : [];
};

/** `the doubt of sky models (0.00300)`, with the reading errors where the doubt holds any. */
export const doubtWords = (a: AdviceMount, b: AdviceMount, doubt: number): string => {
  const read = [a, b].filter((m) => m.reading_error > 0);
  const reading = read.length > 0 ? ` and of the reading errors of ${listWords(read.map(nameOf))}` : '';
  return `the doubt of sky models${reading} (${inWords(doubt)})`;
};

/** Beyond twice the doubt no multiple is given: the sky models are not the only thing that may be out. */
const timesWords = (lead: number, doubt: number): string => {
  if (lead > 2 * doubt) return 'more than twice';
  return lead > doubt ? `${inWords(lead / doubt, 2)} times` : 'within';
};

const sizeWords = (
  lead: number,
  doubt: number,
  unit: string,
  [a, b]: readonly [AdviceMount, AdviceMount],
): string =>
  `the lead is ${inWords(lead)} ${unit}` +
  (doubt > 0
    ? `, ${timesWords(lead, doubt)} ${doubtWords(a, b, doubt)}`
    : ' and the sky models do not differ');

/** How far `chosen` leads `other`, how sure that is, and why. */
export const leadOver = (chosen: AdviceMount, other: AdviceMount, ranking: Ranking): Lead => {
  const { metric } = ranking;
  const [a, b] = [metric.of(chosen) ?? Number.NaN, metric.of(other) ?? Number.NaN];
  const raw = metric.lowWins ? b - a : a - b;
  const lead = Math.abs(raw) <= ROUNDING * Math.abs(b) ? 0 : raw;
  const doubt = doubtBetween(chosen, other, metric);
  const bySize = turnsOnRate(chosen, other, ranking) ? 'too_close' : confidenceOf(lead, doubt);
  const clauses = caps(chosen, other, ranking);
  return {
    over: other.id,
    confidence: bySize === 'clear' && clauses.length > 0 ? 'likely' : bySize,
    lead,
    doubt,
    unit: metric.unit,
    why: [sizeWords(lead, doubt, metric.unit, [chosen, other]), ...clauses, ...remarks(chosen, other)].join(
      '; ',
    ),
  };
};

const SURENESS: readonly Confidence[] = ['too_close', 'likely', 'clear'];

/** The least sure of all leads; null without any. */
export const leastSure = (leads: readonly Lead[]): Confidence | null =>
  SURENESS.find((confidence) => leads.some((lead) => lead.confidence === confidence)) ?? null;
