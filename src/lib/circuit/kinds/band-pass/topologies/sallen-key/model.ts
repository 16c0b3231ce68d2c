import { add, multiply } from "../../../../network/polynomial.ts";
import type { Transfer } from "../../../../network/transfer.ts";
import { inverseGain } from "../../model.ts";

/** The network: R1 from the input to node x, C1 from x to ground, C2 from x to the + input, R2 from there to ground, R3 from the output to x; RF and RG set the gain. */
export interface NetworkValues {
  r1: number;
  r2: number;
  r3: number;
  rf: number;
  rg: number;
  c1: number;
  c2: number;
}

export interface OpAmp {
  gainBandwidth: number | null;
  openLoopGain: number | null;
}

/** K = 1 + RF/RG. */
export function amplifierGain({ rf, rg }: Pick<NetworkValues, "rf" | "rg">): number {
  return 1 + rf / rg;
}

/**
 * Transfer function from the source, its resistance counted in R1: second order with an ideal op amp, third with one
 * pole.
 *
 * Node equations, p the + input, σ = 1/A(s), G = g1 + g3:
 *   x:  x(G + s(C1 + C2)) = vin·g1 + p·sC2 + o·g3
 *   p:  p(sC2 + g2) = x·sC2
 *   o:  σ·o = p − o/K
 * so that H = K·g1·sC2 / [(1 + Kσ)·E − K·g3·sC2] with E = g2·G + s(C2·G + g2(C1 + C2)) + s²C1C2.
 * The one difference is the network's own: the positive feedback that makes Q.
 */
export function transferOf({ r1, r2, r3, rf, rg, c1, c2 }: NetworkValues, opAmp: OpAmp): Transfer {
  const [g1, g2, g3] = [1 / r1, 1 / r2, 1 / r3];
  const gain = amplifierGain({ rf, rg });
  const e = [g2 * (g1 + g3), c2 * (g1 + g3) + g2 * (c1 + c2), c1 * c2];
  // C2·g3(1 − K) is exact where K is near 1; forming C2·g3 − K·C2·g3 would not be.
  const damping = c2 * g1 + g2 * (c1 + c2) - c2 * g3 * (rf / rg);
  const ideal = [e[0]!, damping, e[2]!];
  const sigma = inverseGain(opAmp);
  return {
    numerator: [0, gain * g1 * c2],
    denominator: sigma ? add(ideal, multiply([gain], sigma, e)) : ideal,
  };
}

/** Centre with an ideal op amp, Hz: f0 = √((1/R1 + 1/R3)/(C1·C2·R2))/2π. */
export function idealCentre({ r1, r2, r3, c1, c2 }: NetworkValues): number {
  return Math.sqrt((1 / r1 + 1 / r3) / (c1 * c2 * r2)) / (2 * Math.PI);
}

/** The gain at which the ideal network oscillates: Kosc = [C2(1/R1 + 1/R3) + (C1 + C2)/R2]·R3/C2; 4 for equal parts. */
export function oscillationGain({ r1, r2, r3, c1, c2 }: NetworkValues): number {
  return 1 + r3 / r1 + (r3 * (c1 + c2)) / (r2 * c2);
}

/** First-order fall of the centre with a finite gain-bandwidth, relative: K²/(2·R3·C1·2π·ft); K²f0/(2√2·ft) for equal parts. */
export function centreShift(network: NetworkValues, gainBandwidth: number): number {
  return amplifierGain(network) ** 2 / (2 * network.r3 * network.c1 * 2 * Math.PI * gainBandwidth);
}

/**
 * R = R1 = R2 = R3 and the gain for an ideal op amp and any capacitors: f0 = √2/(2πR√(C1C2)),
 * Q = √(2C1C2)/(C1 + 3C2 − K·C2).
 */
export function idealDesign(centre: number, quality: number, c1: number, c2: number) {
  return {
    resistance: Math.SQRT2 / (2 * Math.PI * centre * Math.sqrt(c1 * c2)),
    gain: (c1 + 3 * c2 - Math.sqrt(2 * c1 * c2) / quality) / c2,
  };
}

/** The Q of a gain of 1, below which there is no gain: √(2C1C2)/(C1 + 2C2), 0.471 for equal capacitors. */
export function leastQuality(c1: number, c2: number): number {
  return Math.sqrt(2 * c1 * c2) / (c1 + 2 * c2);
}
