/** Evenly spread numbers 0..1 from a seed (mulberry32, Tommy Ettinger 2017, public domain), so that a failure can be repeated. */
export const seeded = (seed: number): (() => number) => {
  let state = seed | 0;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32;
  };
};

/** The largest of a table of errors, kept together with where it stood; print it, then assert it. */
export class Worst {
  size = 0;
  where = '';
  count = 0;
  note(error: number, where: string): void {
    this.count++;
    if (!(Math.abs(error) <= this.size)) {
      this.size = Math.abs(error);
      this.where = where;
    }
  }
  print(what: string): void {
    console.log(`${what}: worst ${this.size.toPrecision(3)} of ${this.count} (${this.where})`);
  }
}
