import { compassWords, wrap180, wrap360 } from '../shared/index.ts';
import { compassPoint } from './compass-point.ts';
import { refuse, shown } from './refuse.ts';
import { plain } from './words.ts';

/** How a bearing was taken: standing on the roof and looking out, looking at it from below, or along ridge or eave. */
export const TAKEN = ['facing', 'looking_at', 'along_ridge'] as const;
export type Taken = (typeof TAKEN)[number];

/** Where a roof falls: left or right as seen looking along the bearing, or roughly toward a point of the compass. */
export type Downslope = 'left' | 'right' | { readonly towardDeg: number };

/** `left`, `right` or a point of the compass in words or letters (`south`, `SE`). Code `wrong-downslope`. */
export const parseDownslope = (raw: unknown): Downslope => {
  const text = typeof raw === 'string' ? raw.trim().toLowerCase() : '';
  if (text === 'left' || text === 'right') return text;
  const towardDeg = compassPoint(text);
  if (towardDeg !== null) return { towardDeg };
  return refuse({
    code: 'wrong-downslope',
    expected: 'left, right or a point of the compass',
    found: shown(raw),
    fix: 'Look along the bearing and say on which side the roof falls: left or right; or roughly where to, such as south.',
  });
};

export interface BearingTaken {
  /** True; the rough compass point of `downslope` is taken as true as well. */
  readonly bearingDeg: number;
  readonly taken: Taken;
  readonly downslope?: Downslope | null;
}

/** `166 (south-south-east)`. */
const named = (azimuthDeg: number): string => `${plain(azimuthDeg)} (${compassWords(azimuthDeg)})`;

/** `faces south-south-east`. */
export const facingWords = (azimuthDeg: number): string => `faces ${compassWords(azimuthDeg)}`;

/**
 * The true azimuth that a plane faces, 0..360. Refuses a ridge without its downslope side (code `ambiguous-facing`,
 * naming both), a compass point nearly along the ridge, and a downslope that does not go with the bearing.
 */
export const facingOf = ({ bearingDeg, taken, downslope = null }: BearingTaken): number => {
  if (taken === 'along_ridge') return facingOfRidge(bearingDeg, downslope);
  const facingDeg = wrap360(taken === 'facing' ? bearingDeg : bearingDeg + 180);
  if (downslope !== null) checkDownslope(facingDeg, downslope);
  return facingDeg;
};

/** A point of the compass is rough: within this of the ridge's own line it does not tell one side from the other. */
const TOO_NEAR_RIDGE_DEG = 22.5;

const facingOfRidge = (bearingDeg: number, downslope: Downslope | null): number => {
  const [left, right] = [wrap360(bearingDeg - 90), wrap360(bearingDeg + 90)];
  if (downslope === 'left') return left;
  if (downslope === 'right') return right;
  const fromRight = downslope ? Math.abs(wrap180(downslope.towardDeg - right)) : 90;
  if (Math.abs(fromRight - 90) >= TOO_NEAR_RIDGE_DEG) return fromRight < 90 ? right : left;
  return refuse({
    code: 'ambiguous-facing',
    expected: `the downslope side of a ridge or eave at ${plain(bearingDeg)}: left, and it faces ${named(left)}, or right, and it faces ${named(right)}, as seen looking along the bearing`,
    found: downslope ? `${compassWords(downslope.towardDeg)}, which is nearly along it` : 'none',
    fix: 'Say downslope: left or right, or roughly where to, such as south.',
  });
};

const checkDownslope = (facingDeg: number, downslope: Downslope): void => {
  if (typeof downslope === 'string')
    refuse({
      code: 'wrong-downslope',
      expected: 'left or right only with a bearing taken along_ridge',
      found: downslope,
      fix: 'Leave it out, or say taken: along_ridge.',
    });
  else if (Math.abs(wrap180(downslope.towardDeg - facingDeg)) > 90)
    refuse({
      code: 'wrong-downslope',
      expected: `a roof that faces ${named(facingDeg)} to fall that way`,
      found: compassWords(downslope.towardDeg),
      fix: 'Check how the bearing was taken: facing, looking_at or along_ridge.',
    });
};
