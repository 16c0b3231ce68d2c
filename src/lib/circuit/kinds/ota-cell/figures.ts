import { electricalAngle } from "../../parts/electricalAngle.ts";
import { crestOf } from "../../stage/signal.ts";
import { currentShare, smallSignalTransconductance } from "../../device/ota.ts";
import type { ConditionValues, ResultValues } from "../../stage/values.ts";
import type { conditions } from "./fields.ts";
import {
  attenuation,
  gainDrift,
  noiseCurrent,
  ofNoise,
  ofSine,
  pairInput,
  sourceSeen,
  warmingDb,
  type InputNetwork,
} from "./model.ts";
import type { results } from "./results.ts";

export type C = typeof conditions;
export type R = typeof results;

const audioPole = 20e3;

export interface OtaStage {
  input: InputNetwork;
  /** Ω that the output current is turned into volts by. */
  load: number;
  inverting: boolean;
  bandwidth: number;
}

export function inputOf(parts: { rin: number; rsh: number }, given: ConditionValues<C>): InputNetwork {
  return {
    series: parts.rin + given.sourceResistance,
    shunt: parts.rsh,
    diodeCurrent: given.diodeCurrent,
    temperature: given.temperature,
  };
}

/** Peak and RMS behind the divider; undefined without a source level. */
export function levelsOf(input: InputNetwork, { signal, sourcePeak, sourceRms }: ConditionValues<C>) {
  const k = attenuation(input);
  const factor = crestOf[signal];
  const peakFirst = signal === "sine" ? sourcePeak !== null : sourceRms === null;
  if (sourcePeak === null && sourceRms === null) return undefined;
  const rms = peakFirst ? sourcePeak! / factor : sourceRms!;
  return { rms: k * rms, peak: k * (peakFirst ? sourcePeak! : rms * factor) };
}

export function otaFigures(
  { input, load, inverting, bandwidth }: OtaStage,
  given: ConditionValues<C>,
): ResultValues<R> {
  const { biasCurrent, diodeCurrent } = given;
  const pair = pairInput(input);
  const k = attenuation(input);
  const effective = smallSignalTransconductance(pair, biasCurrent);
  const gain = k * effective * load;
  const ceiling = biasCurrent * load;
  const levels = levelsOf(input, given);
  const outputPeak = levels && ceiling * currentShare(pair, levels.peak);
  const shape = levels && (given.signal === "noise" ? ofNoise(pair, levels.rms) : ofSine(pair, levels.peak));

  const seen = sourceSeen(input);
  const unequal = Math.abs(seen - (given.balanceResistance ?? seen)) + given.resistanceMismatch * seen;
  const inputBias = biasCurrent / (2 * (given.beta ?? Infinity));
  const offsetSum = Math.abs(given.offsetVoltage) + (inputBias + diodeCurrent / 2) * unequal;
  const thump = ceiling * currentShare(pair, offsetSum);
  const density = noiseCurrent(biasCurrent) * load;
  const trim = trimOf(given, given.balanceResistance ?? seen);

  return {
    transconductance: biasCurrent / (2 * pair.thermal),
    effectiveTransconductance: effective,
    attenuation: k,
    attenuationDb: 20 * Math.log10(k),
    gain,
    gainDb: 20 * Math.log10(gain),
    ceiling,
    inverting: inverting ? 1 : 0,
    bandwidth,
    ...(levels && { inputRms: levels.rms, inputPeak: levels.peak, outputPeak: outputPeak! }),
    ...(shape && { ...shape, ...(shape.distortion > 0 && { distortionDb: 20 * Math.log10(shape.distortion) }) }),
    linearity: pair.diodeDrop / (2 * pair.thermal),
    temperatureCoefficient: gainDrift(pair, input.temperature),
    warmingDb: warmingDb(input),
    offsetSum,
    thump,
    ...(thump > 0 && outputPeak !== undefined && { thumpDb: 20 * Math.log10(thump / outputPeak) }),
    ...trim,
    noiseDensity: density,
    noiseRms: density * Math.sqrt((Math.PI / 2) * audioPole),
  };
}

/** Range of the offset trim at the other input, either way, from the smaller rail. */
function trimOf(given: ConditionValues<C>, resistance: number) {
  if (given.trimResistance === null) return {};
  const rail = Math.min(given.railPositive, -given.railNegative);
  const trimRange = (rail * resistance) / (given.trimResistance + resistance);
  return { trimRange, trimPerDegree: (2 * trimRange) / electricalAngle };
}
