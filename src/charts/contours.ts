import type { DialPoint } from './polar-field.ts';

/** Values on a square grid over the dial; `values[row * size + column]`, rows from south, columns from west. */
export interface Grid {
  readonly size: number;
  readonly step: number;
  /** x of the first column, y of the first row. */
  readonly origin: number;
  readonly values: Float64Array;
}

/** Samples a field on a square from -reach to +reach. */
export const sampleGrid = (field: (x: number, y: number) => number, reach: number, step: number): Grid => {
  const size = Math.round((2 * reach) / step) + 1;
  const values = new Float64Array(size * size);
  for (let r = 0; r < size; r++)
    for (let c = 0; c < size; c++) values[r * size + c] = field(-reach + c * step, -reach + r * step);
  return { size, step, origin: -reach, values };
};

/**
 * The closed outlines of where a grid is at or above a level, by marching squares (Lorensen & Cline, "Marching cubes",
 * Computer Graphics 21(4), 1987, in two dimensions; a saddle is decided by the mean of its corners). Outside the grid
 * counts as below. High ground lies on the left of each outline, so that outlines of heights and of hollows run
 * opposite ways and fill as a polygon with holes. Each outline ends where it began.
 */
export const outlines = (grid: Grid, level: number): DialPoint[][] => {
  const { size, step, origin, values } = grid;
  const at = (c: number, r: number): number =>
    c < 0 || r < 0 || c >= size || r >= size ? Number.NEGATIVE_INFINITY : values[r * size + c];
  const wide = size + 2;
  /** Edges are numbered so that two cells that share one find the same number: 2 per node, rightward then upward. */
  const edge = (c: number, r: number, upward: boolean): number =>
    2 * ((r + 1) * wide + c + 1) + (upward ? 1 : 0);
  const next = new Map<number, number>();
  for (let r = -1; r < size; r++) {
    let se = Number.NEGATIVE_INFINITY;
    let ne = Number.NEGATIVE_INFINITY;
    for (let c = -1; c < size; c++) {
      const sw = se;
      const nw = ne;
      se = at(c + 1, r);
      ne = at(c + 1, r + 1);
      const inside =
        (sw >= level ? 1 : 0) | (se >= level ? 2 : 0) | (ne >= level ? 4 : 0) | (nw >= level ? 8 : 0);
      if (inside === 0 || inside === 15) continue;
      const sides = [edge(c, r, false), edge(c + 1, r, true), edge(c, r + 1, false), edge(c, r, true)];
      const saddleHigh = (sw + se + nw + ne) / 4 >= level;
      for (const [from, to] of segments(inside, saddleHigh)) next.set(sides[from], sides[to]);
    }
  }
  const point = (id: number): DialPoint => {
    const node = id >> 1;
    const [c, r] = [(node % wide) - 1, Math.floor(node / wide) - 1];
    const [c2, r2] = id & 1 ? [c, r + 1] : [c + 1, r];
    const [a, b] = [at(c, r), at(c2, r2)];
    const share =
      a === Number.NEGATIVE_INFINITY ? 1 : b === Number.NEGATIVE_INFINITY ? 0 : (level - a) / (b - a);
    return [origin + (c + share * (c2 - c)) * step, origin + (r + share * (r2 - r)) * step];
  };
  const loops: DialPoint[][] = [];
  while (next.size > 0) {
    const first = next.keys().next().value!;
    const loop: DialPoint[] = [];
    for (let id: number | undefined = first; id !== undefined; ) {
      loop.push(point(id));
      const to = next.get(id);
      next.delete(id);
      id = to;
    }
    loops.push(loop);
  }
  return loops;
};

/** Sides of a cell: 0 south, 1 east, 2 north, 3 west. For each case from where to where the outline runs, high on its left. */
const CASES: readonly (readonly (readonly [number, number])[])[] = [
  [], [[0, 3]], [[1, 0]], [[1, 3]], [[2, 1]], [], [[2, 0]], [[2, 3]],
  [[3, 2]], [[0, 2]], [], [[1, 2]], [[3, 1]], [[0, 1]], [[3, 0]], [],
]; // biome-ignore format: sixteen cases, corners SW 1, SE 2, NE 4, NW 8

const segments = (inside: number, saddleHigh: boolean): readonly (readonly [number, number])[] => {
  if (inside === 5) return saddleHigh ? [[0, 1], [2, 3]] : [[0, 3], [2, 1]];
  if (inside === 10) return saddleHigh ? [[3, 0], [1, 2]] : [[1, 0], [3, 2]];
  return CASES[inside];
}; // biome-ignore format: two saddles

/** The parts of a line that lie within a circle round the centre, cut where they cross it. */
export const withinCircle = (line: readonly DialPoint[], radius: number): DialPoint[][] => {
  const parts: DialPoint[][] = [];
  let part: DialPoint[] = [];
  const close = () => {
    if (part.length > 1) parts.push(part);
    part = [];
  };
  line.forEach((p, i) => {
    const isIn = Math.hypot(...p) <= radius;
    const before = line[i - 1];
    if (before && Math.hypot(...before) <= radius !== isIn) part.push(crossing(before, p, radius));
    if (isIn) part.push(p);
    else close();
  });
  close();
  return parts;
};

const crossing = (a: DialPoint, b: DialPoint, radius: number): DialPoint => {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]];
  const [qa, qb, qc] = [
    dx * dx + dy * dy,
    a[0] * dx + a[1] * dy,
    a[0] * a[0] + a[1] * a[1] - radius * radius,
  ];
  const root = Math.sqrt(Math.max(0, qb * qb - qa * qc));
  const share = [(-qb - root) / qa, (-qb + root) / qa].find((s) => s >= -1e-9 && s <= 1 + 1e-9) ?? 0;
  return [a[0] + share * dx, a[1] + share * dy];
};
