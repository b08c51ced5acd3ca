import { gradesByAxis, type ResolvedGeometry } from '../mounts/index.ts';
import { type MountResult, tanDeg } from '../shared/index.ts';

type Limit = MountResult['limits'][number];

/** Slopes are entered to a tenth of a per cent at best: this much over a limit is rounding. */
const ROUNDING = 1e-9;

const percent = (grade: number): string => `${Number((100 * grade).toFixed(1))} %`;

const atMost = (name: string, grade: number | null, allowedDeg: number | null): Limit[] => {
  if (allowedDeg === null) return [];
  const limit = { name, bound: 'most', excess_m: null } as const;
  if (grade === null) {
    const detail = 'not checked: the study gives no ground for this mount';
    return [{ ...limit, status: 'not_checked', detail, value: null, asked: null }];
  }
  const allowed = tanDeg(allowedDeg);
  const kept = grade <= allowed + ROUNDING;
  const detail = `${percent(grade)} where at most ${percent(allowed)} is allowed`;
  return [{ ...limit, status: kept ? 'kept' : 'broken', detail, value: grade, asked: allowed }];
};

/** The ground under a tracker against what its maker allows along and across the axis, as grades (rise over level run). */
export const slopeLimits = (geometry: ResolvedGeometry): Limit[] => {
  if (geometry.kind !== 'single-axis' || !geometry.slopeLimits) return [];
  const { ground, slopeLimits: allowed, axisAzimuthDeg } = geometry;
  const grades = ground ? gradesByAxis(ground, axisAzimuthDeg) : null;
  return [
    ...atMost('slope along the axis', grades?.along ?? null, allowed.alongDeg),
    ...atMost('slope across the axis', grades?.across ?? null, allowed.acrossDeg),
  ];
};
