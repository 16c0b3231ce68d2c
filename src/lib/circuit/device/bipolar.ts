import { roomTemperature, thermalVoltage } from "./constants.ts";

/** Saturation current of a general-purpose small-signal transistor at 25 °C, A; gives 0.633 V at 500 µA. From memory. */
const saturationAtRoom = 1e-14;
/** Band gap of silicon as circuit simulators use it, V, and the exponent of the temperature's own power. From memory. */
const bandGap = 1.11;
const temperatureExponent = 3;

/** Volts across a conducting transistor below which it no longer works as a current source. From memory. */
export const saturationVoltage = 0.2;

/** How much a base-emitter voltage falls per kelvin at a steady current, V/K. From memory. */
export const junctionTempco = 2e-3;

/**
 * Saturation current in amperes at a temperature in kelvins: Is·(T/T0)³·exp((T/T0 − 1)·Eg/VT), the law of the usual
 * circuit simulators.
 */
export function saturationCurrent(temperature: number): number {
  const ratio = temperature / roomTemperature;
  return (
    saturationAtRoom * ratio ** temperatureExponent * Math.exp(((ratio - 1) * bandGap) / thermalVoltage(temperature))
  );
}

/** Base-emitter voltage at a collector current, volts; without Early effect and series resistance. */
export function baseEmitterVoltage(current: number, temperature: number): number {
  return thermalVoltage(temperature) * Math.log(current / saturationCurrent(temperature));
}

/** Slopes of a transistor's currents at its operating point, S. */
export interface BipolarSlopes {
  /** Collector current over base-emitter voltage. */
  transconductance: number;
  /** Collector current over collector-emitter voltage. */
  output: number;
  /** Base current over base-emitter voltage. */
  input: number;
}

/**
 * Slopes of Ic = Is·exp(VBE/VT)·(1 + VCE/VA): the base current follows VBE and is left alone by VCE.
 *
 * @param collector A
 * @param transport A, Is·exp(VBE/VT)
 * @param base A
 */
export function bipolarSlopes(
  { collector, transport, base }: { collector: number; transport: number; base: number },
  { earlyVoltage, thermal }: { earlyVoltage: number; thermal: number },
): BipolarSlopes {
  return { transconductance: collector / thermal, output: transport / earlyVoltage, input: base / thermal };
}
