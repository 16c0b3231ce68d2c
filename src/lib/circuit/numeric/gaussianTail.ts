import { solveBracketed } from "./solveBracketed.ts";

/** Up to here the series of erf converges quickly and loses no digits of erfc; beyond, the continued fraction does. */
const joint = 1;

/** The complementary error function of x ≥ 0, to about 1e-14 relative. */
function complementaryError(x: number): number {
  return x < joint ? 1 - errorSeries(x) : tailFraction(x);
}

/** erf x = 2/√π·e^(−x²)·Σ 2ⁿx^(2n+1)/(2n+1)!!, all terms positive. */
function errorSeries(x: number): number {
  let [term, sum] = [x, x];
  for (let n = 1; term > sum * Number.EPSILON && n < 200; n++) {
    term *= (2 * x * x) / (2 * n + 1);
    sum += term;
  }
  return (2 / Math.sqrt(Math.PI)) * Math.exp(-x * x) * sum;
}

/** erfc x = e^(−x²)/√π · 1/(x + ½/(x + 1/(x + 3⁄2/(x + …)))), from the far end. */
function tailFraction(x: number): number {
  let below = x;
  for (let n = 160; n >= 1; n--) below = x + n / 2 / below;
  return Math.exp(-x * x) / Math.sqrt(Math.PI) / below;
}

/** The share of time that Gaussian noise spends beyond ± this many standard deviations. */
export function shareBeyond(deviations: number): number {
  return complementaryError(Math.abs(deviations) / Math.SQRT2);
}

/** The standard deviations to either side beyond which noise spends a share of its time, 0 < share < 1. */
export function deviationsFor(share: number): number {
  return solveBracketed((z) => Math.log(shareBeyond(z) / share), 0, 37);
}

/** The share of time that Gaussian noise spends above this many standard deviations, of either sign. */
export function shareAbove(deviations: number): number {
  const oneSide = shareBeyond(deviations) / 2;
  return deviations < 0 ? 1 - oneSide : oneSide;
}

/** Density of the standard normal distribution. */
export const gaussianDensity = (z: number): number => Math.exp(-0.5 * z * z) / Math.sqrt(2 * Math.PI);
