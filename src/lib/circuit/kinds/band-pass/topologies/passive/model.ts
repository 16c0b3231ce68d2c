import { add, multiply } from "../../../../network/polynomial.ts";
import type { Transfer } from "../../../../network/transfer.ts";

/** The network: C1 from the input to node a, R1 from a to ground, R2 from a to the output, C2 from there to ground. */
export interface NetworkValues {
  r1: number;
  c1: number;
  r2: number;
  c2: number;
}

export interface Surroundings {
  /** Ω, in series with C1. */
  sourceResistance: number;
  /** Ω beside C2, or null for none. */
  loadResistance: number | null;
}

export const nothingAround: Surroundings = { sourceResistance: 0, loadResistance: null };

/**
 * Transfer function, second order whatever is around it. With P = g2 + gL + sC2 at the output node and the input branch
 * sC1/(1 + sC1·Rs):
 *   H = g2·sC1 / [(g1 + sC1(1 + g1·Rs))·P + (1 + sC1·Rs)·g2·(gL + sC2)]
 * Every coefficient is a sum of positive terms.
 */
export function transferOf({ r1, c1, r2, c2 }: NetworkValues, around: Surroundings): Transfer {
  const [g1, g2] = [1 / r1, 1 / r2];
  const rs = around.sourceResistance;
  const gL = around.loadResistance === null ? 0 : 1 / around.loadResistance;
  return {
    numerator: [0, g2 * c1],
    denominator: add(multiply([g1, c1 * (1 + g1 * rs)], [g2 + gL, c2]), multiply([1, c1 * rs], [g2 * gL, g2 * c2])),
  };
}

/** How many times smaller the low-pass capacitor is: R2 as many times R1, and Q that much nearer to ½. */
export const usualRatio = 10;

/** R1 and R2 with R1·C1 = R2·C2, unloaded: both corners at f0. */
export function idealResistors(centre: number, c1: number, c2: number) {
  const omega = 2 * Math.PI * centre;
  return { r1: 1 / (omega * c1), r2: 1 / (omega * c2) };
}
