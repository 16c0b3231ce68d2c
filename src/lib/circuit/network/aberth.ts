const maxIterations = 200;

/**
 * Roots of a polynomial by the simultaneous iteration of Aberth (Math. Comp. 27 (1973) 339), from given starting points,
 * which it moves. Real and imaginary parts are kept in arrays of numbers: this is the innermost loop of every analysis,
 * and objects for complex numbers would cost five times as much.
 *
 * @param c constant term first, first and last not zero
 * @throws RangeError where the iteration runs away
 */
export function aberth(c: readonly number[], re: number[], im: number[]): void {
  const degree = re.length;
  const reversed = [...c].reverse();
  const settled = re.map(() => false);
  let left = degree;
  for (let iteration = 0; iteration < maxIterations && left > 0; iteration++) {
    for (let k = 0; k < degree; k++) {
      if (settled[k]) continue;
      const ratio = newtonRatio(c, reversed, re[k]!, im[k]!);
      if (ratio) move(re, im, k, ratio);
      if (ratio && stepSize > 4 * Number.EPSILON * Math.sqrt(re[k]! ** 2 + im[k]! ** 2)) continue;
      settled[k] = true;
      left--;
    }
  }
  // A cluster settles more slowly than a simple root; rounding alone decides its last digits.
  if (!re.every(Number.isFinite) || !im.every(Number.isFinite)) throw new RangeError("findRoots: no convergence");
}

/** Size of the step that {@link move} took last. */
let stepSize = 0;

/** Takes root k by ratio/(1 − ratio·Σ 1/(z − zⱼ)): Newton's step, turned away from the other roots. */
function move(re: number[], im: number[], k: number, ratio: readonly [number, number]): void {
  let [sumRe, sumIm] = [0, 0];
  for (let j = 0; j < re.length; j++) {
    if (j === k) continue;
    const [dr, di] = [re[k]! - re[j]!, im[k]! - im[j]!];
    const squared = dr * dr + di * di;
    if (squared === 0) continue;
    sumRe += dr / squared;
    sumIm -= di / squared;
  }
  const [a, b] = ratio;
  const below = [1 - (a * sumRe - b * sumIm), -(a * sumIm + b * sumRe)] as const;
  const [stepRe, stepIm] = divide(a, b, below[0], below[1]);
  re[k]! -= stepRe;
  im[k]! -= stepIm;
  stepSize = Math.sqrt(stepRe * stepRe + stepIm * stepIm);
}

/** p(z)/p'(z), or undefined where p(z) is already below its rounding error. Large |z| goes through the reversed polynomial. */
function newtonRatio(
  c: readonly number[],
  reversed: readonly number[],
  zr: number,
  zi: number,
): readonly [number, number] | undefined {
  const outside = zr * zr + zi * zi > 1;
  const [wr, wi] = outside ? divide(1, 0, zr, zi) : [zr, zi];
  const p = outside ? reversed : c;
  const degree = p.length - 1;
  const radius = Math.sqrt(wr * wr + wi * wi);
  let [value, valueIm, slope, slopeIm] = [p[degree]!, 0, 0, 0];
  let bound = Math.abs(value);
  for (let i = degree - 1; i >= 0; i--) {
    const nextSlope = slope * wr - slopeIm * wi + value;
    slopeIm = slope * wi + slopeIm * wr + valueIm;
    slope = nextSlope;
    const nextValue = value * wr - valueIm * wi + p[i]!;
    valueIm = value * wi + valueIm * wr;
    value = nextValue;
    bound = bound * radius + Math.sqrt(value * value + valueIm * valueIm);
  }
  if (Math.sqrt(value * value + valueIm * valueIm) <= bound * 4 * Number.EPSILON) return undefined;
  if (!outside) return divide(value, valueIm, slope, slopeIm);
  // p(z) = zⁿ r(1/z), so p/p' = z r / (n r − w r').
  return divide(
    zr * value - zi * valueIm,
    zr * valueIm + zi * value,
    degree * value - (wr * slope - wi * slopeIm),
    degree * valueIm - (wr * slopeIm + wi * slope),
  );
}

/** (a + jb)/(c + jd); zero for a divisor of zero, from where the iteration goes on. */
function divide(a: number, b: number, c: number, d: number): readonly [number, number] {
  const squared = c * c + d * d;
  return squared === 0 ? [0, 0] : [(a * c + b * d) / squared, (b * c - a * d) / squared];
}
