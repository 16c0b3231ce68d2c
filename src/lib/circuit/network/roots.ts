import { aberth } from "./aberth.ts";
import { size, type Complex } from "./complex.ts";
import { trim, type Polynomial } from "./polynomial.ts";

const leastNormal = 2 ** -1022;

/**
 * All roots of a real polynomial, by the simultaneous iteration of Aberth (Math. Comp. 27 (1973) 339) started on the
 * radii of the upper convex hull of log|cᵢ| (Bini, Numer. Algorithms 13 (1996) 179), which keeps it sound when roots
 * lie many decades apart: a filter's poles at 1 kHz beside an op amp's at 3 MHz.
 *
 * @param p constant term first; highest non-zero coefficient decides the degree
 * @returns as many roots as the degree, one beyond the largest double as infinite; those of a real polynomial come in
 *   conjugate pairs, imaginary parts below rounding are set to zero
 * @throws RangeError where a coefficient is not finite or the iteration does not settle
 */
export function findRoots(p: Polynomial): Complex[] {
  if (p.some((c) => !Number.isFinite(c))) throw new RangeError("findRoots: every coefficient must be finite");
  // What underflow has left of a coefficient holds no digits to find a root from.
  const coefficients = trim(p.map((c) => (Math.abs(c) < leastNormal ? 0 : c)));
  const zeros = coefficients.findIndex((c) => c !== 0);
  if (zeros > 0)
    return [...Array.from({ length: zeros }, () => ({ re: 0, im: 0 })), ...findRoots(coefficients.slice(zeros))];
  const degree = coefficients.length - 1;
  if (degree < 1) return [];
  const gap = wideGap(coefficients);
  if (gap) return [...findRoots(coefficients.slice(0, gap + 1)), ...findRoots(coefficients.slice(gap))];
  if (degree === 1) return [{ re: -coefficients[0]! / coefficients[1]!, im: 0 }];
  if (degree === 2) return quadraticRoots(coefficients[0]!, coefficients[1]!, coefficients[2]!);
  return iterated(coefficients).map(snapToReal);
}

/** Roots farther apart than this do not move each other by as much as rounding does. */
const independent = 1e20;

/**
 * The index at which the polynomial falls into two whose roots are independent: a vertex of the hull with a wide gap
 * between the radii on its sides. Keeps the iteration away from over- and underflow too.
 */
function wideGap(c: readonly number[]): number | undefined {
  const hull = upperHull(c);
  const logRadius = (k: number) => (hull[k - 1]!.log - hull[k]!.log) / (hull[k]!.i - hull[k - 1]!.i);
  for (let k = 1; k < hull.length - 1; k++)
    if (logRadius(k + 1) - logRadius(k) > Math.log(independent)) return hull[k]!.i;
  return undefined;
}

/** Roots of c0 + c1 s + c2 s², without the cancellation of the schoolbook formula. */
function quadraticRoots(c0: number, c1: number, c2: number): Complex[] {
  const half = c1 / 2;
  const discriminant = half * half - c2 * c0;
  if (discriminant < 0) {
    const im = Math.sqrt(-discriminant) / Math.abs(c2);
    return [
      { re: -half / c2, im },
      { re: -half / c2, im: -im },
    ];
  }
  const q = -(half + (half < 0 ? -1 : 1) * Math.sqrt(discriminant));
  if (q === 0)
    return [
      { re: 0, im: 0 },
      { re: 0, im: 0 },
    ];
  return [
    { re: q / c2, im: 0 },
    { re: c0 / q, im: 0 },
  ];
}

/**
 * The iteration on roots brought near to size one by a power of two, which costs no digit: their squares then neither
 * overflow nor vanish.
 */
function iterated(c: readonly number[]): Complex[] {
  const degree = c.length - 1;
  const unit = 2 ** Math.round((Math.log2(Math.abs(c[0]!)) - Math.log2(Math.abs(c[degree]!))) / degree);
  const scaled = c.map((coefficient, i) => {
    let value = coefficient / c[degree]!;
    // Step by step, since unit ** i may overflow where the product does not.
    for (let k = i; k < degree; k++) value /= unit;
    return value;
  });
  const start = startingPoints(scaled);
  const [re, im] = [start.map((z) => z.re), start.map((z) => z.im)];
  aberth(scaled, re, im);
  return re.map((x, k) => ({ re: x * unit, im: im[k]! * unit }));
}

/** The upper convex hull of the points (i, log|cᵢ|); its slopes are the logarithms of the radii on which roots lie. */
function upperHull(c: readonly number[]): { i: number; log: number }[] {
  const points = c
    .map((x, i) => ({ i, log: x === 0 ? -Infinity : Math.log(Math.abs(x)) }))
    .filter((p) => p.log > -Infinity);
  const hull: typeof points = [];
  for (const point of points) {
    while (hull.length > 1) {
      const [a, b] = [hull.at(-2)!, hull.at(-1)!];
      if ((b.log - a.log) * (point.i - a.i) > (point.log - a.log) * (b.i - a.i)) break;
      hull.pop();
    }
    hull.push(point);
  }
  return hull;
}

/** Radii from the hull, spread in angle. */
function startingPoints(c: readonly number[]): Complex[] {
  const hull = upperHull(c);
  return hull.slice(1).flatMap((to, k) => {
    const from = hull[k]!;
    const count = to.i - from.i;
    const radius = Math.exp((from.log - to.log) / count);
    // An irrational offset keeps the start off the real axis, where conjugate symmetry would hold the iteration.
    return Array.from({ length: count }, (_, j) => {
      const angle = (2 * Math.PI * j) / count + (2 * Math.PI * k) / (c.length - 1) + 0.7;
      return { re: radius * Math.cos(angle), im: radius * Math.sin(angle) };
    });
  });
}

function snapToReal(root: Complex): Complex {
  return Math.abs(root.im) <= 1e-11 * size(root) ? { re: root.re, im: 0 } : root;
}
