import type { Place, SkylineResult } from '../shared/index.ts';
import { sunPosition } from '../sun/index.ts';
import { outlineOf } from '../survey/index.ts';
import type { Setting } from './setting.ts';

/** The days on which the sun runs highest, lowest and between (month 0-based); the names hold in both hemispheres. */
const DAYS = [
  { name: '21 June', month: 5 },
  { name: '21 March', month: 2 },
  { name: '21 December', month: 11 },
];
const STEP_MIN = 10;

/** The sun above the horizon on the 21st of a month, every ten minutes of local standard time. */
const sunPath = ({ latitudeDeg, longitudeDeg, utcOffsetH }: Place, calendarYear: number, month: number) => {
  const midnightUtcMs = Date.UTC(calendarYear, month, 21) - utcOffsetH * 3_600_000;
  return Array.from({ length: (24 * 60) / STEP_MIN }, (_, i) =>
    sunPosition(midnightUtcMs + (i + 0.5) * STEP_MIN * 60_000, latitudeDeg, longitudeDeg),
  ).filter(({ zenithDeg }) => zenithDeg < 90);
};

/** The skyline with the sun's paths, for a chart; null with an open horizon. */
export const skylineResult = ({ survey, year }: Setting): SkylineResult | null => {
  if (!survey.skyline) return null;
  const { profiles, blockedSky, worst } = survey.skyline;
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
    sun_paths: DAYS.map(({ name, month }) => {
      const path = sunPath(year.place, year.calendarYear[0], month);
      return {
        name,
        azimuths_deg: path.map(({ azimuthDeg }) => azimuthDeg),
        elevations_deg: path.map(({ zenithDeg }) => 90 - zenithDeg),
      };
    }),
  };
};
