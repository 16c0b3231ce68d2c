import { formatQuantity } from "../../../quantity/format.ts";
import { resistor } from "../../../stage/fields.ts";
import { defineTopology, type DesignRefusal, type Limit } from "../../../stage/topology.ts";
import type { ConditionValues, PartValues, ResultValues } from "../../../stage/values.ts";
import { currentCurve } from "../curves.ts";
import { driverConditions as conditions, driverResults as results, targets } from "../fields.ts";
import { driverFormulas } from "../formulas.ts";
import { converterJoints, sinkDraw } from "../joints.ts";
import { driverLimits } from "../limits.ts";
import {
  collectorEmitterVoltage,
  collectorShare,
  largestEmitterVoltage,
  limitResistance,
  recoveryTime,
  sinkCurrent,
  type Driver,
} from "../model.ts";
import { driverNetwork } from "../networks.ts";
import { sources } from "../sources.ts";

const parts = {
  re: resistor({
    label: "emitter",
    symbol: "R_E",
    default: 15.5e3,
    least: 1e3,
    most: 220e3,
    help: "Sets amperes per volt.",
  }),
} as const;

type P = typeof parts;
type C = typeof conditions;
type R = typeof results;

function driverOf(re: number, given: ConditionValues<C>): Driver {
  return {
    emitterResistance: re,
    beta: given.beta ?? Infinity,
    offset: given.offsetVoltage,
    baseResistance: given.baseResistance,
    mirrorDegeneration: given.mirrorDegeneration,
    railPositive: given.railPositive,
    swing: Math.max(0, given.railPositive - given.swingLoss),
  };
}

function analyse({
  parts: { re },
  conditions: given,
}: {
  parts: PartValues<P>;
  conditions: ConditionValues<C>;
}): ResultValues<R> {
  const driver = driverOf(re, given);
  const { controlVoltage, controlRest, railNegative, swingLoss, slewRate } = given;
  const negativeSwing = Math.min(0, railNegative + swingLoss);
  const rest = Math.max(controlRest, 0) + Math.abs(given.offsetVoltage);
  return {
    outputCurrent: sinkCurrent(driver, controlVoltage),
    halfCurrent: sinkCurrent(driver, controlVoltage / 2),
    leastCurrent: sinkCurrent(driver, controlVoltage / 10),
    floorCurrent: rest / re,
    ...(rest > 0 && { floorDb: 20 * Math.log10(rest / controlVoltage) }),
    faultCurrent: driver.swing / re,
    headroom: collectorEmitterVoltage(driver, controlVoltage),
    baseCurrentError: collectorShare(driver.beta) - 1,
    reach: Math.max(0, largestEmitterVoltage(driver) - driver.offset),
    limitResistance: limitResistance(given.railPositive, railNegative + given.pinAboveRail),
    ...(slewRate !== null && { recoveryTime: recoveryTime(negativeSwing, slewRate) }),
    ...(controlRest < 0 && given.protection === "none" && { reverseVoltage: -negativeSwing }),
  };
}

function design(wanted: number, given: ConditionValues<C>): PartValues<P> | DesignRefusal {
  const emitter = given.controlVoltage + given.offsetVoltage;
  const re = (emitter / wanted) * collectorShare(given.beta ?? Infinity);
  if (emitter > 0 && emitter <= largestEmitterVoltage(driverOf(re, given))) return { re };
  return {
    refused: true,
    field: "controlVoltage",
    message: `A control voltage of ${formatQuantity(given.controlVoltage, "V")} is not followed at this current: the op amp or the transistor saturates. Lower it, or raise the positive rail.`,
  };
}

const limits: readonly Limit<P, C, R>[] = driverLimits;

export const opAmpTransistor = defineTopology({
  id: "op-amp-transistor",
  name: "Op amp and transistor",
  summary: "An op amp holds the envelope across one resistor; a transistor passes the current on. Reaches zero.",
  parts,
  conditions,
  targets,
  results,
  analyse,
  design: ({ targets: { outputCurrent }, conditions: given }) => design(outputCurrent, given),
  anchors: [],
  curves: [
    currentCurve<{ parts: PartValues<P>; conditions: ConditionValues<C> }>((state, x) =>
      sinkCurrent(driverOf(state.parts.re, state.conditions), x),
    ),
  ],
  limits,
  formulas: driverFormulas,
  sources,
  network: driverNetwork,
  // The op amp takes no current to speak of.
  joints: converterJoints(() => ({})),
  draws: sinkDraw,
  devices: [
    { key: "u1", letter: "U", label: "op amp", deviceClass: "JFET-input op amp, one of two in a package" },
    { key: "q1", letter: "Q", label: "pass transistor", deviceClass: "general-purpose NPN" },
    { key: "d1", letter: "D", label: "base protection", deviceClass: "small-signal diode" },
  ],
  traits: [
    { label: "Devices", text: "1 op amp, 1 transistor, and a mirror behind it" },
    { label: "At rest", text: "the op amp's offset over R_E" },
    { label: "Dead band", text: "none" },
    { label: "Drift", text: "none of its own" },
    { label: "Envelope refers to", text: "ground" },
  ],
  leavesOut: [
    "the op amp's bandwidth: it is far faster than any envelope",
    "the transistor's Early effect, which the loop takes out, and the fall of β at small currents",
    "base-emitter voltages are taken as 0.65 V where they only cost swing",
  ],
});
