import type { SkylineResult } from '../shared/index.ts';
import { asinDeg } from '../shared/index.ts';
import { sunAzimuthDeg, sunOverHours } from '../sun/index.ts';
import { outlineOf } from '../survey/index.ts';
import type { Setting } from './setting.ts';

/** Days of the year (0-based) on which the sun runs highest, lowest and between; the names hold in both hemispheres. */
const DAYS = [
  { name: '21 June', day: 171 },
  { name: '21 March', day: 79 },
  { name: '21 December', day: 354 },
];
const SAMPLES_PER_HOUR = 6;

/** The skyline with the sun's paths, for a chart; null with an open horizon. */
export const skylineResult = ({ survey, year }: Setting): SkylineResult | null => {
  if (!survey.skyline) return null;
  const { profiles, blockedSky, worst } = survey.skyline;
  const sun = sunOverHours(year.place, year.calendarYear, 0, SAMPLES_PER_HOUR);
  return {
    profiles: profiles.map((profile, i) => {
      const outline = outlineOf(profile);
      return {
        name: profile.name,
        azimuths_deg: outline.map((point) => point.azimuthDeg),
        elevations_deg: outline.map((point) => point.elevationDeg),
        sky_blocked: blockedSky[i],
      };
    }),
    worst_point: worst.name,
    sun_paths: DAYS.map(({ name, day }) => {
      const samples = Array.from(
        { length: sun.first[(day + 1) * 24] - sun.first[day * 24] },
        (_, i) => sun.first[day * 24] + i,
      );
      return {
        name,
        azimuths_deg: samples.map((s) => sunAzimuthDeg(sun, s)),
        elevations_deg: samples.map((s) => asinDeg(sun.up[s])),
      };
    }),
  };
};
