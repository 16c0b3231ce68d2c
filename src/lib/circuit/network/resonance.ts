import { add, differentiate, evaluate, multiply } from "./polynomial.ts";
import { noiseIntegral } from "./noiseIntegral.ts";
import { edgesOfCubic, peakOfCubic } from "./thirdOrder.ts";
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
 * Reads centre, peak, −3 dB points and noise bandwidth off a stable band-pass transfer function of any order.
 *
 * @returns undefined where the response has no peak with two −3 dB points
 */
export function readResonance(transfer: Transfer): Resonance | undefined {
  return secondOrder(transfer) ?? anyOrder(transfer);
}

/**
 * H = k·s/(c0 + c1·s + c2·s²), where everything has a closed form: f0 = √(c0/c2)/2π, B = c1/(2π·c2), |H0| = |k|/c1,
 * the −3 dB points at ∓B/2 + √(f0² + B²/4), and Bₙ = (π/2)·B.
 */
function secondOrder({ numerator, denominator }: Transfer): Resonance | undefined {
  if (denominator.length !== 3 || numerator.length !== 2 || numerator[0] !== 0) return undefined;
  const [c0, c1, c2] = denominator as readonly [number, number, number];
  const centreFrequency = Math.sqrt(c0 / c2) / (2 * Math.PI);
  const bandwidth = c1 / c2 / (2 * Math.PI);
  const mean = Math.hypot(centreFrequency, bandwidth / 2);
  return {
    centreFrequency,
    peakGain: Math.abs(numerator[1]!) / c1,
    // The difference of two nearly equal figures where the band is wide is avoided: f1·f2 = f0².
    lowerEdge: centreFrequency ** 2 / (mean + bandwidth / 2),
    upperEdge: mean + bandwidth / 2,
    bandwidth,
    qualityFactor: centreFrequency / bandwidth,
    noiseBandwidth: (Math.PI / 2) * bandwidth,
  };
}

/**
 * |H|² = N(x)/D(x) with x = ω²; the peak is a root of N'D − ND', the −3 dB points are the roots of 2·N·Dₚ − Nₚ·D
 * next to it. No search over a frequency grid, so no grid decides the digits.
 */
function anyOrder(transfer: Transfer): Resonance | undefined {
  const scaled = scaledPower(transfer);
  const peak = peakOf(scaled);
  if (peak === undefined) return undefined;
  const edges = edgesOf(scaled, peak);
  if (edges === undefined) return undefined;
  const { unit } = scaled;
  const [lower, upper] = edges;
  const [centreFrequency, lowerEdge, upperEdge] = [hertz(peak, unit), hertz(lower, unit), hertz(upper, unit)];
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

/** Where the magnitude peaks, Hz, without the rest of {@link readResonance}; undefined where it has no peak. */
export function readCentre(transfer: Transfer): number | undefined {
  const closed = secondOrder(transfer);
  if (closed) return closed.centreFrequency;
  const scaled = scaledPower(transfer);
  const peak = peakOf(scaled);
  return peak === undefined ? undefined : hertz(peak, scaled.unit);
}

function scaledPower(transfer: Transfer) {
  const unit = naturalScale(transfer.denominator.slice(0, 3));
  return { ...powerGain(transfer, unit), unit };
}

interface Power {
  top: number[];
  bottom: number[];
}

/** A second-order band-pass behind one op amp's pole: the case that is analysed most, and needs no root finder. */
const isCubicWithOneZero = ({ top, bottom }: Power) =>
  bottom.length === 4 && bottom[0]! > 0 && bottom[3]! > 0 && top.slice(2).every((c) => c === 0) && top[0] === 0;

function edgesOf({ top, bottom }: Power, peak: number): readonly [number, number] | undefined {
  if (isCubicWithOneZero({ top, bottom })) return edgesOfCubic(bottom, peak);
  const half = evaluate(top, peak) / evaluate(bottom, peak) / 2;
  const edges = positiveRoots(add(top, multiply([-half], bottom)));
  const lower = edges.filter((x) => x < peak).at(-1);
  const upper = edges.find((x) => x > peak);
  return lower === undefined || upper === undefined ? undefined : [lower, upper];
}

function peakOf({ top, bottom }: Power): number | undefined {
  if (isCubicWithOneZero({ top, bottom })) return peakOfCubic(bottom);
  const slope = add(multiply(differentiate(top), bottom), multiply([-1], top, differentiate(bottom)));
  const gain = (x: number) => evaluate(top, x) / evaluate(bottom, x);
  const peaks = positiveRoots(slope);
  return peaks.length === 0 ? undefined : peaks.reduce((best, x) => (gain(x) > gain(best) ? x : best));
}

/** Frequency in Hz of x = (ω/unit)². */
const hertz = (x: number, unit: number) => (Math.sqrt(x) * unit) / (2 * Math.PI);

/** The greatest |H| over all frequencies of a response that need not be a band-pass: its peaks and its two ends compared. */
export function greatestGain(transfer: Transfer): number {
  const { top, bottom, unit } = scaledPower(transfer);
  const slope = add(multiply(differentiate(top), bottom), multiply([-1], top, differentiate(bottom)));
  const peaks = positiveRoots(slope).map((x) => magnitudeAt(transfer, hertz(x, unit)));
  const { numerator, denominator } = transfer;
  const low = Math.abs((numerator[0] ?? 0) / denominator[0]!);
  const high = numerator.length < denominator.length ? 0 : Math.abs(numerator.at(-1)! / denominator.at(-1)!);
  return Math.max(low, high, ...peaks);
}
