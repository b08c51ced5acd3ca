import type { Comparison, SkylineResult } from '../shared/index.ts';
import { intoWindow, outlineLine, sunLines, windowStart } from './azimuth-window.ts';
import { type Chart, frame, plotWidth } from './frame.ts';
import { elevationOf } from './hidden-sun.ts';
import { percentSize, whole } from './numbers.ts';
import { type Panorama, panoramaLayers } from './panorama.ts';
import { oneLine, shorten } from './text.ts';
import { highest, labelOf, listed, named, sentence } from './words.ts';

const LEFT = 58;
const RIGHT = 22;
const HEIGHT = 290;
/** A point of the array within a sentence, pixels at size 12. */
const POINT_WIDTH = 210;
/** Less than this prints as 0.0 %. */
const NOTHING = 0.0005;

/** What stands before the sky all round, with the sun's paths behind it. */
export const skylineChart = (comparison: Comparison, skyline: SkylineResult): Chart => {
  const title = headline(comparison);
  const finding = `${title}.${worstSentence(comparison, skyline)}`;
  const altText = `Panorama of the skyline by true azimuth and elevation with the sun's paths behind it. ${finding} ${figures(comparison, skyline)}`;
  const start = windowStart(comparison.site.latitude_deg);
  const hidden = hiddenShares(skyline);
  const panorama: Panorama = {
    width: plotWidth(LEFT, RIGHT),
    height: HEIGHT,
    start,
    worst: skyline.worst_point,
    profiles: skyline.profiles.map((p) => ({
      name: p.name,
      pieces: intoWindow(outlineLine(p.azimuths_deg, p.elevations_deg), start),
    })),
    paths: skyline.sun_paths.map((p, i) => ({
      name: p.name,
      label: hidden[i] > 0 ? `${oneLine(p.name)}: ${percentSize(hidden[i])} hidden` : oneLine(p.name),
      pieces: sunLines(p.azimuths_deg, p.elevations_deg).flatMap((line) => intoWindow(line, start)),
    })),
  };
  return {
    name: 'skyline',
    title,
    finding,
    altText,
    spec: frame({
      title,
      subtitle: howToRead(skyline),
      altText,
      left: LEFT,
      right: RIGHT,
      height: HEIGHT,
      above: 24,
      below: 62,
      layers: panoramaLayers(panorama),
    }),
  };
};

const pointName = (name: string): string => shorten(oneLine(name) || 'unnamed', POINT_WIDTH, 12);

const howToRead = (skyline: SkylineResult): string => {
  const { profiles, worst_point, sun_paths } = skyline;
  const anyHidden = hiddenShares(skyline).some((share) => share > 0);
  const others = profiles.length - 1;
  const down = sun_paths.filter((p) => p.azimuths_deg.length === 0).map((p) => oneLine(p.name));
  return [
    others > 0
      ? `Filled: what stands before the sky at ${pointName(worst_point)}, the worst point of the array; thin lines: the ${others === 1 ? 'other point' : `other ${others} points`}.`
      : 'Filled: what stands before the sky.',
    `Amber: the sun's paths on the solstices and, one line for both equinoxes, on 21 March${anyHidden ? '; dashed while hidden (% of the time it is up)' : ''}.`,
    down.length > 0 ? `The sun stays down on ${listed(down)}.` : '',
  ]
    .filter((part) => part !== '')
    .join(' ');
};

/** Who loses most and who least to the skyline. */
const headline = ({ mounts }: Comparison): string => {
  const lit = mounts.filter((m) => m.irradiation_kwh_m2 > 0);
  if (lit.length === 0) return 'There is no light for the skyline to take';
  const most = highest(lit, (m) => m.shading_fraction);
  const least = highest(lit, (m) => -m.shading_fraction);
  const all = lit.length > 1 ? 'any mount' : named(most);
  if (most.shading_fraction < NOTHING) return `The skyline takes next to no light from ${all}`;
  const [high, low] = [percentSize(most.shading_fraction), percentSize(least.shading_fraction)];
  if (high === low)
    return `The skyline takes ${high} of the light of ${lit.length > 1 ? 'every mount' : named(most)}`;
  return `The skyline takes most from ${named(most)}, ${high} of its light, least from ${named(least)}, ${low}`;
};

/** What the worst of several points loses. */
const worstSentence = ({ mounts }: Comparison, { profiles, worst_point }: SkylineResult): string => {
  const lit = mounts.filter((m) => m.irradiation_kwh_m2 > 0);
  if (profiles.length < 2 || lit.length === 0) return '';
  const most = highest(lit, (m) => m.shading_worst_point - m.shading_fraction);
  if (most.shading_worst_point - most.shading_fraction < NOTHING) return '';
  return ` At ${pointName(most.worst_point ?? worst_point)}, the worst of ${profiles.length} points for it, it takes ${percentSize(most.shading_worst_point)} from ${named(most)}.`;
};

/** By path, the share of the time the sun is up in which the worst point's skyline hides it: its samples are at equal times. */
const hiddenShares = ({ profiles, worst_point, sun_paths }: SkylineResult): number[] => {
  const worst = profiles.find((p) => p.name === worst_point) ?? profiles[0];
  const elevationAt = elevationOf([outlineLine(worst.azimuths_deg, worst.elevations_deg)]);
  return sun_paths.map(({ azimuths_deg, elevations_deg }) =>
    elevations_deg.length === 0
      ? 0
      : elevations_deg.filter((e, i) => e < elevationAt(azimuths_deg[i])).length / elevations_deg.length,
  );
};

const figures = ({ mounts }: Comparison, { profiles, sun_paths }: SkylineResult): string => {
  const shares = mounts.map((m) => `${labelOf(m)} ${percentSize(m.shading_fraction)}`);
  const tops = profiles.map((p) => {
    const top = highest(p.elevations_deg, (e) => e);
    const azimuth = p.azimuths_deg[p.elevations_deg.indexOf(top)];
    return `${oneLine(p.name)} reaches ${whole(top)}° at azimuth ${whole(azimuth)}° and takes ${percentSize(p.sky_blocked)} of an even sky`;
  });
  const noons = sun_paths.map((p) =>
    p.elevations_deg.length === 0
      ? `${oneLine(p.name)} none`
      : `${oneLine(p.name)} ${whole(Math.max(...p.elevations_deg))}°`,
  );
  return `${sentence(`light taken: ${shares.join(', ')}`)}. Skyline: ${tops.join('; ')}. The sun's highest elevation: ${noons.join(', ')}.`;
};
