import { readResonance, type Resonance } from "../../network/resonance.ts";
import { potFraction, type PotLaw } from "../../parts/potLaw.ts";
import { isStable, type Transfer } from "../../network/transfer.ts";

export interface Response extends Resonance {
  peakGainDb: number;
  /** 1 or 0. */
  inverting: number;
}

/**
 * The figures of {@link responseResults} off a transfer function: exact for any order, so that a finite op amp is
 * included where the transfer function includes it.
 *
 * @returns an empty object where the network oscillates or shows no peak with two −3 dB points
 */
export function responseOf(transfer: Transfer, inverting: boolean): Partial<Response> {
  if (!isStable(transfer)) return {};
  const resonance = readResonance(transfer);
  if (!resonance) return {};
  return { ...resonance, peakGainDb: 20 * Math.log10(resonance.peakGain), inverting: inverting ? 1 : 0 };
}

/**
 * RMS of white noise, band-limited by one pole, after the band-pass: e·|H0|·√Bₙ with e = V/√(π·f_c/2).
 * Takes the noise as white across the band-pass (trade brief 2.14).
 *
 * @param sourceRms volts RMS within the source's own band
 * @param sourceCorner Hz, the −3 dB corner of that band
 */
export function noiseAfter(sourceRms: number, sourceCorner: number, peakGain: number, noiseBandwidth: number): number {
  const density = sourceRms / Math.sqrt((Math.PI / 2) * sourceCorner);
  return density * peakGain * Math.sqrt(noiseBandwidth);
}

/** {@link noiseAfter} of what the conditions feed in, where they do and the response has a band. */
export function outputNoiseOf(
  response: Partial<Pick<Response, "peakGain" | "noiseBandwidth">>,
  { sourceRms, sourceBandwidth }: { sourceRms: number | null; sourceBandwidth: number },
): { outputRms?: number } {
  const { peakGain, noiseBandwidth } = response;
  if (sourceRms === null || peakGain === undefined || noiseBandwidth === undefined) return {};
  return { outputRms: noiseAfter(sourceRms, sourceBandwidth, peakGain, noiseBandwidth) };
}

/** A fixed resistor and the share of the rheostat in series with it that the rotation leaves in circuit, Ω. */
export function withRheostat(fixed: number, pot: number, law: PotLaw, rotation: number): number {
  return fixed + pot * potFraction(law, rotation);
}

/**
 * 1/A(s) of an op amp with a single pole, constant term first: 1/A0 + s/(2π·ft); zero for an ideal one.
 */
export function inverseGain({
  gainBandwidth,
  openLoopGain,
}: {
  gainBandwidth: number | null;
  openLoopGain: number | null;
}): readonly [number, number] | undefined {
  if (gainBandwidth === null) return undefined;
  return [openLoopGain === null ? 0 : 1 / openLoopGain, 1 / (2 * Math.PI * gainBandwidth)];
}
