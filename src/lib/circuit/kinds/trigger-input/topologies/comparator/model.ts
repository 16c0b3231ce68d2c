export interface ComparatorNetwork {
  rin: number;
  rh: number;
  rr1: number;
  rr2: number;
}

/** Reference VR·Rr2/(Rr1 + Rr2) and the thresholds at the jack: Vref(1 + Rin/Rh) − Vol·Rin/Rh rising, − Voh·Rin/Rh falling. */
export function thresholdsOf({ rin, rh, rr1, rr2 }: ComparatorNetwork, rail: number, high: number, low: number) {
  const reference = (rail * rr2) / (rr1 + rr2);
  const ratio = rin / rh;
  const middle = reference * (1 + ratio);
  return { reference, rising: middle - low * ratio, falling: middle - high * ratio };
}

/**
 * How long a gate with straight edges of equal time stays above the thresholds: from the rising threshold on the way up
 * to the falling one on the way down.
 */
export function gateWidth(height: number, length: number, edge: number, rising: number, falling: number) {
  if (!(height > rising && falling < height)) return undefined;
  // A falling threshold below ground is never passed by a gate that returns to ground.
  if (falling <= 0) return undefined;
  return length + edge * (1 - Math.max(0, rising) / height) + edge * (1 - falling / height);
}

/** How long the spike of a differentiator, V·e^(−t/τ), stays above the falling threshold: τ·ln(V/VT−). */
export function spikeWidth(peak: number, timeConstant: number, rising: number, falling: number) {
  return peak > rising && falling > 0 && falling < peak ? timeConstant * Math.log(peak / falling) : undefined;
}
