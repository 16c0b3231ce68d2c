import { incompleteBeta } from "./incompleteBeta.ts";
import { solveBracketed } from "./solveBracketed.ts";

/**
 * The exact bounds of a share of which `hits` of `trials` were seen (Clopper and Pearson, Biometrika 26 (1934) 404–413):
 * at each bound what was seen, or more extreme, has half of 1 − confidence.
 */
export function binomialBounds(hits: number, trials: number, confidence = 0.95): { low: number; high: number } {
  const tail = (1 - confidence) / 2;
  const low = hits === 0 ? 0 : betaQuantile(tail, hits, trials - hits + 1);
  const high = hits === trials ? 1 : betaQuantile(1 - tail, hits + 1, trials - hits);
  return { low, high };
}

const betaQuantile = (share: number, a: number, b: number) =>
  solveBracketed((x) => incompleteBeta(x, a, b) - share, 0, 1, 1e-13);

/** Straight passes needed to claim a yield with a confidence, one-sided: the least n with yieldⁿ ≤ 1 − confidence. */
export const straightPassesFor = (wanted: number, confidence = 0.95): number =>
  Math.ceil(Math.log(1 - confidence) / Math.log(wanted));
