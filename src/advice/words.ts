import { compassWords, type MountKind } from '../shared/index.ts';
import type { AdviceInput, AdviceMount } from './input.ts';

const KIND_WORDS: Record<MountKind, string> = {
  'roof-plane': 'on the roof plane',
  'fixed-tilt': 'fixed rack',
  'single-axis': 'single-axis tracker',
  'dual-axis': 'dual-axis tracker',
  turntable: 'turntable',
};

export const isTracker = (m: AdviceMount): boolean =>
  m.kind === 'single-axis' || m.kind === 'dual-axis' || m.kind === 'turntable';

/** How sentences call a mount: its label, or its id where it has none. */
export const nameOf = (m: AdviceMount): string => m.label || m.id;

/** `fixed rack, 34° tilt, facing 186° (south)` or `single-axis tracker, rows at GCR 0.40`. */
export const describeMount = (m: AdviceMount): string => {
  const facing =
    m.tilt_deg === null || m.azimuth_deg === null
      ? m.rows
      : m.tilt_deg < 0.5
        ? 'lying flat'
        : `${m.tilt_deg.toFixed(0)}° tilt, facing ${m.azimuth_deg.toFixed(0)}° (${compassWords(m.azimuth_deg)})`;
  return `${KIND_WORDS[m.kind]}, ${facing}`;
};

/** `a`, `a and b`, `a, b and c`. */
export const listWords = (items: readonly string[]): string =>
  items.length < 2 ? items.join('') : `${items.slice(0, -1).join(', ')} and ${items[items.length - 1]}`;

const tenth = (share: number): string => String(Number((100 * share).toFixed(1)) + 0);

/** A fraction as `12.4 %`, with its sign where negative. */
export const percent = (share: number): string => `${tenth(share)} %`;

/** `9.4 to 15 %`. */
export const percentRange = (low: number, high: number): string => `${tenth(low)} to ${percent(high)}`;

/** `12.4 % more` or `8 % less`. */
export const moreOrLess = (share: number): string =>
  tenth(share) === '0' ? '0 % more' : `${percent(Math.abs(share))} ${share < 0 ? 'less' : 'more'}`;

/** Every sentence about money names its currency, or that none was given. */
export const currencyOf = (input: Pick<AdviceInput, 'currency'>): string => input.currency ?? 'money';
