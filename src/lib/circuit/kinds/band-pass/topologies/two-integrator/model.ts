import { add, multiply, type Polynomial } from "../../../../network/polynomial.ts";
import type { Transfer } from "../../../../network/transfer.ts";
import { inverseGain } from "../../model.ts";

/**
 * The loop: a summer whose inverting input meets Ri from the input, Ra from the low-pass output and Rb from its own
 * (high-pass) output, and whose other input gets the share RQ2/(RQ1 + RQ2) of the band-pass output; then two inverting
 * integrators R1, C1 and R2, C2.
 */
export interface NetworkValues {
  ri: number;
  ra: number;
  rb: number;
  rq1: number;
  rq2: number;
  r1: number;
  r2: number;
  c1: number;
  c2: number;
}

export interface OpAmps {
  gainBandwidth: number | null;
  openLoopGain: number | null;
}

/** The responses at the three outputs; one denominator. */
export interface Outputs {
  highPass: Transfer;
  bandPass: Transfer;
  lowPass: Transfer;
}

/** β, the share of the band-pass output that damps. */
export function damping({ rq1, rq2 }: Pick<NetworkValues, "rq1" | "rq2">): number {
  return rq2 / (rq1 + rq2);
}

/** Noise gain of the summer: (1/Ri + 1/Ra + 1/Rb)·Rb, 3 for equal resistors. */
export function summerNoiseGain({ ri, ra, rb }: Pick<NetworkValues, "ri" | "ra" | "rb">): number {
  return 1 + rb / ri + rb / ra;
}

/**
 * Transfer functions from the source, its resistance counted in Ri: second order with ideal op amps, fifth with three
 * single-pole ones. With σ = 1/A(s) and G = gi + ga + gb the node equations of summer and integrators are
 *   hp·(gb + σG) = β·G·bp − gi·vin − ga·lp
 *   bp·I1 = −g1·hp,  I1 = sC1 + σ(g1 + sC1)
 *   lp·I2 = −g2·bp,  I2 = sC2 + σ(g2 + sC2)
 * so that with D = (gb + σG)·I1·I2 + β·G·g1·I2 + ga·g1·g2
 *   bp = gi·g1·I2/D,  hp = −gi·I1·I2/D,  lp = −gi·g1·g2/D.
 * Every coefficient is a sum of positive terms, so no digits are lost.
 */
export function outputsOf(network: NetworkValues, opAmps: OpAmps): Outputs {
  const { ri, ra, rb, r1, r2, c1, c2 } = network;
  const [gi, ga, gb, g1, g2] = [1 / ri, 1 / ra, 1 / rb, 1 / r1, 1 / r2];
  const g = gi + ga + gb;
  const feed = damping(network) * g;
  const sigma = inverseGain(opAmps);
  if (!sigma) {
    // One s cancels against the integrators' own.
    const denominator = [ga * g1 * g2, feed * g1 * c2, gb * c1 * c2];
    return {
      highPass: { numerator: [0, 0, -gi * c1 * c2], denominator },
      bandPass: { numerator: [0, gi * g1 * c2], denominator },
      lowPass: { numerator: [-gi * g1 * g2], denominator },
    };
  }
  const first = integrator(g1, c1, sigma);
  const second = integrator(g2, c2, sigma);
  const denominator = add(multiply(add([gb], multiply([g], sigma)), first, second), multiply([feed * g1], second), [
    ga * g1 * g2,
  ]);
  return {
    highPass: { numerator: multiply([-gi], first, second), denominator },
    bandPass: { numerator: multiply([gi * g1], second), denominator },
    lowPass: { numerator: [-gi * g1 * g2], denominator },
  };
}

const integrator = (g: number, c: number, sigma: Polynomial) => add([0, c], multiply(sigma, [g, c]));

/** Centre and Q with ideal op amps: f0 = √(Rb/(Ra·R1·R2·C1·C2))/2π, Q = √(Rb·R1·C1/(Ra·R2·C2))/(β·N). */
export function idealFigures(network: NetworkValues): { centre: number; quality: number } {
  const { ra, rb, r1, r2, c1, c2 } = network;
  return {
    centre: Math.sqrt(rb / (ra * r1 * r2 * c1 * c2)) / (2 * Math.PI),
    quality: Math.sqrt((rb * r1 * c1) / (ra * r2 * c2)) / (damping(network) * summerNoiseGain(network)),
  };
}

/**
 * How much damping the op amps take, first order: 1/Q' = 1/Q − (2 + N)·f0/ft (N = 3: 5·f0/ft; the 4 that is often
 * quoted is the case N = 2).
 */
export function lostDamping(network: NetworkValues, gainBandwidth: number): number {
  return ((2 + summerNoiseGain(network)) * idealFigures(network).centre) / gainBandwidth;
}
