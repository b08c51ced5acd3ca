import type { AdviceInput, AdviceMount } from './input.ts';
import { isLoneMast, rowsDiffer } from './leads.ts';
import { notHeldAgainst } from './programme.ts';
import { type Ranking, unrankedWords } from './ranking.ts';
import { isTracker, listWords, nameOf, percent } from './words.ts';

const skySpread = (m: AdviceMount, reference: AdviceMount): string => {
  const by = m.gain_by_sky;
  return (
    `Sky models: the gain of ${nameOf(m)} over ${nameOf(reference)} is ${percent(by.perez)} by Perez, ` +
    `${percent(by['hay-davies'])} by Hay-Davies, ${percent(by.reindl)} by Reindl; the isotropic sky gives ` +
    `${percent(by.isotropic)}, a lower bound only.`
  );
};

const aboutWeather = (input: AdviceInput): string[] => [
  ...(input.globalOnly
    ? [
        'Beam and diffuse light were split from global light by a published correlation, which is right on average ' +
          'and not hour by hour; a tracker lives on beam light, so its gain is less sure than the figures look.',
      ]
    : []),
  ...(input.skyModel === 'isotropic'
    ? ['The study uses the isotropic sky, which undervalues every tilted plane and trackers most.']
    : []),
  ...input.findings
    .filter((finding) => finding.severity === 'warning')
    .map((finding) => `${finding.text} ${finding.fix}`.trim()),
  'A typical year is not a bad year: it holds neither the darkest season nor the storm that an array meets in its life.',
];

const aboutMount = (m: AdviceMount): string[] => [
  ...m.limits
    .filter((limit) => limit.status === 'not_checked' || limit.status === 'within_reading_error')
    .map((limit) => `Limit of ${nameOf(m)}: ${limit.name} ${limit.detail}.`),
  ...(isLoneMast(m)
    ? [
        `${nameOf(m)} is counted as a lone mast: several would shade each other, and the land between is not counted.`,
      ]
    : []),
  ...(m.downtime_blank ? [`Downtime of ${nameOf(m)} is blank and not counted, which flatters it.`] : []),
];

const aboutRows = (mounts: readonly AdviceMount[], reference: AdviceMount): string[] =>
  mounts
    .filter((m) => m !== reference && rowsDiffer(m, reference))
    .map(
      (m) =>
        `Rows differ: ${nameOf(m)} has ${m.rows} and ${nameOf(reference)} ${reference.rows}, so one is shaded by its ` +
        'neighbours and the other is not.',
    );

const aboutMoney = (input: AdviceInput): string[] => {
  const incomplete = input.mounts.filter((m) => m.lcoe_per_kwh !== null && m.cost_incomplete).map(nameOf);
  return incomplete.length === 0
    ? []
    : [
        `The cost per kWh of ${listWords(incomplete)} is from what is known: blank upkeep is not zero upkeep.`,
      ];
};

const aboutUnranked = (ranking: Ranking): string[] => {
  const words = unrankedWords(ranking);
  return words === null ? [] : [`${words}. What has no price might be cheaper than what is chosen.`];
};

const aboutProgramme = (mounts: readonly AdviceMount[]): string[] =>
  mounts.flatMap((m) => {
    const words = notHeldAgainst(m, mounts);
    return words === null ? [] : [`Programme: ${words}, so ${nameOf(m)} was not held against it.`];
  });

/** What the answer cannot know, each with its numbers where it has any. */
export const doubtsOf = (input: AdviceInput, reference: AdviceMount, ranking: Ranking | null): string[] => [
  ...(ranking === null ? [] : aboutUnranked(ranking)),
  ...input.mounts.filter((m) => isTracker(m) && m !== reference).map((m) => skySpread(m, reference)),
  ...(input.inverterGiven
    ? []
    : [
        'No inverter is given, so its ceiling was not counted, which usually flatters trackers: they reach it more often.',
      ]),
  ...aboutRows(input.mounts, reference),
  ...input.mounts.flatMap(aboutMount),
  ...aboutProgramme(input.mounts),
  ...aboutMoney(input),
  ...(input.notCounted.length === 0
    ? []
    : [`Not counted, because blank: ${listWords(input.notCounted.map(({ what }) => what))}.`]),
  ...aboutWeather(input),
];
