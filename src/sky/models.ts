import type { SkyModel } from '../shared/index.ts';
import { hayDaviesSky } from './hay-davies.ts';
import { isotropicSky } from './isotropic.ts';
import { perezSky } from './perez.ts';
import { reindlSky } from './reindl.ts';
import type { SkyModelFunction } from './weights.ts';

/** Every sky model; to add one, write its file and name it in `SkyModel` and here. */
export const SKY_MODELS: Record<SkyModel, SkyModelFunction> = {
  perez: perezSky,
  'hay-davies': hayDaviesSky,
  reindl: reindlSky,
  isotropic: isotropicSky,
};

/** The models whose spread is part of the doubt; the isotropic sky is known to be low and is a bound only. */
export const DOUBT_MODELS = ['perez', 'hay-davies', 'reindl'] as const;
