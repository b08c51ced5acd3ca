import { crossAxisTiltOf, isTracker } from '../mounts/index.ts';
import type { Assumption } from '../shared/index.ts';
import { SAMPLES_PER_HOUR, SOLAR_CONSTANT_WM2 } from '../sun/index.ts';
import { HORIZON_BAND_DEG } from '../survey/index.ts';
import { GUST_FACTOR } from '../wind/index.ts';
import { type MountRun, USUAL_HEAT_PER_K } from './mount-run.ts';
import type { Counted } from './not-counted.ts';
import { OVERCAST_DIFFUSE, overcastHours } from './overcast.ts';

const SKY_SOURCES = {
  perez: 'Perez et al. 1990, Solar Energy 44, 271',
  'hay-davies': 'Hay & Davies 1980',
  reindl: 'Reindl, Beckman & Duffie 1990, Solar Energy 45, 9',
  isotropic: 'Liu & Jordan 1963; a lower bound for trackers',
} as const;

const ids = (runs: readonly MountRun[]): string => runs.map((run) => run.mount.id).join(', ');

const arrayHeights = ({ runs }: Counted): Assumption => ({
  what: 'height of the modules, for the wind that cools them',
  value: runs.map((run) => `${run.mount.id} ${Number(run.arrayHeightM.toFixed(2))} m`).join(', '),
  source: 'from the lengths given, else 2 m on the ground and 4 m on a roof (assumption)',
});

const trackersLine = (trackers: readonly MountRun[]): Assumption => {
  const level = trackers.filter(({ geometry }) => !('ground' in geometry));
  const value =
    level.length === trackers.length
      ? 'point exactly; level ground'
      : level.length === 0
        ? 'point exactly'
        : `point exactly; level ground for ${ids(level)}`;
  return { what: 'trackers', value, source: 'assumption' };
};

const groundLine = ({ mount, geometry }: MountRun): Assumption[] => {
  if (geometry.kind !== 'single-axis' || !geometry.ground) return [];
  const { slopeDeg, fallsTowardDeg } = geometry.ground;
  const degrees = (x: number) => Number(x.toFixed(2)) + 0;
  return [
    {
      what: `ground of ${mount.id}`,
      value:
        `even, falling ${degrees(slopeDeg)} degrees towards ${degrees(fallsTowardDeg)}: axis tilt ${degrees(geometry.axisTiltDeg)}, ` +
        `cross-axis slope ${degrees(crossAxisTiltOf(geometry))} degrees; its rise takes no even sky, and hides no sun from a lone row`,
      source: 'Anderson & Mikofski 2020, NREL/TP-5K00-76626, eqs. 18 and 26; the rest assumption',
    },
  ];
};

const reachLine = ({ mount, geometry, gcr }: MountRun): Assumption[] => {
  if (geometry.kind !== 'dual-axis' && geometry.kind !== 'turntable') return [];
  const elevation = geometry.kind === 'dual-axis' ? geometry.elevation : undefined;
  const { turns } = geometry;
  if (!turns && !elevation) return [];
  const parts = [
    ...(turns ? [`azimuth ${turns.fromDeg} to ${turns.toDeg}`] : []),
    ...(elevation ? [`elevation ${elevation.lowestDeg} to ${elevation.highestDeg}`] : []),
  ];
  const shade =
    turns && gcr !== null
      ? '; neighbours are taken to shade as if all faced the azimuth of the sun, which takes a tenth too little when held 40 degrees off it'
      : '';
  return [
    {
      what: `reach of ${mount.id}`,
      value: `faces ${parts.join(' and ')} degrees, as near to the sun as that allows${shade}`,
      source: 'the study; least angle of incidence, Duffie & Beckman, eq. 1.6.3',
    },
  ];
};

const cloudyLine = ({ runs, year }: Counted): Assumption[] => {
  const flat = runs.filter(({ geometry }) => geometry.kind === 'single-axis' && geometry.cloudy === 'flat');
  if (flat.length === 0) return [];
  const hours = overcastHours(year).reduce((sum, hour) => sum + hour, 0);
  return [
    {
      what: `overcast sky for ${ids(flat)}`,
      value: `flat in the ${hours} hours whose diffuse light is at least ${100 * OVERCAST_DIFFUSE} % of the global`,
      source: 'assumption; the drive knows the whole hour and loses no time',
    },
  ];
};

