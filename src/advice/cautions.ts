import type { MountKind } from '../shared/index.ts';
import { DEFERRAL } from '../wind/index.ts';

const ALWAYS = [
  'Electricity: modules are live whenever light falls on them. Isolate and test before touching; wiring belongs to a ' +
    'licensed person under the local code.',
  'Lifting: a module is a heavy sail. Carry it with two people, never in wind, and use a machine for poles and long beams.',
  DEFERRAL,
  'Structure: roof capacity, attachments, foundations, frost, snow and uplift are for a licensed engineer, and permits ' +
    'for the local authority.',
  'Yield: these are expected values from a typical year; no yield is guaranteed.',
];

const ROOF =
  'Falls: work on a roof needs fall protection, in the United States from 6 ft up in construction and 4 ft in upkeep ' +
  '(OSHA); elsewhere the local rule holds.';
const GROUND = 'Falls: a raised edge or a pole still means work at height; use a platform, not the rack.';
const TRACKERS = [
  'Moving parts: lock out the drive before working near it, and keep people, animals and snow banks out of its sweep.',
  'Stow: parking in wind is a safety function. It must work with the grid down and with a flat battery, and damage also ' +
    'comes in moderate wind.',
  'Earthing: bond across every pivot with flexible jumpers to one earthing system, with surge protection at the drive.',
  'A qualified tracker says nothing about its foundation.',
];

/** Safety and law, for the kinds of mount that are compared; work and structure defer to the local code and licensed practice. */
export const cautionsFor = (kinds: readonly MountKind[]): string[] => [
  ...(kinds.includes('roof-plane') ? [ROOF] : []),
  ...(kinds.some((kind) => kind !== 'roof-plane') ? [GROUND] : []),
  ...ALWAYS,
  ...(kinds.some((kind) => kind !== 'roof-plane' && kind !== 'fixed-tilt') ? TRACKERS : []),
];
