import { type BearingReading, type Obstacle, slopeOfRiseRun, tiltErrorOfGrade } from '../survey/index.ts';
import type { WrittenLength } from './fields/readings.ts';
import type { RawBearing, RawSlope } from './schema/readings.ts';
import type { RawObstacle, RawSkyline } from './schema/skyline.ts';
import type { MountReadings, StudyBearing, StudySkyline } from './study-file.ts';

/** The reading of a sound group; null where it names neither north or both, which is reported elsewhere. */
export const readingOf = (raw: RawBearing): BearingReading | null => {
  const bearingDeg = raw.magnetic ?? raw.true;
  if (bearingDeg === undefined || (raw.magnetic !== undefined && raw.true !== undefined)) return null;
  return {
    north: raw.true === undefined ? 'magnetic' : 'true',
    bearingDeg,
    backDeg: raw.back ?? null,
    taken: raw.taken ?? 'facing',
    downslope: raw.downslope ?? null,
    errorDeg: raw.error ?? null,
  };
};

const bearingOf = (raw: RawBearing): StudyBearing | null => {
  const reading = readingOf(raw);
  if (!reading) return null;
  return {
    north: reading.north,
    reading,
    dated: raw.dated ?? null,
    declinationDeg: raw.declination?.declinationDeg ?? null,
    printedYear: raw.declination?.year ?? null,
  };
};

const withError = (written: string, error: { readonly written: string } | undefined): string =>
  error ? `${written} (error ${error.written})` : written;

const slopeOf = (raw: RawSlope): MountReadings['slope'] => {
  const { reading, error, rise, run, rise_error, run_error } = raw;
  if (reading) {
    const { tiltDeg, written } = reading;
    const errorDeg = error?.unit === '%' ? tiltErrorOfGrade(tiltDeg, error.size) : (error?.size ?? null);
    // `3:12` is a rise over a run as well, however it is written.
    return { tiltDeg, errorDeg, written: withError(written, error), riseAndRun: /[:/]/.test(written) };
  }
  if (!rise || !run) return null;
  const metres = (length: WrittenLength | undefined) => length?.lengthM ?? null;
  const lengths = {
    riseM: rise.lengthM,
    runM: run.lengthM,
    riseErrorM: metres(rise_error),
    runErrorM: metres(run_error),
  };
  const written = [
    `rise ${withError(rise.written, rise_error)}`,
    `run ${withError(run.written, run_error)}`,
  ].join(', ');
  return { ...slopeOfRiseRun(lengths), written, riseAndRun: true };
};

/** What was read on site for one mount; null where nothing was. */
export const readingsOf = (mount: {
  readonly bearing?: RawBearing | undefined;
  readonly slope?: RawSlope | undefined;
}): MountReadings | null => {
  if (!mount.bearing && !mount.slope) return null;
  return {
    bearing: mount.bearing ? bearingOf(mount.bearing) : null,
    slope: mount.slope ? slopeOf(mount.slope) : null,
  };
};

export const obstacleOf = (raw: RawObstacle): Obstacle => ({
  heightM: raw.height,
  distanceM: raw.distance,
  fromDeg: raw.from,
  toDeg: raw.to,
});

/** What a skyline is called where the study gives no name. */
export const skylineName = (name: string | undefined, index: number): string => name ?? `point ${index + 1}`;

export const skylinesOf = (raw: RawSkyline | RawSkyline[] | undefined): StudySkyline[] | null => {
  if (raw === undefined) return null;
  return [raw].flat().map((one, index) => ({
    name: skylineName(one.name, index),
    north: one.bearings ?? 'true',
    dated: one.dated ?? null,
    declinationDeg: one.declination?.declinationDeg ?? null,
    printedYear: one.declination?.year ?? null,
    file: one.file ?? null,
    points: one.points ?? null,
    obstacles: one.obstacles?.map(obstacleOf) ?? null,
  }));
};
