import * as z from 'zod/mini';
import type { Convert } from '../convert.ts';
import { azimuth, azimuthOrBest, faced, steepness, swing, tilt, tiltOrBest } from '../fields/angles.ts';
import { hints } from '../fields/field.ts';
import { choice } from '../fields/words.ts';
import { mountParts } from './mount-parts.ts';
import type { Present } from './present.ts';
import { once, wherePresent } from './present.ts';
import { reachIssues } from './reach.ts';
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
  { common, trackerRows, slant, axisHeight, turningDrive, turningStow }: Parts,
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
      drive: turningDrive,
      stow: turningStow,
    })
    .check(({ value, issues }) => {
      issues.push(...turnIssues(value));
    })
    .register(hints, { description: 'A tracker that turns about one axis.' });

const turns = (convert: Convert) =>
  z
    .strictObject({
      from: azimuth(convert, 'First azimuth that it can face: degrees clockwise from true north.'),
      to: azimuth(convert, 'Last azimuth that it can face, clockwise from the first.'),
    })
    .register(hints, { description: 'The azimuths that it can face, clockwise. Blank: all round.' });

const elevation = (convert: Convert) =>
  z
    .strictObject({
      lowest: z.optional(
        faced(convert, 'Lowest sun that it can face, degrees above the horizon. Blank: 0, standing upright.'),
      ),
      highest: z.optional(
        faced(convert, 'Highest sun that it can face, degrees above the horizon. Blank: 90, lying flat.'),
      ),
    })
    .register(hints, { description: 'How high it can face: 90 less its tilt. Blank: from upright to flat.' });

const dualAxis = (
  convert: Convert,
  { common, rows, slant, axisHeight, facingDrive, facingStow }: Parts,
  has: Present,
) =>
  z
    .strictObject({
      kind: z.literal('dual-axis'),
      ...common,
      turns: wherePresent(has('turns'), () => z.optional(turns(convert))),
      elevation: wherePresent(has('elevation'), () => z.optional(elevation(convert))),
      rows,
      slant,
      axis_height: axisHeight,
      drive: facingDrive,
      stow: facingStow,
    })
    .check(({ value, issues }) => {
      issues.push(...reachIssues(value));
    })
    .register(hints, { description: 'A tracker that faces the sun. Without rows it is a lone mast.' });

const turntable = (
  convert: Convert,
  { common, rows, slant, axisHeight, turntableDrive }: Parts,
  has: Present,
) =>
  z
    .strictObject({
      kind: z.literal('turntable'),
      ...common,
      tilt: z.optional(
        tiltOrBest(
          convert,
          'Held all year: degrees from horizontal, a slope (3:12), a grade (25 %), or best (also if blank).',
        ),
      ),
      turns: wherePresent(has('turns'), () => z.optional(turns(convert))),
      rows,
      slant,
      axis_height: axisHeight,
      drive: turntableDrive,
    })
    .register(hints, { description: 'A tracker that turns about an upright axis and keeps its tilt.' });

/** One schema for each kind of mount, made at its first use; its keys are the kind's own. `has` looks into all mounts. */
export const mountSchemas = (convert: Convert, has: Present) => {
  const parts = once(() => mountParts(convert, has));
  return {
    'roof-plane': once(() => roofPlane(convert, parts())),
    'fixed-tilt': once(() => fixedTilt(convert, parts())),
    'single-axis': once(() => singleAxis(convert, parts(), has)),
    'dual-axis': once(() => dualAxis(convert, parts(), has)),
    turntable: once(() => turntable(convert, parts(), has)),
  };
};

export type MountSchemas = ReturnType<typeof mountSchemas>;
export type RawMount = {
  [K in keyof MountSchemas]: z.infer<ReturnType<MountSchemas[K]>>;
}[keyof MountSchemas];
