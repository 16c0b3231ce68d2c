import type { DiodeLaw } from "../../device/diode.ts";
import { thermalVoltage } from "../../device/constants.ts";
import { potFraction } from "../../parts/potLaw.ts";
import { formatQuantity } from "../../quantity/format.ts";
import type { DesignRefusal, DesignRequest } from "../../stage/topology.ts";
import type { ConditionValues, PartValues, ResultValues, State } from "../../stage/values.ts";
import type { conditions, parts, results, targets } from "./fields.ts";
import {
  audibleFactor,
  chargeOf,
  decayFactor,
  dischargeOf,
  firstCurrent,
  simplePeak,
  type Charge,
  type Charging,
  type Discharge,
} from "./model.ts";

export type P = typeof parts;
export type C = typeof conditions;
export type T = typeof targets;
export type R = typeof results;
export type EnvelopeState = State<P, C>;

const usualCapacitor = 1e-6;
const usualCharging = 470;

/** What the capacitor discharges into at a rotation. */
export function dischargeAt({ parts, conditions }: EnvelopeState, rotation = conditions.rotation): Discharge {
  const decay = parts.rMin + parts.rPot * potFraction(conditions.potLaw, rotation);
  const others = [conditions.loadResistance, conditions.leakageResistance];
  return dischargeOf(decay, others, conditions.controlRest, conditions.biasCurrent);
}

export function chargingOf({ parts, conditions }: EnvelopeState): Charging {
  return {
    height: conditions.pulseHeight,
    resistance: parts.rs,
    capacitance: parts.c,
    diode: diodeOf(conditions) ?? conditions.diodeDrop,
  };
}

function diodeOf(conditions: ConditionValues<C>): DiodeLaw | undefined {
  if (conditions.saturationCurrent === null) return undefined;
  return {
    saturationCurrent: conditions.saturationCurrent,
    slopeVoltage: conditions.emissionCoefficient * thermalVoltage(conditions.temperature),
  };
}

/** The charge at a rotation; undefined where the pulse does not open the diode. */
export function chargeAt(state: EnvelopeState, rotation = state.conditions.rotation): Charge | undefined {
  return chargeOf(chargingOf(state), dischargeAt(state, rotation), state.conditions.pulseWidth);
}

export function analyse(state: EnvelopeState): ResultValues<R> {
  const { parts } = state;
  const discharge = dischargeAt(state);
  const timeConstant = parts.c * discharge.resistance;
  const [shortest, longest] = [dischargeAt(state, 0), dischargeAt(state, 1)];
  const chargeTimeConstant = parts.rs * parts.c;
  const charging = chargingOf(state);
  const k60 = decayFactor(60);
  return {
    timeConstant,
    decayTime20: decayFactor(20) * timeConstant,
    decayTime60: k60 * timeConstant,
    shortestDecayTime60: k60 * parts.c * shortest.resistance,
    longestDecayTime60: k60 * parts.c * longest.resistance,
    longestDecayTime60Low: longestOnBoard(state, -1),
    longestDecayTime60High: longestOnBoard(state, 1),
    chargeTimeConstant,
    peakChargeCurrent: firstCurrent(charging, discharge.rest),
    pedestal: discharge.rest,
    ...peaks(state, discharge, timeConstant),
  };
}

function peaks(state: EnvelopeState, discharge: Discharge, timeConstant: number): ResultValues<R> {
  const { parts, conditions } = state;
  const charge = chargeAt(state);
  const [short, long] = [chargeAt(state, 0), chargeAt(state, 1)];
  if (!charge || !short || !long || !(charge.peak > 0)) return {};
  const { deadBand } = conditions;
  const audible = (decibels: number) => {
    const factor = audibleFactor(charge.peak, discharge.rest, deadBand, decibels);
    return factor === undefined ? undefined : factor * timeConstant;
  };
  const end = deadBand > 0 && deadBand > discharge.rest && deadBand < charge.peak;
  return {
    peakVoltage: charge.peak,
    peakVoltageShort: short.peak,
    peakVoltageLong: long.peak,
    ...(short.peak > 0 && long.peak > 0 && { knobLevelDb: 20 * Math.log10(short.peak / long.peak) }),
    simplePeakVoltage: simplePeak(
      conditions.pulseHeight,
      conditions.diodeDrop,
      conditions.pulseWidth,
      parts.rs * parts.c,
    ),
    ...defined({ audibleDecayTime20: audible(20), audibleDecayTime60: audible(60) }),
    ...(end && {
      audibleEnd: timeConstant * Math.log((charge.peak - discharge.rest) / (deadBand - discharge.rest)),
    }),
    ...(discharge.rest > 0 && { pedestalDb: 20 * Math.log10(discharge.rest / charge.peak) }),
  };
}

/** Keeps what has a value. */
function defined<K extends string>(figures: Record<K, number | undefined>): Partial<Record<K, number>> {
  return Object.fromEntries(Object.entries(figures).filter(([, value]) => value !== undefined)) as Partial<
    Record<K, number>
  >;
}

/** The longest decay with every part at the low (−1) or high (1) end of its tolerance; the load does not stray. */
function longestOnBoard({ parts, conditions }: EnvelopeState, sign: 1 | -1): number {
  const decay =
    parts.rMin * (1 + sign * conditions.resistorTolerance) + parts.rPot * (1 + sign * conditions.potTolerance);
  const { resistance } = dischargeOf(decay, [conditions.loadResistance, conditions.leakageResistance], 0, 0);
  return decayFactor(60) * parts.c * (1 + sign * conditions.capacitorTolerance) * resistance;
}

/** Exact resistors for the two ends of the knob. */
export function design({ targets, conditions, given }: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal {
  const c = given.c ?? usualCapacitor;
  const { shortestDecayTime60: shortest, longestDecayTime60: longest } = targets;
  if (longest <= shortest) {
    return {
      refused: true,
      field: "longestDecayTime60",
      message: `The longest decay asked for, ${formatQuantity(longest, "s")}, is not longer than the shortest of ${formatQuantity(shortest, "s")}. Raise it, or lower the shortest.`,
    };
  }
  const others = [conditions.loadResistance, conditions.leakageResistance];
  const alone = others.reduce<number>((sum, r) => sum + (r === null ? 0 : 1 / r), 0);
  const decayFor = (time: number) => 1 / ((decayFactor(60) * c) / time - alone);
  const [least, most] = [decayFor(shortest), decayFor(longest)];
  if (!(most > 0)) {
    const reach = (decayFactor(60) * c) / alone;
    return {
      refused: true,
      field: "longestDecayTime60",
      message: `Load and leakage alone discharge the capacitor in ${formatQuantity(reach, "s")}, so no pot gives ${formatQuantity(longest, "s")}. Ask for less, take a larger capacitor, or buffer the envelope.`,
    };
  }
  return { rs: given.rs ?? usualCharging, c, rMin: least, rPot: most - least };
}
