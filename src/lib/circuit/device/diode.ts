import { solvedVoltage } from "./seriesExponential.ts";

/** The exponential law of a junction: i = Is·(e^(v/(n·VT)) − 1). Series resistance, breakdown and charge are left out. */
export interface DiodeLaw {
  /** Is, A. */
  saturationCurrent: number;
  /** n·VT in volts: the emission coefficient times the thermal voltage. */
  slopeVoltage: number;
}

/** Current in amperes at a junction voltage. */
export function diodeCurrent({ saturationCurrent, slopeVoltage }: DiodeLaw, voltage: number): number {
  return saturationCurrent * Math.expm1(voltage / slopeVoltage);
}

/** Slope di/dv in siemens at a junction voltage. */
export function diodeConductance({ saturationCurrent, slopeVoltage }: DiodeLaw, voltage: number): number {
  return (saturationCurrent / slopeVoltage) * Math.exp(voltage / slopeVoltage);
}

/** Junction voltage at a current above −Is, in volts. */
export function diodeVoltage({ saturationCurrent, slopeVoltage }: DiodeLaw, current: number): number {
  return slopeVoltage * Math.log1p(current / saturationCurrent);
}

/**
 * Junction voltage of a diode in series with a resistor across a voltage: the root u of u + R·Is·(e^(u/(n·VT)) − 1) = V,
 * exact to rounding.
 */
export function diodeVoltageBehind(law: DiodeLaw, resistance: number, voltage: number): number {
  return solvedVoltage(voltage, resistance * law.saturationCurrent, law.slopeVoltage);
}
