import {
  type AdviceResult,
  type Comparison,
  compassWords,
  type MountKind,
  type MountResult,
  type SkyModel,
} from '../shared/index.ts';
import { formatNumber, formatUpTo } from './numbers.ts';
import { oneLine } from './plain-text.ts';

export const KIND_WORDS: Record<MountKind, string> = {
  'roof-plane': 'roof plane',
  'fixed-tilt': 'fixed rack',
  'single-axis': 'single-axis tracker',
  'dual-axis': 'dual-axis tracker',
  turntable: 'turntable',
};

export const SKY_WORDS: Record<SkyModel, string> = {
  perez: 'Perez',
  'hay-davies': 'Hay-Davies',
  reindl: 'Reindl',
  isotropic: 'isotropic',
};

export const CONFIDENCE_WORDS: Record<NonNullable<AdviceResult['confidence']>, string> = {
  clear: 'clear',
  likely: 'likely',
  too_close: 'too close to call',
};

/** What the weather file is, in words. */
export const yearWords = (format: string): string => (format === 'table' ? 'hourly year' : 'typical year');

export const isTracker = (mount: MountResult): boolean =>
  mount.kind === 'single-axis' || mount.kind === 'dual-axis' || mount.kind === 'turntable';

/** The mount with this id; the contract promises that it is there. */
export const mountById = (c: Comparison, id: string): MountResult => {
  const found = c.mounts.find((mount) => mount.id === id);
  if (!found) throw new Error(`A fault in trackworth: the results have no mount ${id}.`);
  return found;
};

/** A mount's label on one line; with its id where another mount carries the same label. */
export const nameOf = (c: Comparison, mount: MountResult): string => {
  const label = oneLine(mount.label);
  const shared = c.mounts.filter((other) => oneLine(other.label) === label).length > 1;
  return label !== mount.id && (shared || label === '') ? `${label} (${mount.id})`.trim() : label;
};

/** Every way in which a sentence may call a mount. */
export const mountNames = (c: Comparison): string[] =>
  c.mounts.flatMap((mount) => [nameOf(c, mount), oneLine(mount.label), mount.id]);

/** `34° tilt, facing 186° (south)`; null for trackers. */
export const facingWords = (mount: MountResult): string | null =>
  mount.tilt_deg === null || mount.azimuth_deg === null
    ? null
    : `${formatNumber(mount.tilt_deg, 1)}° tilt, facing ${formatNumber(mount.azimuth_deg, 1)}° ` +
      `(${compassWords(mount.azimuth_deg)})`;

/** `12.04 kW DC, 10 kW AC`, or that 1 kW is compared. */
export const ratingWords = (c: Comparison): string => {
  const { given, dc_kw, ac_kw } = c.array;
  const dc = given ? `${formatUpTo(dc_kw)} kW DC` : '1 kW DC (no array given)';
  return `${dc}, ${ac_kw === null ? 'no inverter given' : `${formatUpTo(ac_kw)} kW AC`}`;
};

/** `12.04 kW DC, 10 kW AC, 28 modules of 430 W`. */
export const arrayWords = (c: Comparison): string => {
  const { modules, module_w } = c.array;
  if (modules === null) return ratingWords(c);
  const size = module_w === null ? '' : ` of ${formatUpTo(module_w)} W`;
  return `${ratingWords(c)}, ${formatNumber(modules)} modules${size}`;
};
