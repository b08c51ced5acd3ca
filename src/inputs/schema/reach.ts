import { wrap360 } from '../../shared/index.ts';
import { refuseIn } from './survey-issues.ts';

interface Reaching {
  readonly turns?: { readonly from: number; readonly to: number } | undefined;
  readonly elevation?:
    | { readonly lowest?: number | undefined; readonly highest?: number | undefined }
    | undefined;
  readonly drive?:
    | { readonly stuck?: string | { readonly tilt: number; readonly azimuth: number } | undefined }
    | undefined;
  readonly stow?: { readonly angle?: number | undefined } | undefined;
}

const tiltIssues = (tilt: number | undefined, path: string[], { elevation }: Reaching, fix: string) => {
  const [flattest, steepest] = [90 - (elevation?.highest ?? 90), 90 - (elevation?.lowest ?? 0)];
  // Limits that cross are told of by themselves.
  if (tilt === undefined || flattest > steepest || (tilt >= flattest && tilt <= steepest)) return [];
  return [
    refuseIn(path, {
      code: 'beyond-reach',
      expected: `a tilt that elevation allows, ${flattest} to ${steepest} degrees`,
      fix,
    }),
  ];
};

const azimuthIssues = (azimuth: number, path: string[], { turns }: Reaching) =>
  !turns || wrap360(azimuth - turns.from) <= wrap360(turns.to - turns.from)
    ? []
    : [
        refuseIn(path, {
          code: 'beyond-reach',
          expected: `an azimuth that turns allows, ${turns.from} to ${turns.to} degrees`,
          fix: 'Write one within turns, or widen turns.',
        }),
      ];

/** What shows only when a plane at which a mast stands still is held against the mast's own limits. */
export const reachIssues = (mount: Reaching) => {
  const { stow, drive } = mount;
  const stuck = typeof drive?.stuck === 'object' ? drive.stuck : null;
  const within = 'Write one within elevation, or widen elevation.';
  return [
    ...(stuck
      ? [
          ...tiltIssues(stuck.tilt, ['drive', 'stuck', 'tilt'], mount, within),
          ...azimuthIssues(stuck.azimuth, ['drive', 'stuck', 'azimuth'], mount),
        ]
      : []),
    ...tiltIssues(
      stow?.angle,
      ['stow', 'angle'],
      mount,
      'Write one within elevation, or leave angle blank: it then parks as flat as it goes.',
    ),
  ];
};
