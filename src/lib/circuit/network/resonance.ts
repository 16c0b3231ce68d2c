import { add, differentiate, evaluate, multiply } from "./polynomial.ts";
import { noiseIntegral } from "./noiseIntegral.ts";
import { magnitudeAt, naturalScale, positiveRoots, powerGain, type Transfer } from "./transfer.ts";

/** What a band-pass response amounts to, read off the exact transfer function. */
export interface Resonance {
  /** Where the magnitude peaks, Hz. */
  centreFrequency: number;
  /** |H| there. */
  peakGain: number;
  /** The −3 dB points (half power), Hz. */
  lowerEdge: number;
  upperEdge: number;
  /** Hz between the −3 dB points. */
  bandwidth: number;
  /** Centre over bandwidth. */
  qualityFactor: number;
  /** Bandwidth of the ideal rectangular filter of the same peak that passes as much white noise, Hz. */
  noiseBandwidth: number;
}

/**
 * Reads centre, peak, −3 dB points and noise bandwidth off a band-pass transfer function of any order.
 *
 * |H|² = N(x)/D(x) with x = ω²; the peak is a root of N'D − ND', the −3 dB points are the roots of 2·N·Dₚ − Nₚ·D
 * next to it. No search over a frequency grid, so no grid decides the digits.
 *
 * @returns undefined where the response has no peak with two −3 dB points
 */
export function readResonance(transfer: Transfer): Resonance | undefined {
  const unit = naturalScale(transfer.denominator.slice(0, 3));
  const { top, bottom } = powerGain(transfer, unit);
  const slope = add(multiply(differentiate(top), bottom), multiply([-1], top, differentiate(bottom)));
  const gain = (x: number) => evaluate(top, x) / evaluate(bottom, x);
  const peaks = positiveRoots(slope);
  if (peaks.length === 0) return undefined;
  const peak = peaks.reduce((best, x) => (gain(x) > gain(best) ? x : best));
  const half = gain(peak) / 2;
  const edges = positiveRoots(add(top, multiply([-half], bottom)));
  const lower = edges.filter((x) => x < peak).at(-1);
  const upper = edges.find((x) => x > peak);
  if (lower === undefined || upper === undefined) return undefined;
  const hertz = (x: number) => (Math.sqrt(x) * unit) / (2 * Math.PI);
  const [centreFrequency, lowerEdge, upperEdge] = [hertz(peak), hertz(lower), hertz(upper)];
  const bandwidth = upperEdge - lowerEdge;
  const peakGain = magnitudeAt(transfer, centreFrequency);
  return {
    centreFrequency,
    peakGain,
    lowerEdge,
    upperEdge,
    bandwidth,
    qualityFactor: centreFrequency / bandwidth,
    noiseBandwidth: noiseIntegral(transfer) / peakGain ** 2,
  };
}
