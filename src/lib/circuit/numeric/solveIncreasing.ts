/**
 * The root of an increasing function with a known slope: Newton's steps, kept inside a bracket that shrinks with every
 * sign seen and replaced by bisection where a step would leave it.
 *
 * @param f value and slope at x; a value that overflows counts by its sign
 * @param start where the root is expected, between `from` and `to`
 * @returns the end of the bracket where the root lies beyond it
 */
export function solveIncreasing(
  f: (x: number) => readonly [value: number, slope: number],
  start: number,
  from: number,
  to: number,
  relativeTolerance = 1e-15,
): number {
  let [a, b] = [from, to];
  let x = Math.min(Math.max(start, from), to);
  for (let i = 0; i < mostSteps; i++) {
    const [value, slope] = f(x);
    if (value === 0) return x;
    if (value < 0) a = x;
    else b = x;
    const newton = x - value / slope;
    const next = newton > a && newton < b ? newton : (a + b) / 2;
    if (Math.abs(next - x) <= relativeTolerance * Math.max(1, Math.abs(x))) return next;
    x = next;
  }
  return x;
}

/** Bisection alone needs fewer for any bracket of finite doubles that is worth solving in. */
const mostSteps = 200;
