import { add, multiply } from "../../../../network/polynomial.ts";
import { polesOf, type Transfer } from "../../../../network/transfer.ts";
import { inverseGain } from "../../model.ts";

/** The network: C1 from the inverting input to node x, C2 from x to the output, R1 from x to ground, R2 from the output to the inverting input, Rin from the input to it. */
export interface NetworkValues {
  r1: number;
  r2: number;
  rin: number;
  c1: number;
  c2: number;
}

export interface OpAmp {
  gainBandwidth: number | null;
  openLoopGain: number | null;
}

/**
 * Transfer function from the source, its resistance counted in Rin: second order with an ideal op amp, third with one
 * pole.
 *
 * Node equations, m the inverting input, σ = 1/A(s), D = g1 + s(C1 + C2):
 *   x:  x·D = m·sC1 + o·sC2
 *   m:  m(gin + g2 + sC1) = vin·gin + x·sC1 + o·g2
 *   o:  σ·o = −m
 * so that H = −gin·D/(E + σF) with E = g2·D + s²C1C2 and F = (gin + g2)D + sC1·g1 + s²C1C2. All terms are positive.
 */
export function transferOf({ r1, r2, rin, c1, c2 }: NetworkValues, opAmp: OpAmp): Transfer {
  const [g1, g2, gin] = [1 / r1, 1 / r2, 1 / rin];
  const e = [g2 * g1, g2 * (c1 + c2), c1 * c2];
  const f = [(gin + g2) * g1, (gin + g2) * (c1 + c2) + c1 * g1, c1 * c2];
  const sigma = inverseGain(opAmp);
  return {
    numerator: [-gin * g1, -gin * (c1 + c2)],
    denominator: sigma ? add(e, multiply(sigma, f)) : e,
  };
}

export interface PolePair {
  /** Hz. */
  centre: number;
  quality: number;
  /** s; the ring falls by e in it. */
  timeConstant: number;
  /** Whether the pair is complex: only then does the network ring. */
  rings: boolean;
}

/** The resonant pair of poles: the complex one, or else the two slowest, of which the first to die decides nothing. */
export function polePair(transfer: Transfer): PolePair {
  const poles = polesOf(transfer).sort((a, b) => Math.hypot(a.re, a.im) - Math.hypot(b.re, b.im));
  const complex = poles.find(({ im }) => im > 0);
  if (complex) {
    const size = Math.hypot(complex.re, complex.im);
    return {
      centre: size / (2 * Math.PI),
      quality: size / (-2 * complex.re),
      timeConstant: -1 / complex.re,
      rings: true,
    };
  }
  const [slow, fast] = [-poles[0]!.re, -poles[1]!.re];
  return {
    centre: (Math.sqrt(slow) * Math.sqrt(fast)) / (2 * Math.PI),
    quality: 1 / (Math.sqrt(slow / fast) + Math.sqrt(fast / slow)),
    timeConstant: 1 / slow,
    rings: false,
  };
}

/** Centre and Q with an ideal op amp: f0 = 1/(2π√(C1C2R1R2)), Q = √(R2/R1)·√(C1C2)/(C1 + C2). */
export function idealFigures({ r1, r2, c1, c2 }: Omit<NetworkValues, "rin">): { centre: number; quality: number } {
  return {
    centre: 1 / (2 * Math.PI * Math.sqrt(c1 * c2) * Math.sqrt(r1 * r2)),
    quality: (Math.sqrt(r2 / r1) * Math.sqrt(c1 * c2)) / (c1 + c2),
  };
}

/** Noise gain at the ideal centre without Rin: 1 + (R2/R1)·C1/(C1 + C2), which is 1 + 2Q² for equal capacitors. */
export function noiseGainAtCentre({ r1, r2, c1, c2 }: Omit<NetworkValues, "rin">): number {
  return 1 + ((r2 / r1) * c1) / (c1 + c2);
}

/** R1 and R2 for an ideal op amp: τ = 2·R2·C1·C2/(C1 + C2) first, then f0. */
export function idealResistors(centre: number, timeConstant: number, c1: number, c2: number) {
  const r2 = (timeConstant * (c1 + c2)) / (2 * c1 * c2);
  const omega = 2 * Math.PI * centre;
  return { r2, r1: 1 / (omega * omega * c1 * c2 * r2) };
}
