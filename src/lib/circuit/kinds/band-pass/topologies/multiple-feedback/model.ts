import type { Transfer } from "../../../../network/transfer.ts";

/** The network: RA from the input to node x, RB from x to ground, C1 from x to the output, C2 from x to the inverting input, RF from the output to it. */
export interface NetworkValues {
  ra: number;
  rb: number;
  rf: number;
  c1: number;
  c2: number;
}

export interface Surroundings {
  /** Ω, added to RA. */
  sourceResistance: number;
  /** Ω, or null for none. */
  loadResistance: number | null;
  /** Hz of the op amp's single-pole open-loop gain; null for an ideal one. */
  gainBandwidth: number | null;
  /** Open-loop gain at DC, or null for none that matters. */
  openLoopGain: number | null;
  /** Ω, open loop. */
  outputResistance: number;
}

export const idealSurroundings: Surroundings = {
  sourceResistance: 0,
  loadResistance: null,
  gainBandwidth: null,
  openLoopGain: null,
  outputResistance: 0,
};

/**
 * Transfer function from the source to the output: second order with an ideal op amp, third with one of finite
 * gain-bandwidth A(s) = A0/(1 + s·A0/(2π·ft)).
 *
 * Node equations, Vm the inverting input, σ(s) = 1/A(s) = 1/A0 + s/(2π·ft), G = 1/(RA + Rs) + 1/RB, gF = 1/RF, Ro the
 * op amp's output resistance and gL the load:
 *   x:  Vx(G + s(C1 + C2)) = Vin/(RA + Rs) + Vo·sC1 + Vm·sC2
 *   m:  Vm(sC2 + gF) = Vx·sC2 + Vo·gF
 *   o:  σ[Vo + Ro(Vo·gL + (Vo − Vx)sC1 + (Vo − Vm)gF)] + Vm = 0
 * Eliminating Vx and Vm by hand leaves no difference of like terms in the denominator, so no digits are lost:
 *   H = −s·M/(RA + Rs) / [(1 + σ(1 + Ro·gL))·E + s·G·σ·N]
 *   E = gF·G + s·gF(C1 + C2) + s²C1C2
 *   N = C2(1 + Ro(gL + gF)) + Ro·C1·gF + s·Ro·C1C2,  M = C2 − σ·Ro·(gF(C1 + C2) + s·C1C2)
 */
export function transferOf({ ra, rb, rf, c1, c2 }: NetworkValues, around: Surroundings): Transfer {
  const gIn = 1 / (ra + around.sourceResistance);
  const g = gIn + 1 / rb;
  const gF = 1 / rf;
  const [e0, e1, e2] = [gF * g, gF * (c1 + c2), c1 * c2];
  if (around.gainBandwidth === null) return { numerator: [0, -gIn * c2], denominator: [e0, e1, e2] };
  const s0 = around.openLoopGain === null ? 0 : 1 / around.openLoopGain;
  const s1 = 1 / (2 * Math.PI * around.gainBandwidth);
  const ro = around.outputResistance;
  const gL = around.loadResistance === null ? 0 : 1 / around.loadResistance;
  const [n0, n1] = [c2 * (1 + ro * (gL + gF)) + ro * c1 * gF, ro * c1 * c2];
  const [a0, a1] = [1 + (1 + ro * gL) * s0, (1 + ro * gL) * s1];
  // Multiplied out by hand: this is done three times in every analysis, and at each point of a search.
  return {
    numerator:
      ro === 0 ? [0, -gIn * c2] : [0, -gIn * (c2 - ro * s0 * e1), gIn * ro * (s0 * e2 + s1 * e1), gIn * ro * s1 * e2],
    denominator: [
      a0 * e0,
      a0 * e1 + a1 * e0 + g * s0 * n0,
      a0 * e2 + a1 * e1 + g * (s0 * n1 + s1 * n0),
      a1 * e2 + g * s1 * n1,
    ],
  };
}

/**
 * Centre frequency with an ideal op amp, Hz: f0 = √((1/RA + 1/RB)/(RF·C1·C2))/2π.
 */
export function idealCentre({ ra, rb, rf, c1, c2 }: NetworkValues): number {
  return Math.sqrt((1 / ra + 1 / rb) / (rf * c1 * c2)) / (2 * Math.PI);
}

/**
 * RF, RA and RB for an ideal op amp and any pair of capacitors. From BW = (C1 + C2)/(2π·C1·C2·RF),
 * |H0| = (RF/RA)·C2/(C1 + C2) and f0 above; with C1 = C2 = C: RF = Q/(π·f0·C), RA = RF/(2|H0|),
 * RB = Q/(2π·f0·C·(2Q² − |H0|)).
 *
 * @returns `rb` negative or infinite where no resistor gives the targets; see {@link largestGain}
 */
export function idealResistors(centre: number, quality: number, gain: number, c1: number, c2: number) {
  const omega = 2 * Math.PI * centre;
  const rf = (quality * (c1 + c2)) / (omega * c1 * c2);
  const ra = (rf * c2) / (gain * (c1 + c2));
  const conductance = omega * omega * rf * c1 * c2 - 1 / ra;
  return { rf, ra, rb: 1 / conductance };
}

/** The peak gain that a quality factor leaves room for: RB vanishes at |H0| = Q²(C1 + C2)/C1, 2Q² for equal capacitors. */
export function largestGain(quality: number, c1: number, c2: number): number {
  return (quality * quality * (c1 + c2)) / c1;
}

/**
 * Noise gain of the op amp at the centre, a plain ratio: 1 + C2·G·RF/(C1 + C2), which is 1 + 2Q² for equal capacitors.
 * The feedback factor is E/(E + s·C2·G); at s² = −gF·G/(C1·C2) its even terms cancel and it is real.
 */
export function noiseGainAtCentre({ ra, rb, rf, c1, c2 }: NetworkValues): number {
  const g = 1 / ra + 1 / rb;
  return 1 + (c2 * g * rf) / (c1 + c2);
}

/** Semitones between two frequencies. */
export function semitonesBetween(from: number, to: number): number {
  return 12 * Math.log2(to / from);
}
