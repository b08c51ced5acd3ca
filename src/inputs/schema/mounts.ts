import * as z from 'zod/mini';
import type { Convert } from '../convert.ts';
import { azimuth, azimuthOrBest, swing, tilt, tiltOrBest } from '../fields/angles.ts';
import { hints } from '../fields/field.ts';
import { mountParts } from './mount-parts.ts';
import type { Present } from './present.ts';
import { once } from './present.ts';
import { turnIssues } from './turns.ts';

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

const singleAxis = (
  convert: Convert,
  { common, trackerRows, slant, axisHeight, turningDrive, turningStow }: Parts,
) =>
  z
    .strictObject({
      kind: z.literal('single-axis'),
      ...common,
      axis: z.optional(axis(convert)),
      swing: z.optional(swing(convert, 'Greatest turn either way from flat, degrees. Blank: 60.')),
      rows: trackerRows,
      slant,
      axis_height: axisHeight,
      drive: turningDrive,
      stow: turningStow,
    })
    .check(({ value, issues }) => {
      issues.push(...turnIssues(value));
    })
    .register(hints, { description: 'A tracker that turns about one axis.' });

const dualAxis = ({ common, rows, slant, axisHeight, facingDrive, facingStow }: Parts) =>
  z
    .strictObject({
      kind: z.literal('dual-axis'),
      ...common,
      rows,
      slant,
      axis_height: axisHeight,
      drive: facingDrive,
      stow: facingStow,
    })
    .register(hints, { description: 'A tracker that faces the sun. Without rows it is a lone mast.' });

/** One schema for each kind of mount, made at its first use; its keys are the kind's own. `has` looks into all mounts. */
export const mountSchemas = (convert: Convert, has: Present) => {
  const parts = once(() => mountParts(convert, has));
  return {
    'roof-plane': once(() => roofPlane(convert, parts())),
    'fixed-tilt': once(() => fixedTilt(convert, parts())),
    'single-axis': once(() => singleAxis(convert, parts())),
    'dual-axis': once(() => dualAxis(parts())),
  };
};

export type MountSchemas = ReturnType<typeof mountSchemas>;
export type RawMount = {
  [K in keyof MountSchemas]: z.infer<ReturnType<MountSchemas[K]>>;
}[keyof MountSchemas];
