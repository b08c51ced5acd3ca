import type { LimitStatus, MountResult } from '../shared/index.ts';
import type { EdgeGeometry, HighestEdge } from './highest-edge.ts';
import type { WindLimits } from './spec.ts';

export type LimitResult = MountResult['limits'][number];

/** Lengths are tapes and drawings, not exact: this much over a limit is rounding, m. */
const ROUNDING_M = 1e-9;

/** Plain metres to the centimetre: `3`, `0.25`, `3.9`. */
const metres = (m: number): string => String(Number(m.toFixed(2)));

/** An excess under a centimetre would print as 0. */
const metresOver = (m: number): string => (m < 0.01 ? String(Number(m.toPrecision(2))) : metres(m));

const statusOf = (excessM: number, readingErrorM: number): LimitStatus => {
  if (readingErrorM > 0 && Math.abs(excessM) <= readingErrorM) return 'within_reading_error';
  return excessM > ROUNDING_M ? 'broken' : 'kept';
};

const detailOf = (status: LimitStatus, valueM: number, limitM: number, readingErrorM: number): string => {
  switch (status) {
    case 'within_reading_error':
      return `too near to tell: ${metres(valueM)} of ${metres(limitM)} m, read to ${metres(readingErrorM)} m`;
    case 'broken':
      return `exceeds ${metres(limitM)} m by ${metresOver(valueM - limitM)} m`;
    default:
      return `within: ${metres(valueM)} of ${metres(limitM)} m`;
  }
};

/**
 * Compares a mount with the limit that the user enters for its kind: projection for roof mounts, height of the
 * highest edge above ground for ground mounts. `excess_m` is the height less the limit, negative with room to
 * spare, null where it was not checked. `readingErrorM` is how far the height may be out, either way.
 */
export const checkLimits = (
  arrangement: EdgeGeometry['arrangement'],
  edge: HighestEdge,
  limits: WindLimits | null,
  readingErrorM = 0,
): LimitResult[] => {
  const roof = arrangement === 'roof';
  const name = roof ? 'roof projection' : 'height';
  const valueM = roof ? edge.aboveRoofM : edge.aboveGroundM;
  const limitM = (roof ? limits?.roofProjectionM : limits?.heightM) ?? null;
  const notChecked = (why: string): LimitResult[] => [
    {
      name,
      bound: 'most',
      status: 'not_checked',
      value: null,
      asked: null,
      detail: `not checked: ${why}`,
      excess_m: null,
    },
  ];
  if (limitM === null) {
    return notChecked(`the study gives no wind.limits.${roof ? 'roof_projection' : 'height'}`);
  }
  if (valueM === null) {
    // the roof's own height is needed for the pressure, not for the projection
    const needed = edge.missing.filter((key) => key !== 'site.roof_height');
    return notChecked(`${needed.join(' and ')} ${needed.length > 1 ? 'are' : 'is'} blank`);
  }
  const status = statusOf(valueM - limitM, readingErrorM);
  return [
    {
      name,
      bound: 'most',
      status,
      detail: detailOf(status, valueM, limitM, readingErrorM),
      value: valueM,
      asked: limitM,
      excess_m: valueM - limitM,
    },
  ];
};
