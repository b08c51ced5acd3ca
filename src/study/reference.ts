import type { Study } from '../inputs/index.ts';
import { isTracker } from '../mounts/index.ts';
import type { MountRun } from './mount-run.ts';

/**
 * The mount that every gain is measured against: the study's `compare_with`, else the ground rack that delivers most
 * per kW, else the first fixed mount; where a study has trackers only, the first of them.
 */
export const referenceOf = (study: Study, runs: readonly MountRun[]): MountRun => {
  const asked = runs.find((run) => run.mount.id === study.compareWith);
  if (asked) return asked;
  const energy = (run: MountRun) => run.delivered[study.sky.model].energyKwhPerKw;
  const racks = runs
    .filter((run) => run.geometry.kind === 'fixed-tilt')
    .sort((a, b) => energy(b) - energy(a));
  return racks[0] ?? runs.find((run) => !isTracker(run.geometry)) ?? runs[0];
};
