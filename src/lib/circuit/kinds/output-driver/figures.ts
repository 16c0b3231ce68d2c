import { boltzmann } from "../../device/constants.ts";
import { swingOn } from "../../device/opAmp.ts";
import { crestOf } from "../../stage/signal.ts";
import { shareBeyond } from "../../numeric/gaussianTail.ts";
import type { ConditionValues, ResultValues } from "../../stage/values.ts";
import type { conditions, results } from "./fields.ts";
import type { Jack } from "./model.ts";

export type C = typeof conditions;
export type R = typeof results;

/** 0 dBu: 1 mW into 600 Ω, V. */
const zeroDbu = Math.sqrt(0.6);

/** What the two topologies differ in. */
export interface Amplifier {
  /** In the middle of the band, the op amp's own gain not yet counted. */
  idealGain: number;
  inverting: boolean;
  noiseGain: number;
  /** Of DC: 1 where a capacitor blocks the input resistor. */
  offsetGain: number;
  /** Ω whose thermal noise the noise gain multiplies. */
  noisyResistance: number;
  /** Ω that the coupling capacitor works into. */
  couplingResistance: number;
  cin: number;
}

/** Swing to either side, V. */
export function swingOf({ railPositive, railNegative, elementDrop }: ConditionValues<C>): number {
  return swingOn({ railPositive: railPositive - elementDrop, railNegative: railNegative + elementDrop });
}

/** Peaks of the signal at the op amp's output, V. */
export function peakOf(gain: number, { signal, sourceRms }: ConditionValues<C>): number {
  return crestOf[signal] * sourceRms * gain;
}

export function figuresOf(
  amplifier: Amplifier,
  jack: Pick<Jack, "ro" | "cout">,
  conditions: ConditionValues<C>,
): ResultValues<R> {
  const { sourceRms, loads, signal } = conditions;
  const openLoop = conditions.gainBandwidth === null ? null : conditions.openLoopGain;
  const gain = amplifier.idealGain / (1 + (openLoop === null ? 0 : amplifier.noiseGain / openLoop));
  const load = conditions.loadResistance === null ? 0 : loads / conditions.loadResistance;
  const loss = 1 / (1 + jack.ro * load);
  const outputRms = sourceRms * gain * loss;
  const swing = swingOf(conditions);
  const noiseFloor = noiseFloorOf(amplifier, conditions);
  return {
    gain,
    gainDb: 20 * Math.log10(gain),
    inverting: amplifier.inverting ? 1 : 0,
    outputRms,
    outputDbu: 20 * Math.log10(outputRms / zeroDbu),
    loadLossDb: 20 * Math.log10(loss),
    swing,
    ...(swing > 0 && headroom(swing, peakOf(gain, conditions), signal)),
    noiseGain: amplifier.noiseGain,
    ...speed(amplifier, swing, conditions),
    ...corners(amplifier, jack, load, conditions),
    shortCircuitCurrent: swing / jack.ro,
    shortCircuitPower: (swing / jack.ro) * swing,
    outputOffset: jack.cout > 0 ? 0 : Math.abs(conditions.offsetVoltage) * amplifier.offsetGain * loss,
    noiseFloor,
    ...(noiseFloor > 0 && { signalToNoiseDb: 20 * Math.log10(outputRms / noiseFloor) }),
  };
}

function headroom(swing: number, peak: number, signal: "noise" | "sine"): ResultValues<R> {
  return {
    largestRms: swing / crestOf[signal],
    headroomDb: 20 * Math.log10(swing / peak),
    clipProbability: signal === "noise" ? shareBeyond((crestOf.noise * swing) / peak) : peak > swing ? 1 : 0,
  };
}

function speed(amplifier: Amplifier, swing: number, conditions: ConditionValues<C>): ResultValues<R> {
  const { gainBandwidth, openLoopGain, slewRate } = conditions;
  return {
    // The pole of K/(1 + Kσ): ft·(1/N + 1/A0).
    ...(gainBandwidth !== null && {
      bandwidth: gainBandwidth * (1 / amplifier.noiseGain + (openLoopGain === null ? 0 : 1 / openLoopGain)),
    }),
    ...(slewRate !== null && swing > 0 && { slewLimit: slewRate / (2 * Math.PI * swing) }),
  };
}

function corners(
  { cin, couplingResistance }: Amplifier,
  { ro, cout }: Pick<Jack, "ro" | "cout">,
  load: number,
  { cableCapacitance }: ConditionValues<C>,
): ResultValues<R> {
  const corner = (resistance: number, capacitance: number) => 1 / (2 * Math.PI * resistance) / capacitance;
  return {
    ...(cin > 0 && couplingResistance > 0 && { couplingCorner: corner(couplingResistance, cin) }),
    ...(cout > 0 && load > 0 && { outputCorner: corner(ro + 1 / load, cout) }),
    ...(cableCapacitance > 0 && { cableCorner: corner(ro / (1 + ro * load), cableCapacitance) }),
  };
}

/** Voltage noise and thermal noise at the output over one pole's band, V RMS. */
function noiseFloorOf({ noiseGain, noisyResistance }: Amplifier, conditions: ConditionValues<C>): number {
  const { inputNoise, temperature, audioBandwidth } = conditions;
  const thermal = Math.sqrt(4 * boltzmann * temperature * noisyResistance);
  return noiseGain * Math.hypot(inputNoise, thermal) * Math.sqrt((Math.PI / 2) * audioBandwidth);
}
