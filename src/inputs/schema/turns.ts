import { DEFAULT_AXIS_AZIMUTH_DEG, DEFAULT_SWING_DEG } from '../defaults.ts';
import type { Side } from '../fields/angles.ts';
import { sideTurn } from '../side-turn.ts';
import { refuseIn } from './survey-issues.ts';

interface Turned {
  readonly turn: number;
  readonly faces?: Side | undefined;
}

interface Turning {
  readonly axis?: { readonly azimuth?: number | undefined } | undefined;
  readonly swing?: number | undefined;
  readonly drive?: { readonly stuck?: unknown } | undefined;
}

const issuesOf = ({ turn, faces }: Turned, path: string[], { axis, swing }: Turning) => {
  const axisAzimuthDeg = axis?.azimuth ?? DEFAULT_AXIS_AZIMUTH_DEG;
  const swingDeg = swing ?? DEFAULT_SWING_DEG;
  const sides = (['north', 'east', 'south', 'west'] as const).filter(
    (word) => sideTurn(1, word, axisAzimuthDeg) !== null,
  );
  const list = sides.join(' or ');
  if (turn > swingDeg)
    return [
      refuseIn([...path, 'turn'], {
        code: 'beyond-swing',
        expected: `a turn within the swing of ${swingDeg} degrees`,
        fix: `Write at most ${swingDeg}, or widen swing.`,
      }),
    ];
  if (turn === 0) return [];
  if (faces === undefined)
    return [
      refuseIn([...path, 'faces'], {
        code: 'missing-key',
        expected: `the side that it faces, ${list}`,
        fix: `faces: ${sides[0]}`,
      }),
    ];
  if (sideTurn(turn, faces, axisAzimuthDeg) !== null) return [];
  return [
    refuseIn([...path, 'faces'], {
      code: 'wrong-value',
      expected: `${list}, the sides to which this axis turns`,
      fix: `The axis lies along ${axisAzimuthDeg} degrees; write ${list}.`,
    }),
  ];
};

const isTurned = (raw: unknown): raw is Turned => typeof raw === 'object' && raw !== null && 'turn' in raw;

/** What shows only when a turn is held against the tracker's own axis and swing. */
export const turnIssues = (mount: Turning) =>
  isTurned(mount.drive?.stuck) ? issuesOf(mount.drive.stuck, ['drive', 'stuck'], mount) : [];
