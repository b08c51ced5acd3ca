import { atan2Deg, type Problem, TrackworthError, wrap360 } from '../shared/index.ts';
import type { Skyline, SkylineCorner } from './skyline.ts';
import type { PlaceOf, PointPlace } from './skyline-points.ts';
import { unionOf } from './skyline-union.ts';

/** Something that stands before the sky from one bearing clockwise to another, at one distance. */
export interface Obstacle {
  /** Above the lowest point of the array, above 0. */
  readonly heightM: number;
  /** Level distance from the array, above 0. */
  readonly distanceM: number;
  /** Bearings 0..360, clockwise; 350 to 10 passes north, 0 to 360 is all round. */
  readonly fromDeg: number;
  readonly toDeg: number;
}

/** Elevation angle of an obstacle's top. */
export const obstacleElevationDeg = ({ heightM, distanceM }: Obstacle): number =>
  atan2Deg(heightM, distanceM);

const isFullCircle = ({ fromDeg, toDeg }: Obstacle): boolean =>
  fromDeg !== toDeg && wrap360(fromDeg) === wrap360(toDeg);

/**
 * The skyline of obstacles: each at its own height over its bearings, the higher where two overlap, level elsewhere.
 * Bearings are checked as read, then turned by the declination (east positive; 0 for true bearings), once. Throws all
 * problems together (codes `wrong-obstacle`, `wrong-bearing`).
 */
export const skylineOfObstacles = (
  name: string,
  obstacles: readonly Obstacle[],
  declinationDeg: number,
  placeOf: PlaceOf = (index) => ({ field: `obstacles[${index}]` }),
): Skyline => {
  const problems = obstacles.flatMap((obstacle, index) => problemsOf(obstacle, placeOf(index)));
  if (obstacles.length === 0)
    problems.push({
      code: 'wrong-obstacle',
      expected: 'at least one obstacle',
      found: 'none',
      fix: 'Leave the skyline out where the horizon is open.',
    });
  if (problems.length > 0) throw new TrackworthError('input', problems);
  return unionOf(
    name,
    obstacles.map((o) => ({ name, corners: edgesOf(o, declinationDeg) })),
  );
};

const edgesOf = (obstacle: Obstacle, declinationDeg: number): SkylineCorner[] => {
  const top = obstacleElevationDeg(obstacle);
  const rise = { azimuthDeg: wrap360(obstacle.fromDeg + declinationDeg), beforeDeg: 0, afterDeg: top };
  const fall = { azimuthDeg: wrap360(obstacle.toDeg + declinationDeg), beforeDeg: top, afterDeg: 0 };
  if (isFullCircle(obstacle)) return [{ ...rise, beforeDeg: top }];
  return [rise, fall].sort((a, b) => a.azimuthDeg - b.azimuthDeg);
};

const problemsOf = (obstacle: Obstacle, place: PointPlace): Problem[] => {
  const { heightM, distanceM, fromDeg, toDeg } = obstacle;
  const problem = (code: string, expected: string, found: number, fix: string): Problem => ({
    ...place,
    code,
    expected,
    found: String(found),
    fix,
  });
  const dial = 'Count clockwise from north.';
  return [
    ...(heightM > 0 && Number.isFinite(heightM)
      ? []
      : [
          problem(
            'wrong-obstacle',
            'a height above 0, in metres',
            heightM,
            "Measure it from the array's lowest point; leave out what stays below.",
          ),
        ]),
    ...(distanceM > 0 && Number.isFinite(distanceM)
      ? []
      : [
          problem(
            'wrong-obstacle',
            'a distance above 0, in metres',
            distanceM,
            'Measure it level from the array.',
          ),
        ]),
    ...[fromDeg, toDeg]
      .filter((bearing) => !(bearing >= 0 && bearing <= 360))
      .map((bearing) => problem('wrong-bearing', 'a bearing from 0 to 360 degrees', bearing, dial)),
    ...(fromDeg === toDeg
      ? [
          problem(
            'wrong-bearing',
            `another bearing than ${fromDeg} to end at`,
            toDeg,
            'Give both edges as seen from the array, clockwise; 0 to 360 is all round.',
          ),
        ]
      : []),
  ];
};
