import { elementaryCharge, thermalVoltage } from "../../device/constants.ts";
import { currentShare, smallSignalTransconductance, type PairInput } from "../../device/ota.ts";
import { sineResponse } from "../../numeric/fourier.ts";
import { noiseResponse } from "../../numeric/gaussian.ts";

/** What stands in front of the pair. */
export interface InputNetwork {
  /** Ω, source included. */
  series: number;
  /** Ω. */
  shunt: number;
  /** A into the linearising diodes. */
  diodeCurrent: number;
  /** K. */
  temperature: number;
}

/** k = Rsh/(Rsh + Rin + Rsource). */
export const attenuation = ({ series, shunt }: InputNetwork) => shunt / (shunt + series);

/** What the first input sees, Ω. */
export const sourceSeen = ({ series, shunt }: InputNetwork) => (series * shunt) / (series + shunt);

export function pairInput(network: InputNetwork): PairInput {
  return { thermal: thermalVoltage(network.temperature), diodeDrop: sourceSeen(network) * network.diodeCurrent };
}

/** Distortion (as a ratio) and compression (dB against small signals) of a sine of this peak behind the divider. */
export function ofSine(pair: PairInput, peak: number): { distortion: number; compressionDb: number } {
  const { fundamental, distortion } = sineResponse((u) => currentShare(pair, u), peak, steepnessOf(pair, peak));
  return { distortion, compressionDb: compression(pair, fundamental / peak) };
}

/** The same of Gaussian noise with this RMS behind the divider. */
export function ofNoise(pair: PairInput, rms: number): { distortion: number; compressionDb: number } {
  const { gain, distortion } = noiseResponse((u) => currentShare(pair, u), rms, steepnessOf(pair, rms));
  return { distortion, compressionDb: compression(pair, gain) };
}

/** The bends of the law are about 2·VT wide, with diodes or without. */
const steepnessOf = ({ thermal }: PairInput, level: number) => level / (2 * thermal);
const compression = (pair: PairInput, gain: number) => 20 * Math.log10(gain / smallSignalTransconductance(pair, 1));

/** Relative drift of the gain per kelvin: −1/T, divided by 1 + D with diodes. */
export function gainDrift({ thermal, diodeDrop }: PairInput, temperature: number): number {
  return -(2 * thermal) / (2 * thermal + diodeDrop) / temperature;
}

/** dB from a cold to a hot room at a steady bias current. */
export function warmingDb(network: InputNetwork): number {
  const at = (temperature: number) => smallSignalTransconductance(pairInput({ ...network, temperature }), 1);
  return 20 * Math.log10(at(roomHot) / at(roomCold));
}
const [roomCold, roomHot] = [283.15, 313.15];

/** Noise of the pair's currents relative to their shot noise; an order of magnitude. From memory. */
const noiseFactor = 2;

/** Density of the output's noise current, A/√Hz: √(2·q·Iabc·F). */
export const noiseCurrent = (biasCurrent: number) => Math.sqrt(2 * elementaryCharge * biasCurrent * noiseFactor);

/** −3 dB frequency of two real poles in a row, Hz. */
export function twoPoleBandwidth(first: number, second: number): number {
  if (second === Infinity) return first;
  const [a, b] = [1 / first ** 2, 1 / second ** 2];
  return Math.sqrt(2 / (a + b + Math.sqrt((a + b) ** 2 + 4 * a * b)));
}
