import { type Finding, type Problem, TrackworthError, wrap360 } from '../shared/index.ts';
import { type Skyline, type SkylinePoint, skylineOfPoints, turnPoints } from './skyline.ts';
import { plain } from './words.ts';

/** Common practice, no source: measured points should lie no farther apart than this. */
export const WIDEST_GAP_DEG = 15;

/** Where a point stands, for messages: a line of a file, or a field of a study. */
export type PointPlace = Pick<Problem, 'file' | 'line' | 'column' | 'field'>;

export type PlaceOf = (index: number) => PointPlace;

/** What is wrong with the points of one skyline, bearings as read; empty where nothing is. */
export const pointProblems = (points: readonly SkylinePoint[], placeOf: PlaceOf): Problem[] => {
  const problems = points.flatMap((point, index) => problemsOfPoint(point, placeOf(index)));
  const seen = new Map<number, number>();
  points.forEach(({ azimuthDeg, elevationDeg }, index) => {
    const azimuth = isBearing(azimuthDeg) ? azimuthDeg % 360 : azimuthDeg;
    const other = seen.get(azimuth);
    if (other === undefined) seen.set(azimuth, elevationDeg);
    else if (other !== elevationDeg)
      problems.push(twoElevations(azimuth, other, elevationDeg, placeOf(index)));
  });
  if (seen.size < 2) problems.push(tooFew(seen.size, placeOf(0)));
  return problems;
};

/**
 * The skyline through points in any order; throws all their problems together (codes `wrong-bearing`, `wrong-elevation`,
 * `two-elevations`, `too-few-points`). Bearings are checked as read, then turned by the declination (east positive; 0 for
 * true bearings), once.
 */
export const checkedSkyline = (
  name: string,
  points: readonly SkylinePoint[],
  declinationDeg: number,
  placeOf: PlaceOf = (index) => ({ field: `points[${index}]` }),
): Skyline => {
  const problems = pointProblems(points, placeOf);
  if (problems.length > 0) throw new TrackworthError('input', problems);
  return skylineOfPoints(name, turnPoints(points, declinationDeg));
};

const isBearing = (deg: number): boolean => deg >= 0 && deg <= 360;

/** A warning that names the gaps over 15 degrees between measured points; none for skylines made of obstacles. */
export const gapFindings = ({ name, corners }: Skyline): Finding[] => {
  const gaps = corners.flatMap(({ azimuthDeg: from }, i) => {
    const to = corners[(i + 1) % corners.length].azimuthDeg;
    const span = wrap360(to - from) || 360;
    return span > WIDEST_GAP_DEG + 1e-9 ? [`${plain(from)} to ${plain(to)}`] : [];
  });
  if (gaps.length === 0) return [];
  return [
    {
      code: 'skyline-gap',
      severity: 'warning',
      text: `Skyline ${name} has no point for over ${WIDEST_GAP_DEG} degrees (common practice) from ${gaps.join(', ')}; a straight line was drawn there.`,
      fix: 'Measure between, at least where the sun passes.',
    },
  ];
};

const problemsOfPoint = ({ azimuthDeg, elevationDeg }: SkylinePoint, place: PointPlace): Problem[] => [
  ...(isBearing(azimuthDeg)
    ? []
    : [
        {
          ...place,
          code: 'wrong-bearing',
          expected: 'a bearing from 0 to 360 degrees',
          found: String(azimuthDeg),
          fix: 'Count clockwise from north.',
        },
      ]),
  ...(elevationDeg >= 0 && elevationDeg <= 90
    ? []
    : [
        {
          ...place,
          code: 'wrong-elevation',
          expected: 'an elevation angle from 0 to 90 degrees',
          found: String(elevationDeg),
          fix: 'Level is 0 and overhead 90; write 0 where the skyline lies below level.',
        },
      ]),
];

const twoElevations = (azimuthDeg: number, a: number, b: number, place: PointPlace): Problem => ({
  ...place,
  code: 'two-elevations',
  expected: `one elevation at bearing ${plain(azimuthDeg)}`,
  found: `${plain(a)} and ${plain(b)}`,
  fix: `Remove one, or write a vertical edge as ${plain(azimuthDeg)} and ${plain(wrap360(azimuthDeg + 0.1))}.`,
});

const tooFew = (count: number, place: PointPlace): Problem => ({
  ...place,
  code: 'too-few-points',
  expected: 'a skyline of at least two bearings',
  found: count === 0 ? 'none' : 'one',
  fix: 'Give a point at least every 15 degrees; leave the skyline out where the horizon is open.',
});
