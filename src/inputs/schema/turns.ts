import { DEFAULT_AXIS_AZIMUTH_DEG, DEFAULT_SWING_DEG } from '../defaults.ts';
import type { Side } from '../fields/angles.ts';
import { sideTurn } from '../side-turn.ts';
import { refuseIn } from './survey-issues.ts';

interface Turned {
  readonly turn?: number | undefined;
  readonly angle?: number | undefined;
  readonly faces?: Side | undefined;
}

interface Turning {
  readonly axis?: { readonly azimuth?: number | undefined } | undefined;
  readonly swing?: number | undefined;
  readonly drive?: { readonly stuck?: string | Turned | undefined } | undefined;
  readonly stow?: Turned | undefined;
}

const issuesOf = (turned: Turned, path: string[], key: 'turn' | 'angle', { axis, swing }: Turning) => {
  const [turn, faces] = [turned[key] ?? 0, turned.faces];
  const axisAzimuthDeg = axis?.azimuth ?? DEFAULT_AXIS_AZIMUTH_DEG;
  const swingDeg = swing ?? DEFAULT_SWING_DEG;
  const sides = (['north', 'east', 'south', 'west'] as const).filter(
    (word) => sideTurn(1, word, axisAzimuthDeg) !== null,
  );
  const list = sides.join(' or ');
  if (turn > swingDeg)
    return [
      refuseIn([...path, key], {
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

/** What shows only when a turn is held against the tracker's own axis and swing. */
export const turnIssues = (mount: Turning) => {
  const { stow, drive } = mount;
  const stuck = typeof drive?.stuck === 'object' ? drive.stuck : null;
  return [
    ...(stuck ? issuesOf(stuck, ['drive', 'stuck'], 'turn', mount) : []),
    ...(stow ? issuesOf(stow, ['stow'], 'angle', mount) : []),
  ];
};
