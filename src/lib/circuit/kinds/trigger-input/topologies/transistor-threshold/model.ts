import { diodeConductance, diodeCurrent, diodeVoltage, type DiodeLaw } from "../../../../device/diode.ts";
import { integrate } from "../../../../numeric/integrate.ts";
import { solveBracketed } from "../../../../numeric/solveBracketed.ts";

export interface ThresholdNetwork {
  ra: number;
  rb: number;
  cd: number;
  rd: number;
  rs: number;
}

/** Voltage in front of RA at which the base stands at vbe and takes a current: vbe(1 + RA/RB) + ib·RA. */
export function thresholdAt({ ra, rb }: ThresholdNetwork, vbe: number, baseCurrent: number): number {
  return vbe * (1 + ra / rb) + baseCurrent * ra;
}

/** The differentiator as the threshold network loads it before the transistor conducts: RD ∥ (RA + RB) behind RS and CD. */
export function offNetwork({ ra, rb, cd, rd, rs }: ThresholdNetwork) {
  const load = 1 / (1 / rd + 1 / (ra + rb));
  return { load, timeConstant: (load + rs) * cd, share: load / (load + rs) };
}

/**
 * How long an upright step keeps the node in front of RA above a threshold, the base held at vbe meanwhile. With
 * Re = RD ∥ RA and τ = (Re + RS)·CD the node falls from Vpk = (V/RS + vbe/RA)(RS ∥ Re) towards vbe·Re/RA:
 * tw = τ·ln((Vpk − V∞)/(Vth − V∞)).
 *
 * @returns undefined where the step never reaches the threshold
 */
export function heldWidth(network: ThresholdNetwork, step: number, vbe: number, threshold: number): number | undefined {
  const { ra, cd, rd, rs } = network;
  const re = 1 / (1 / rd + 1 / ra);
  const settles = (vbe * re) / ra;
  const peak = (step / rs + vbe / ra) / (1 / rs + 1 / re);
  return peak > threshold && threshold > settles
    ? (re + rs) * cd * Math.log((peak - settles) / (threshold - settles))
    : undefined;
}

/** The same with nothing behind the differentiator: (RD + RS)·CD·ln(V·RD/((RD + RS)·Vth)). */
export function unloadedWidth({ cd, rd, rs }: ThresholdNetwork, step: number, threshold: number): number | undefined {
  const peak = (step * rd) / (rd + rs);
  return peak > threshold ? (rd + rs) * cd * Math.log(peak / threshold) : undefined;
}

/**
 * How long an upright step keeps the collector current above a value, the junction following its exponential law. The
 * state is the base voltage, on which everything else depends explicitly; its equation is separated and the time
 * integrated: CD·d(va + RS·i)/dvb = −i, with i = va/RD + vb/RB + ib and va = vb + RA(vb/RB + ib).
 *
 * @param base law of the base current
 * @returns undefined where the step never drives the collector so far
 */
export function junctionWidth(
  { ra, rb, cd, rd, rs }: ThresholdNetwork,
  step: number,
  base: DiodeLaw,
  baseCurrent: number,
): number | undefined {
  const at = (vb: number) => {
    const intoBase = vb / rb + diodeCurrent(base, vb);
    const va = vb + ra * intoBase;
    return { va, current: va / rd + intoBase };
  };
  const slope = (vb: number) => {
    const intoBase = 1 / rb + diodeConductance(base, vb);
    const va = 1 + ra * intoBase;
    return va + rs * (va / rd + intoBase);
  };
  const drive = (vb: number) => at(vb).va + rs * at(vb).current - step;
  const end = diodeVoltage(base, baseCurrent);
  if (!(drive(end) < 0)) return undefined;
  // With all of the step across RA, the base could stand no higher than this.
  const start = solveBracketed(drive, end, Math.max(end, diodeVoltage(base, step / ra)) + 1e-9);
  return integrate((vb) => (cd * slope(vb)) / at(vb).current, end, start, 1e-12);
}