/** Every model, default and convention that the figures rest on, each with its source. */
export const assumptionsOf = (c: Counted): Assumption[] => {
  const { study, year, runs } = c;
  const trackers = runs.filter((run) => isTracker(run.geometry));
  const list: Assumption[] = [
    { what: 'sky model', value: study.sky.model, source: SKY_SOURCES[study.sky.model] },
    {
      what: 'ground reflectance',
      value: study.sky.albedo === 'file' ? 'from the weather file' : String(study.sky.albedo),
      source:
        study.sky.albedo === 'file' ? 'weather file' : 'the study, else 0.2 (common practice, no source)',
    },
    {
      what: 'sun',
      value: `${SAMPLES_PER_HOUR} positions over the sunlit part of each hour; solar constant ${SOLAR_CONSTANT_WM2} W/m2`,
      source: 'VSOP87 leading terms (Bretagnon & Francou 1988); Gueymard 2018',
    },
    {
      what: 'time labels of the weather file',
      value: `${year.label} of the hour${study.weather.addMinutes ? `, ${study.weather.addMinutes} minutes added by the study` : ''}`,
      source: study.weather.label ? 'the study' : 'the file format',
    },
    {
      what: 'glass',
      value: 'Martin & Ruiz, a_r 0.16',
      source: 'Martin & Ruiz 2001, Sol. Energy Mater. Sol. Cells 70, 25',
    },
    ...[...new Set(runs.map((run) => run.chain.heatLoss))].map((loss) => ({
      what: `cooling of ${ids(runs.filter((run) => run.chain.heatLoss === loss))}`,
      value: `U0 ${Number(loss.u0.toFixed(2))} W/m2K, U1 ${Number(loss.u1.toFixed(2))} Ws/m3K`,
      source: loss.source,
    })),
    {
      what: 'change of power with heat',
      value: `${((study.array.module?.heatPerK ?? USUAL_HEAT_PER_K) * 100).toFixed(2)} %/K`,
      source:
        study.array.module?.heatPerK == null
          ? 'common practice for crystalline silicon, no source'
          : 'the study',
    },
    {
      what: 'wind at the modules',
      value: year.windMs
        ? '10 m wind by the 1/7 power law'
        : 'still air, since the file has no wind: heat is overstated',
      source: 'power law, open ground',
    },
    arrayHeights(c),
    {
      what: 'power against light',
      value: 'in proportion to light at constant module temperature',
      source: 'rating at 1000 W/m2; weak-light loss not counted (assumption)',
    },
  ];
  if (runs.some((run) => run.gcr !== null))
    list.push({
      what: 'rows',
      value:
        'long, level and equal; every row is shaded like one in the middle; loss in proportion to the shaded area',
      source: 'assumption: strings of modules may lose more, a first row loses nothing',
    });
  if (c.shade)
    list.push({
      what: 'skyline',
      value: `hides the sun hour by hour, and the even sky and the horizon band (${HORIZON_BAND_DEG} degrees high) by its view${(c.survey.skyline?.profiles.length ?? 0) > 1 ? '; mean of all points of the array' : ''}`,
      source: 'the study; band after Perez et al. 1986, from memory; the ground before it is taken as lit',
    });
  if (trackers.length > 0)
    list.push(
      trackersLine(trackers),
      ...trackers.flatMap(groundLine),
      ...trackers.flatMap(reachLine),
      ...cloudyLine(c),
    );
  const snowy = runs.filter((run) => run.mount.snow !== null);
  if (snowy.length > 0)
    list.push({
      what: `snow on ${ids(snowy)}`,
      value:
        'takes the same share of every hour of its month, working, parked or dead; snow on the ground brightens nothing',
      source: 'the study, and assumption',
    });
  for (const { mount, parked } of trackers)
    if (mount.stow && parked)
      list.push({
        what: `stow of ${mount.id}`,
        value: `gust = hourly mean wind at 10 m x ${mount.stow.gustFactor ?? GUST_FACTOR}; an hour is parked whole or not at all; the rows or masts beside it park alike`,
        source:
          mount.stow.gustFactor === null
            ? 'assumption: the study gives no gust_factor; some sites gust more'
            : 'the study, and assumption',
      });
  const down = trackers.filter((run) => run.mount.drive?.working != null);
  if (down.length > 0)
    list.push({
      what: `downtime of ${ids(down)}`,
      value:
        'failures even over the year; while stuck, the rows or masts beside it stand alike; where it stopped on average: 7 turns or 18 directions of equal daylight',
      source: 'the study, and assumption',
    });
  if (study.array.given === false)
    list.push({ what: 'array', value: '1 kW of DC rating', source: 'the study gives no array' });
  if (study.finance.years !== null)
    list.push({
      what: 'discounting',
      value:
        'real money; yearly sums at the end of each year, renewals at the end of theirs, capital at year 0; ageing geometric',
      source: 'present cost over present energy; tax, land rent and a value left at the end are not counted',
    });
  return list;
};
