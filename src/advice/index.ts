export * from './advise.ts';
export * from './cautions.ts';
export type * from './input.ts';
export { confidenceOf, DOUBT_SKIES, doubtBetween, isLoneMast, rowsDiffer } from './leads.ts';
export { type RankingBasis, rankingBasis } from './ranking.ts';
