import type { AdviceResult } from '../shared/index.ts';
import { cautionsFor } from './cautions.ts';
import { doubtsOf } from './doubts.ts';
import { siftByLimits } from './hard-limits.ts';
import { headlineOf } from './headline.ts';
import type { AdviceInput, AdviceMount } from './input.ts';
import { leadOver, leastSure } from './leads.ts';
import { rank } from './ranking.ts';
import { reasonsFor } from './reasons.ts';
import { switchPoints } from './switch-points.ts';

const NO_CHOICE = { choice: null, confidence: null, leads: [], switch_points: [] };

/**
 * What to choose and how sure that is. Hard limits first, then the objective, then whether the lead is larger than
 * the doubt: half the range, over the Perez, Hay-Davies and Reindl skies, of the difference between two mounts, with the
 * reading errors of their angles where the study gives any.
 * A blocking finding withholds the choice, and so does a study in which no mount keeps its limits.
 */
export const advise = (input: AdviceInput): AdviceResult => {
  const reference = input.mounts.find((m) => m.id === input.referenceId) as AdviceMount;
  const { kept, excluded } = siftByLimits(input.mounts);
  const common = {
    cautions: cautionsFor(input.mounts.map((m) => m.kind)),
    excluded,
  };

  const blocking = input.findings.filter((finding) => finding.severity === 'block');
  if (blocking.length > 0) {
    const headline = `NO RECOMMENDATION: ${blocking.map(({ text, fix }) => `${text} ${fix}`.trim()).join(' ')}`;
    return {
      ...NO_CHOICE,
      headline,
      reasons: reasonsFor(input, reference, null),
      doubts: doubtsOf(input, reference, null),
      ...common,
    };
  }
  if (kept.length === 0) {
    const headline = `NO MOUNT KEEPS ITS LIMITS: ${excluded.map(({ id, why }) => `${id} (${why})`).join(', ')}`;
    return {
      ...NO_CHOICE,
      headline,
      reasons: reasonsFor(input, reference, null),
      doubts: doubtsOf(input, reference, null),
      ...common,
    };
  }

  const ranking = rank(kept, input);
  const [chosen, ...others] = ranking.order;
  const leads = others.map((other) => leadOver(chosen, other, ranking));
  return {
    choice: chosen.id,
    confidence: leastSure(leads),
    headline: headlineOf(ranking, leads, input.mounts),
    leads,
    reasons: reasonsFor(input, reference, ranking),
    switch_points: switchPoints(input, reference, ranking),
    doubts: doubtsOf(input, reference, ranking),
    ...common,
  };
};
