import { add, multiply } from "../../network/polynomial.ts";
import type { Transfer } from "../../network/transfer.ts";

/** An inverting sum: each path's resistor to the inverting input, RF and CF from the output to it. */
export interface Sum {
  /** Ω of each fitted path, its source resistance included. */
  resistances: readonly number[];
  rf: number;
  /** F; 0 for none. */
  cf: number;
  gainBandwidth: number | null;
  openLoopGain: number | null;
}

/** 1/A(s), constant term first. */
function sigmaOf({ gainBandwidth, openLoopGain }: Sum): readonly [number, number] {
  if (gainBandwidth === null) return [0, 0];
  return [openLoopGain === null ? 0 : 1 / openLoopGain, 1 / (2 * Math.PI * gainBandwidth)];
}

const total = (resistances: readonly number[]) => resistances.reduce((sum, r) => sum + 1 / r, 0);

/**
 * Transfer function of one path. The inverting input m = −σ·o, and Σ(vk − m)gk = (m − o)(gF + sCF), so that
 *   H = −gk/[(gF + sCF) + σ(Σg + gF + sCF)].
 */
export function transferOf(sum: Sum, resistance: number): Transfer {
  const feedback = sum.cf > 0 ? [1 / sum.rf, sum.cf] : [1 / sum.rf];
  const [constant, slope] = sigmaOf(sum);
  const denominator = add(
    feedback,
    slope === 0 ? [0] : multiply([constant, slope], add([total(sum.resistances)], feedback)),
  );
  return { numerator: [-1 / resistance], denominator };
}

/** Noise gain at low frequency: 1 + RF·Σ(1/Rk). A path that is grounded counts as one that plays. */
export function noiseGain({ resistances, rf }: Pick<Sum, "resistances" | "rf">): number {
  return 1 + rf * total(resistances);
}

/**
 * Where a low-pass without zeros has fallen by 3 dB, Hz. With x = ω²: for a0 + a1·s + a2·s² it is the root of
 * a2²x² + (a1² − 2·a0·a2)x − a0² = 0.
 *
 * @returns undefined where it never falls
 */
export function bandwidthOf({ denominator }: Transfer): number | undefined {
  const [a0 = 0, a1 = 0, a2 = 0] = denominator;
  if (a1 === 0) return undefined;
  // In units of the first-order corner a0/a1 nothing over- or underflows.
  const q = (a0 / a1) * (a2 / a1);
  const half = (1 - 2 * q) / 2;
  // 1/(half + √(half² + q²)) is the root without the difference of like terms.
  const x = 1 / (half + Math.hypot(half, q));
  return (Math.sqrt(x) * (a0 / a1)) / (2 * Math.PI);
}

/** RMS of signals of which any two have the correlation ρ times the product of their signs. */
export function sumRms(levels: readonly number[], signs: readonly number[], correlation: number): number {
  const powers = levels.reduce((sum, level) => sum + level * level, 0);
  const signed = levels.reduce((sum, level, k) => sum + level * signs[k]!, 0);
  // Σa² + ρ·(pairs), and the pairs are (Σ±a)² − Σa².
  return Math.sqrt(Math.max(0, powers + correlation * (signed * signed - powers)));
}

/** Gains of the same resistors joined without an op amp: Gk/(ΣG + Gload). */
export function passiveGains(resistances: readonly number[], loadResistance: number | null): number[] {
  const all = total(resistances) + (loadResistance === null ? 0 : 1 / loadResistance);
  return resistances.map((r) => 1 / r / all);
}
