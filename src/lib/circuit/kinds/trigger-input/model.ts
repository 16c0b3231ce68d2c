import { solveBracketed } from "../../numeric/solveBracketed.ts";

/** Share of a step that a differentiator of time constant τ passes of a ramp of rise time tr: (τ/tr)(1 − e^(−tr/τ)). */
export function edgeShare(riseTime: number, timeConstant: number): number {
  const x = riseTime / timeConstant;
  return x < 1e-12 ? 1 : -Math.expm1(-x) / x;
}

/**
 * The longest rise time of which that share is still passed.
 *
 * @param share between 0 and 1
 * @returns undefined where even an upright edge passes less
 */
export function slowestEdge(share: number, timeConstant: number): number | undefined {
  if (!(share > 0 && share < 1)) return undefined;
  // 1 − x/2 ≤ (1 − e^(−x))/x ≤ 1/x holds the root between 1 − share and 1/share; twice that keeps rounding from closing the bracket.
  return timeConstant * solveBracketed((x) => edgeShare(x, 1) - share, 1 - share, 2 / share);
}

export interface Velocity {
  gain: number;
  drop: number;
  /** Share of the full charge that the pulse reaches: 1 − e^(−tw/τc). */
  fill: number;
}

/** Peak (g·V − Vd)(1 − e^(−tw/τc)), zero in the dead zone. */
export function velocityPeak(voltage: number, { gain, drop, fill }: Velocity): number {
  return Math.max(0, gain * voltage - drop) * fill;
}

/** 5 : 1 in decibels: what a velocity range of that ratio should give. */
export const idealRange = 20 * Math.log10(5);

interface VelocityConditions {
  velocity: number | null;
  velocityGain: number;
  velocityDrop: number;
  chargeTimeConstant: number | null;
}

/** How the velocity path treats a pulse of the given width; none charges nothing, unless the charge is immediate. */
export function velocityOf(
  { velocityGain: gain, velocityDrop: drop, chargeTimeConstant: tau }: Omit<VelocityConditions, "velocity">,
  pulseWidth: number | undefined,
): Velocity {
  return { gain, drop, fill: tau === null ? 1 : -Math.expm1(-(pulseWidth ?? 0) / tau) };
}

/** Peaks at the given velocity, at three fifths and at a fifth of it, and what the range between them is in loudness. */
export function velocityFigures(conditions: VelocityConditions, pulseWidth: number | undefined) {
  const { velocity } = conditions;
  if (velocity === null) return {};
  const path = velocityOf(conditions, pulseWidth);
  const at = (share: number) => velocityPeak(share * velocity, path);
  const [velocityPeakLow, full] = [at(1 / 5), at(1)];
  return {
    velocityPeak: full,
    velocityPeakMiddle: at(3 / 5),
    velocityPeakLow,
    velocityDeadZone: path.drop / path.gain,
    ...(velocityPeakLow > 0 && { velocityRangeDb: 20 * Math.log10(full / velocityPeakLow) }),
  };
}

/** Time until the button's filter, charging towards the rail, crosses the threshold: τ·ln(V/(V − Vth)). */
export function buttonLatency(timeConstant: number, rail: number, threshold: number): number | undefined {
  return threshold > 0 && threshold < rail ? -timeConstant * Math.log1p(-threshold / rail) : undefined;
}
