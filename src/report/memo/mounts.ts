import type { Comparison, MountResult } from '../../shared/index.ts';
import { md, mdList, mdTable } from '../markdown.ts';
import { formatNumber, UNKNOWN } from '../numbers.ts';
import { facingWords, KIND_WORDS, mountById, nameOf } from '../words.ts';
import { blocks, section } from './section.ts';

const pointing = (mount: MountResult): string => {
  const facing = facingWords(mount);
  if (facing === null) return md(mount.pointing);
  return mount.tilt_basis === null ? facing : `${facing}; ${md(mount.tilt_basis)}`;
};

const excluded = (c: Comparison): string =>
  c.advice.excluded.length === 0
    ? 'No mount is put aside by a limit.'
    : blocks(
        'Put aside by a limit:',
        mdList(c.advice.excluded.map(({ id, why }) => `${md(nameOf(c, mountById(c, id)))}: ${md(why)}.`)),
      );

const landWords = (land_m2: number | null): string =>
  land_m2 === null ? UNKNOWN : `${formatNumber(land_m2)} m²`;

/** What was compared, what light each plane receives, and what was put aside. */
export const mountsCompared = (c: Comparison): string =>
  section(
    'Mounts compared',
    mdTable(
      ['Mount', 'Kind', 'Where it points', 'Rows', 'Land'],
      ['left', 'left', 'left', 'left', 'right'],
      c.mounts.map((m) => [
        md(nameOf(c, m)),
        KIND_WORDS[m.kind],
        pointing(m),
        md(m.rows),
        landWords(m.land_m2),
      ]),
    ),
    'Light on the front of each plane over the year, kWh/m², before shade and every loss.',
    mdTable(
      ['Mount', 'Beam', 'Sky', 'Reflected by the ground', 'All'],
      ['left', 'right', 'right', 'right', 'right'],
      c.mounts.map((m) => [
        md(nameOf(c, m)),
        formatNumber(m.beam_kwh_m2),
        formatNumber(m.sky_diffuse_kwh_m2),
        formatNumber(m.ground_reflected_kwh_m2),
        formatNumber(m.irradiation_kwh_m2),
      ]),
    ),
    excluded(c),
  );
