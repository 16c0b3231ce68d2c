/** Newton's method settles within a dozen steps from the bound below; more means the arguments are no numbers. */
const mostSteps = 200;

/**
 * The root u of u + scale·(e^(u/slope) − 1) = voltage: what a resistor and an exponential junction in series share.
 *
 * The left side rises and is convex, so Newton's method falls monotonically onto the root from any point above it. Two
 * such points are known for a positive voltage: the voltage itself, and slope·ln(1 + voltage/scale).
 *
 * @param scale ≥ 0, volts
 * @param slope > 0, volts
 * @throws RangeError where the residual does not vanish to rounding
 */
export function solvedVoltage(voltage: number, scale: number, slope: number): number {
  if (scale === 0) return voltage;
  let u = voltage > 0 ? Math.min(voltage, slope * Math.log1p(voltage / scale)) : 0;
  for (let step = 0; step < mostSteps; step++) {
    const grown = scale * Math.expm1(u / slope);
    const residual = u + grown - voltage;
    const next = u - residual / (1 + (grown + scale) / slope);
    if (u - next > 4 * Number.EPSILON * Math.abs(u)) {
      u = next;
      continue;
    }
    // What is left of the fall is rounding, which the exponential magnifies by u/slope.
    const sizes = Math.abs(u) + Math.abs(grown) + Math.abs(voltage);
    const rounding = Number.EPSILON * (1 + Math.abs(u / slope)) * sizes;
    if (Math.abs(residual) <= 8 * rounding) return u;
    break;
  }
  throw new RangeError(`solvedVoltage: no root for ${voltage} V, scale ${scale} V, slope ${slope} V`);
}
