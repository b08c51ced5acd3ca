import type { Comparison, MountResult } from '../shared/index.ts';
import { formatGain, formatNumber, formatPercent } from './numbers.ts';
import { isTracker, mountById, nameOf } from './words.ts';

/** The skies whose spread is the doubt; isotropic is a lower bound only. */
const SKIES = ['perez', 'hay-davies', 'reindl'] as const;

const moreOrLess = (fraction: number): string =>
  `${formatPercent(Math.abs(fraction))} ${fraction < 0 ? 'less' : 'more'}`;

/** ` (9.1 to 15.0 % over the sky models)`; nothing where they agree to the last digit shown. */
const skyRange = (mount: MountResult): string => {
  const gains = SKIES.map((sky) => mount.gain_by_sky[sky]);
  const oneSign = gains.every((gain) => gain < 0) || gains.every((gain) => gain >= 0);
  // "5.6 % less" already says which way; signs are needed only where the models do not agree on it.
  const sizes = oneSign ? gains.map(Math.abs) : gains;
  const words = oneSign ? formatPercent : formatGain;
  const [low, high] = [words(Math.min(...sizes)), words(Math.max(...sizes))];
  return low === high ? '' : ` (${low.replace(' %', '')} to ${high} over the sky models)`;
};

/** What a mount delivers against the reference, and what it costs over the life where that is known. */
const gainSentence = (c: Comparison, mount: MountResult): string => {
  const { years } = c.finance;
  const reference = mountById(c, c.reference_id);
  const costs =
    mount.break_even_gain === null || years === null
      ? ''
      : ` and costs ${moreOrLess(mount.break_even_gain)} per kW over ${formatNumber(years)} years` +
        (mount.cost_incomplete || reference.cost_incomplete ? ', from the costs that are given' : '');
  return (
    `${nameOf(c, mount)} delivers ${moreOrLess(mount.gain_over_reference)} per kW than ${nameOf(c, reference)}` +
    `${skyRange(mount)}${costs}.`
  );
};

/** One sentence for each mount but the reference, trackers first. */
export const gainSentences = (c: Comparison): string[] => {
  const others = c.mounts.filter(({ id }) => id !== c.reference_id);
  return [...others.filter(isTracker), ...others.filter((mount) => !isTracker(mount))].map((mount) =>
    gainSentence(c, mount),
  );
};
