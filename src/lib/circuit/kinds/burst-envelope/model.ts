export interface Oscillator {
  rt: number;
  ct: number;
  /** Share of the output that the plus input sees: R1/(R1 + R2). */
  share: number;
  high: number;
  low: number;
  /** Volts across Rt by the comparator's bias current. */
  biasShift: number;
}

/** Times of the output's two states and of the first high state from the resting capacitor, s. */
export interface Timing {
  high: number;
  low: number;
  first: number;
}

/**
 * Timing of the gated relaxation oscillator. The capacitor heads for Voh − Ib·Rt or Vol − Ib·Rt and turns at β·Voh and
 * β·Vol: th = RC·ln((Voh − βVol)/(Voh − βVoh)), tl = RC·ln((Vol − βVoh)/(Vol − βVol)); the first high state starts at
 * the resting voltage. With a swing of ±V and no bias the period is 2RC·ln((1 + β)/(1 − β)).
 *
 * @returns undefined where the capacitor never reaches a threshold, or rests beyond the upper one
 */
export function timingOf({ rt, ct, share, high, low, biasShift }: Oscillator, rest: number): Timing | undefined {
  const [upper, lower] = [share * high, share * low];
  const [rises, falls] = [high - biasShift, low - biasShift];
  if (!(rises > upper && falls < lower && rest < upper)) return undefined;
  const rc = rt * ct;
  return {
    high: rc * Math.log((rises - lower) / (rises - upper)),
    low: rc * Math.log((falls - upper) / (falls - lower)),
    first: rc * Math.log((rises - rest) / (rises - upper)),
  };
}

/** Gate length Rg·Cg·ln(Vs/Vth): the capacitor empties from Vs to Vth. Undefined where it starts below. */
export function gateLength(rg: number, cg: number, source: number, threshold: number): number | undefined {
  return source > threshold ? rg * cg * Math.log(source / threshold) : undefined;
}

/** Hits within a gate: one at its start, one after the first interval, and one a period from then on. */
export function countHits(gate: number, first: number, period: number): number {
  return gate < first ? 1 : Math.floor((gate - first) / period) + 2;
}

/** Times of the hits, s. */
export function timesOf(count: number, first: number, period: number): number[] {
  return Array.from({ length: count }, (_, k) => (k === 0 ? 0 : first + (k - 1) * period));
}

/** Worst error of the ratio of two RC products: (1 + tR)(1 + tC)/((1 − tR)(1 − tC)) − 1. */
export function worstRatioError(resistorTolerance: number, capacitorTolerance: number): number {
  return (
    ((1 + resistorTolerance) * (1 + capacitorTolerance)) / ((1 - resistorTolerance) * (1 - capacitorTolerance)) - 1
  );
}

/** Level left of an exponential decay after a time, dB. */
export const decayedDb = (time: number, timeConstant: number): number => (-20 * time) / timeConstant / Math.LN10;
