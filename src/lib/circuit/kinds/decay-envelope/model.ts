import { diodeConductance, diodeCurrent, diodeVoltageBehind, type DiodeLaw } from "../../device/diode.ts";
import { solveBracketed } from "../../numeric/solveBracketed.ts";
import { integrateStiff } from "../../numeric/transient.ts";

/** What the capacitor discharges into, as a resistance to a voltage. */
export interface Discharge {
  /** Ω, everything in parallel. */
  resistance: number;
  /** Volts the capacitor comes to rest at. */
  rest: number;
}

export interface Charging {
  /** Volts of the pulse. */
  height: number;
  /** Ω between the pulse and the diode. */
  resistance: number;
  capacitance: number;
  /** The diode: a fixed drop in volts, or its exponential law. */
  diode: number | DiodeLaw;
}

/** The voltage across the capacitor from the start of the pulse. */
export interface Charge {
  at(time: number): number;
  /** When the pulse ends, s. */
  width: number;
  peak: number;
}

/** Beyond this many of the slowest time constants nothing moves any more: e⁻⁵⁰ is far below rounding. */
const settled = 50;

/** Error allowed in the junction voltage at each step, relative to the voltages at hand. */
const stepTolerance = 1e-12;

/**
 * The discharge of the capacitor: Rdec ∥ RL ∥ Rleak, resting at (Vref/Rdec + Ib)·(Rdec ∥ RL ∥ Rleak).
 *
 * @param decay Ω of the fixed resistor and the pot
 * @param others Ω of load and leakage; null for none
 */
export function dischargeOf(
  decay: number,
  others: readonly (number | null)[],
  reference: number,
  biasCurrent: number,
): Discharge {
  const conductance = others.reduce<number>((sum, r) => sum + (r === null ? 0 : 1 / r), 1 / decay);
  const resistance = 1 / conductance;
  return { resistance, rest: (reference / decay + biasCurrent) * resistance };
}

/**
 * The exact charge of the rested capacitor through the diode, C·dv/dt = i − (v − rest)/R, for a pulse of the given width
 * (null: as long as it takes). A fixed drop has a closed form; the exponential law is integrated with a checked error.
 *
 * @returns undefined where the pulse does not open the diode
 */
export function chargeOf(charging: Charging, discharge: Discharge, width: number | null): Charge | undefined {
  const { diode } = charging;
  return typeof diode === "number"
    ? fixedDropCharge(charging, diode, discharge, width)
    : exponentialCharge(charging, diode, discharge, width);
}

function fixedDropCharge(
  { height, resistance, capacitance }: Charging,
  drop: number,
  { resistance: r, rest }: Discharge,
  width: number | null,
): Charge | undefined {
  if (!(height - drop > rest)) return undefined;
  const aim = (height - drop - rest) * (r / (r + resistance)) + rest;
  if (width === null) return { at: () => aim, width: 0, peak: aim };
  const tau = (capacitance * r * resistance) / (r + resistance);
  const at = (time: number) => aim + (rest - aim) * Math.exp(-Math.min(Math.max(time, 0), width) / tau);
  return { at, width, peak: at(width) };
}

/**
 * The state is the junction voltage u, which moves evenly where the current changes by decades:
 * v = Vp − u − Rs·i(u), so (1 + Rs·g(u))·du/dt = −dv/dt with g = di/du.
 */
function exponentialCharge(
  { height, resistance: rs, capacitance }: Charging,
  law: DiodeLaw,
  { resistance: r, rest }: Discharge,
  width: number | null,
): Charge | undefined {
  if (!(height > rest)) return undefined;
  const voltage = (u: number) => height - u - rs * diodeCurrent(law, u);
  const surplus = (u: number) => diodeCurrent(law, u) - (voltage(u) - rest) / r;
  const start = diodeVoltageBehind(law, rs, height - rest);
  // The charge ends where the diode carries just what the discharge takes.
  const end = solveBracketed(surplus, 0, start);
  const slowest = 1 / ((1 / (rs + 1 / diodeConductance(law, end)) + 1 / r) / capacitance);
  if (width === null) return { at: () => voltage(end), width: 0, peak: voltage(end) };
  const slope = (u: number) => -surplus(u) / (capacitance * (1 + rs * diodeConductance(law, u)));
  const equation = {
    slope,
    slopeDerivative: (u: number) => {
      const g = diodeConductance(law, u);
      const whole = 1 + rs * g;
      const surplusSlope = g + whole / r;
      return (-surplusSlope + (surplus(u) * rs * g) / (law.slopeVoltage * whole)) / (capacitance * whole);
    },
  };
  const moving = Math.min(width, settled * slowest);
  const transient = integrateStiff(
    equation,
    start,
    moving,
    stepTolerance * (height + Math.abs(rest) + law.slopeVoltage),
  );
  return { at: (time) => voltage(transient.at(time)), width, peak: voltage(transient.end) };
}

/** Current in amperes at the start of the pulse, when the capacitor is at rest. */
export function firstCurrent({ height, resistance, diode }: Charging, rest: number): number {
  if (typeof diode === "number") return Math.max(0, height - diode - rest) / resistance;
  return Math.max(0, diodeCurrent(diode, diodeVoltageBehind(diode, resistance, height - rest)));
}

/** The textbook peak (Vp − Vd)(1 − e^(−tw/τc)), τc = Rs·C: no discharge while charging. */
export function simplePeak(height: number, drop: number, width: number | null, chargeTimeConstant: number): number {
  return (height - drop) * (width === null ? 1 : -Math.expm1(-width / chargeTimeConstant));
}

/** Time constants that an exponential decay takes to fall by so many decibels: ln 10^(dB/20). */
export const decayFactor = (decibels: number): number => (decibels / 20) * Math.LN10;

/**
 * Time constants until the control v − Vd has fallen by so many decibels from its peak, for v = rest + (peak − rest)·e^(−t/τ).
 * With rest 0: ln(Vpk / (Vd + 10^(−dB/20)·(Vpk − Vd))).
 *
 * @returns undefined where it never falls so far
 */
export function audibleFactor(peak: number, rest: number, deadBand: number, decibels: number): number | undefined {
  const aim = deadBand + 10 ** (-decibels / 20) * (peak - deadBand);
  return peak > deadBand && aim > rest ? Math.log((peak - rest) / (aim - rest)) : undefined;
}
