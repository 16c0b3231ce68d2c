import { saturationVoltage } from "../../device/bipolar.ts";

/** Base-emitter voltage taken for the converter's and the mirror's transistors at their peak, V. From memory. */
export const baseEmitter = 0.65;
/** At a few microamperes, where a transistor begins to conduct, V. From memory. */
const conduction = 0.6;
/** Largest bias current to plan for, A; half of what the amplifier cell stands. Common practice. */
export const mostBias = 1e-3;
/** Drift of two junctions, V/K, and the spread of their sum from part to part, V. From memory. */
const pinTempco = 4e-3;
const pinSpread = 0.1;

export interface Driver {
  emitterResistance: number;
  /** Infinity for an ideal transistor. */
  beta: number;
  offset: number;
  baseResistance: number;
  mirrorDegeneration: number;
  railPositive: number;
  /** V, highest output of the op amp. */
  swing: number;
}

/** Share of the emitter current that reaches the collector, β/(β + 1). */
export const collectorShare = (beta: number) => 1 / (1 + 1 / beta);

/**
 * Largest emitter voltage that is followed, V: the op amp must still lift base, stopper and emitter, and the collector
 * must stay a saturation voltage above the emitter.
 */
export function largestEmitterVoltage(driver: Driver): number {
  const { emitterResistance, beta, baseResistance, mirrorDegeneration, railPositive, swing } = driver;
  const ofOpAmp = (swing - baseEmitter) / (1 + baseResistance / emitterResistance / (beta + 1));
  const ofCollector =
    (railPositive - baseEmitter - saturationVoltage) /
    (1 + (collectorShare(beta) * mirrorDegeneration) / emitterResistance);
  return Math.max(0, Math.min(ofOpAmp, ofCollector));
}

/** Collector current at a control voltage, A: (Venv + Vos)/RE·β/(β + 1), held between zero and what can be followed. */
export function sinkCurrent(driver: Driver, controlVoltage: number): number {
  const emitter = Math.min(Math.max(controlVoltage + driver.offset, 0), largestEmitterVoltage(driver));
  return (emitter / driver.emitterResistance) * collectorShare(driver.beta);
}

/** Voltage left across the transistor at a control voltage, V. */
export function collectorEmitterVoltage(driver: Driver, controlVoltage: number): number {
  const current = sinkCurrent(driver, controlVoltage);
  const emitter = (current / collectorShare(driver.beta)) * driver.emitterResistance;
  return driver.railPositive - baseEmitter - current * driver.mirrorDegeneration - emitter;
}

/** Ω in the mirror's output that leaves {@link mostBias} and no more with the mirror saturated. */
export function limitResistance(railPositive: number, pinVoltage: number): number {
  return (railPositive - baseEmitter - saturationVoltage - pinVoltage) / mostBias;
}

/** Time for the op amp to come back from its negative swing until the base conducts, s. */
export function recoveryTime(negativeSwing: number, slewRate: number): number {
  return (conduction - negativeSwing) / slewRate;
}

/** Current through a resistor into the bias pin, A; the pin takes none in reverse. */
export function pinCurrent(resistance: number, controlVoltage: number, pinVoltage: number): number {
  return Math.max(0, controlVoltage - pinVoltage) / resistance;
}

/** Relative drift per kelvin and relative spread of a current through a resistor into two junctions. */
export function pinErrors(across: number): { temperatureCoefficient: number; pinSpreadError: number } {
  return { temperatureCoefficient: pinTempco / across, pinSpreadError: pinSpread / across };
}
