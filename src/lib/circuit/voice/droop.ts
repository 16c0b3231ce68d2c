import type { Draw } from "../stage/draw.ts";

type Pulse = NonNullable<Draw["pulse"]>;

/** How far the positive rail sags when a hit charges the envelopes, V; several at once add. */
export interface Droop {
  /** As the charging current dies away: the figure to go by. */
  actual: number;
  /** As if the current stood at its first value for the whole pulse: the most it can be. */
  limit: number;
  /** The whole charge taken from the bulk capacitor alone, nothing flowing in meanwhile. */
  byCharge: number;
}

/** Droop of a rail behind a resistor (0: none, or a diode alone) with a bulk capacitor. */
export function droopOf(pulses: readonly Pulse[], resistance: number, capacitance: number): Droop {
  const sum = (of: (pulse: Pulse) => number) => pulses.reduce((total, pulse) => total + of(pulse), 0);
  const byCharge = sum(({ charge }) => charge / capacitance);
  if (resistance === 0)
    return { actual: byCharge, byCharge, limit: sum((pulse) => (pulse.current * widthOf(pulse)) / capacitance) };
  const tau = resistance * capacitance;
  return {
    actual: sum((pulse) => exponentialDroop(pulse, resistance, tau)),
    limit: sum((pulse) => pulse.current * resistance * -Math.expm1(-widthOf(pulse) / tau)),
    byCharge,
  };
}

/** s; a pulse without an end has given all it has after this many time constants. */
const widthOf = ({ width, timeConstant }: Pulse): number => width ?? 5 * timeConstant;

/**
 * The most of v(t) with C dv/dt = I e^(−t/τ) − v/R: v = I·R·τ/(τ − RC)·(e^(−t/τ) − e^(−t/RC)), within the pulse's width.
 */
function exponentialDroop(pulse: Pulse, resistance: number, tau: number): number {
  const { current, timeConstant } = pulse;
  // Equal time constants divide zero by zero; a hair apart the limit comes out right to eight digits.
  const own = Math.abs(timeConstant / tau - 1) < 1e-8 ? tau * (1 + 1e-8) : timeConstant;
  const peakAt = Math.log(own / tau) / (1 / tau - 1 / own);
  const at = Math.min(peakAt, widthOf(pulse));
  return ((current * resistance * own) / (own - tau)) * (Math.exp(-at / own) - Math.exp(-at / tau));
}
