/** Finds `x` in `low..high` with `f(x) = 0` by bisection; `f` changes sign once. Ends when the bracket is under `tolerance`. */
export const bisect = (f: (x: number) => number, low: number, high: number, tolerance: number): number => {
  let [a, b] = [low, high];
  const rising = f(b) > f(a);
  while (b - a > tolerance) {
    const middle = (a + b) / 2;
    if (f(middle) > 0 === rising) b = middle;
    else a = middle;
  }
  return (a + b) / 2;
};

const INVERSE_GOLDEN = (Math.sqrt(5) - 1) / 2;

/** Finds the maximum of a single-peaked `f` on `low..high` to within `tolerance` (golden-section search, Kiefer 1953). */
export const goldenMaximum = (
  f: (x: number) => number,
  low: number,
  high: number,
  tolerance: number,
): number => {
  let [a, b] = [low, high];
  let c = b - INVERSE_GOLDEN * (b - a);
  let d = a + INVERSE_GOLDEN * (b - a);
  let [fc, fd] = [f(c), f(d)];
  while (b - a > tolerance) {
    if (fc > fd) {
      [b, d, fd] = [d, c, fc];
      c = b - INVERSE_GOLDEN * (b - a);
      fc = f(c);
    } else {
      [a, c, fc] = [c, d, fd];
      d = a + INVERSE_GOLDEN * (b - a);
      fd = f(d);
    }
  }
  return (a + b) / 2;
};

/** Rounds to `digits` significant digits; the JSON output carries 10. */
export const toSignificant = (x: number, digits: number): number =>
  Number.isFinite(x) ? Number(x.toPrecision(digits)) : x;
