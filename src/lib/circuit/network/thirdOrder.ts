import { solveBracketed } from "../numeric/solveBracketed.ts";
import { evaluate } from "./polynomial.ts";

const tolerance = 1e-15;

/**
 * Peak of |H|² = k²·x/D(x) for a cubic D with positive ends, x = ω² in any unit: the root of D − x·D' = d0 − d2·x² − 2·d3·x³.
 * Its coefficients change sign once (d3 > 0, d0 > 0), so by Descartes' rule there is exactly one positive root, and a
 * bracket with it inside is found by doubling: no polynomial roots, no choice among peaks.
 */
export function peakOfCubic([d0, , d2, d3]: readonly number[]): number {
  return within((x) => d0! - d2! * x * x - 2 * d3! * x * x * x, 1);
}

/**
 * The two half-power points about the peak p: roots of D(x) − 2·D(p)/p·x. It is positive at zero and at infinity and
 * negative at p, and by Descartes' rule has no more than these two positive roots.
 */
export function edgesOfCubic(bottom: readonly number[], peak: number): [lower: number, upper: number] {
  const chord = (2 * evaluate(bottom, peak)) / peak;
  const excess = (x: number) => evaluate(bottom, x) - chord * x;
  let [below, above] = [peak / 2, peak * 2];
  while (excess(below) < 0) below /= 2;
  while (excess(above) < 0) above *= 2;
  return [solveBracketed(excess, below, peak, tolerance), solveBracketed(excess, peak, above, tolerance)];
}

/** The root of a function that is positive below it and negative above it, searched outwards from `start`. */
function within(falling: (x: number) => number, start: number): number {
  let [low, high] = [start, start];
  while (falling(low) < 0) low /= 2;
  while (falling(high) > 0) high *= 2;
  return low === high ? start : solveBracketed(falling, low, high, tolerance);
}
