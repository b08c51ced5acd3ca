import * as z from 'zod/mini';
import type { Convert } from '../convert.ts';
import { azimuth, azimuthOrBest, steepness, swing, tilt, tiltOrBest } from '../fields/angles.ts';
import { hints } from '../fields/field.ts';
import { choice } from '../fields/words.ts';
import { mountParts } from './mount-parts.ts';
import type { Present } from './present.ts';
import { once, wherePresent } from './present.ts';

type Parts = ReturnType<typeof mountParts>;

/** For editors; what reads the study has its own words for it. */
const eitherOf = (...keys: string[]) => ({ anyOf: keys.map((key) => ({ required: [key] })) });

const roofPlane = (convert: Convert, { common, onSite, airBehind }: Parts) =>
  z
    .strictObject({
      kind: z.literal('roof-plane'),
      ...common,
      tilt: z.optional(
        tilt(convert, 'Of the roof: degrees from horizontal, a slope such as 3:12, a grade such as 25 %.'),
      ),
      azimuth: z.optional(
        azimuth(convert, 'The way the roof faces: degrees clockwise from true north, 180 is south.'),
      ),
      ...onSite,
      air_behind: airBehind,
    })
    .register(hints, {
      description: 'Modules parallel to a roof.',
      allOf: [eitherOf('tilt', 'slope'), eitherOf('azimuth', 'bearing')],
    });

const fixedTilt = (convert: Convert, { common, onSite, rows, slant, lowerEdge }: Parts) =>
  z
    .strictObject({
      kind: z.literal('fixed-tilt'),
      ...common,
      tilt: z.optional(
        tiltOrBest(
          convert,
          'Degrees from horizontal, a slope (3:12), a grade (25 %), or best (also if blank).',
        ),
      ),
      azimuth: z.optional(
        azimuthOrBest(convert, 'Degrees clockwise from true north, 180 is south, or best (also if blank).'),
      ),
      ...onSite,
      rows,
      slant,
      lower_edge: lowerEdge,
    })
    .register(hints, { description: 'A rack on the ground that does not move.' });

const axis = (convert: Convert) =>
  z
    .strictObject({
      azimuth: z.optional(azimuth(convert, 'Direction towards which a tilted axis falls. Blank: 180.')),
      tilt: z.optional(tilt(convert, 'Of the axis, from horizontal. Blank: 0, level.')),
    })
    .register(hints, { description: 'The axis. Blank: level, north-south.' });

const ground = (convert: Convert) =>
  z
    .strictObject({
      slope: steepness(convert, 'Steepness of the ground, straight down: a grade (6 %), degrees, a slope.'),
      falls_toward: azimuth(convert, 'The way straight down: degrees clockwise from true north.'),
    })
    .register(hints, {
      description:
        'The ground that axis and rows follow; tilt of the axis and slope across it are worked out. Blank: level.',
    });

const slopeLimits = (convert: Convert) =>
  z
    .strictObject({
      along: z.optional(steepness(convert, 'Steepest ground along the axis. Blank: not checked.')),
      across: z.optional(steepness(convert, 'Steepest ground straight across the axis. Blank: not checked.')),
    })
    .register(hints, { description: "The maker's limits of the ground's slope. Blank: not checked." });

const singleAxis = (
  convert: Convert,
  { common, trackerRows, slant, axisHeight, drive }: Parts,
  has: Present,
) =>
  z
    .strictObject({
      kind: z.literal('single-axis'),
      ...common,
      axis: z.optional(axis(convert)),
      ground: wherePresent(has('ground'), () => z.optional(ground(convert))),
      slope_limits: wherePresent(has('slope_limits'), () => z.optional(slopeLimits(convert))),
      swing: z.optional(swing(convert, 'Greatest turn either way from flat, degrees. Blank: 60.')),
      cloudy: z.optional(
        choice(['track', 'flat'], 'Under an overcast sky: keep to the sun (also if blank), or lie flat.'),
      ),
      rows: trackerRows,
      slant,
      axis_height: axisHeight,
      drive,
    })
    .register(hints, { description: 'A tracker that turns about one axis.' });

const dualAxis = ({ common, rows, slant, axisHeight, drive }: Parts) =>
  z
    .strictObject({ kind: z.literal('dual-axis'), ...common, rows, slant, axis_height: axisHeight, drive })
    .register(hints, { description: 'A tracker that faces the sun. Without rows it is a lone mast.' });

/** One schema for each kind of mount, made at its first use; its keys are the kind's own. `has` looks into all mounts. */
export const mountSchemas = (convert: Convert, has: Present) => {
  const parts = once(() => mountParts(convert, has));
  return {
    'roof-plane': once(() => roofPlane(convert, parts())),
    'fixed-tilt': once(() => fixedTilt(convert, parts())),
    'single-axis': once(() => singleAxis(convert, parts(), has)),
    'dual-axis': once(() => dualAxis(parts())),
  };
};

export type MountSchemas = ReturnType<typeof mountSchemas>;
export type RawMount = {
  [K in keyof MountSchemas]: z.infer<ReturnType<MountSchemas[K]>>;
}[keyof MountSchemas];
