import type { AdviceResult } from '../shared/index.ts';
import type { AdviceMount } from './input.ts';

export interface Sifted {
  readonly kept: readonly AdviceMount[];
  readonly excluded: AdviceResult['excluded'];
}

/** Puts aside every mount that breaks a limit, with the limits it breaks. A limit that was not checked excludes nothing. */
export const siftByLimits = (mounts: readonly AdviceMount[]): Sifted => {
  const broken = (m: AdviceMount) => m.limits.filter((limit) => limit.status === 'broken');
  return {
    kept: mounts.filter((m) => broken(m).length === 0),
    excluded: mounts
      .filter((m) => broken(m).length > 0)
      .map((m) => ({
        id: m.id,
        why: broken(m)
          .map((limit) => `${limit.name} ${limit.detail}`)
          .join('; '),
      })),
  };
};
