import { formatQuantity } from "../../../quantity/format.ts";
import { resistor as resistorField } from "../../../stage/fields.ts";
import { defineTopology, type DesignRefusal, type Limit } from "../../../stage/topology.ts";
import type { ConditionValues, PartValues, ResultValues } from "../../../stage/values.ts";
import { currentCurve } from "../curves.ts";
import { conditions, resistorResults as results, targets } from "../fields.ts";
import { resistorFormulas } from "../formulas.ts";
import { converterJoints } from "../joints.ts";
import { resistorLimits } from "../limits.ts";
import { pinCurrent, pinErrors } from "../model.ts";
import { resistorNetwork } from "../networks.ts";
import { sources } from "../sources.ts";

const parts = {
  r: resistorField({
    label: "bias",
    symbol: "R",
    default: 37e3,
    least: 4.7e3,
    most: 470e3,
    help: "From the envelope to the bias pin.",
  }),
} as const;

type P = typeof parts;
type C = typeof conditions;
type R = typeof results;

const pinOf = (given: ConditionValues<C>) => given.railNegative + given.pinAboveRail;

function analyse({
  parts: { r },
  conditions: given,
}: {
  parts: PartValues<P>;
  conditions: ConditionValues<C>;
}): ResultValues<R> {
  const pinVoltage = pinOf(given);
  const at = (controlVoltage: number) => pinCurrent(r, controlVoltage, pinVoltage);
  const { controlVoltage, controlRest, railPositive, swingLoss } = given;
  const [peak, floor] = [at(controlVoltage), at(controlRest)];
  const headroom = controlVoltage - pinVoltage;
  return {
    outputCurrent: peak,
    halfCurrent: at(controlVoltage / 2),
    leastCurrent: at(controlVoltage / 10),
    floorCurrent: floor,
    ...(floor > 0 && peak > 0 && { floorDb: 20 * Math.log10(floor / peak) }),
    faultCurrent: at(railPositive - swingLoss),
    headroom,
    pinVoltage,
    ...(headroom > 0 && pinErrors(headroom)),
  };
}

function design(wanted: number, given: ConditionValues<C>): PartValues<P> | DesignRefusal {
  const across = given.controlVoltage - pinOf(given);
  if (across > 0) return { r: across / wanted };
  return {
    refused: true,
    field: "controlVoltage",
    message: `The bias pin sits at ${formatQuantity(pinOf(given), "V")}; a higher control voltage is needed. Raise it.`,
  };
}

const limits: readonly Limit<P, C, R>[] = resistorLimits;

export const resistor = defineTopology({
  id: "resistor",
  name: "Single resistor",
  summary: "One resistor from the envelope to the bias pin. Cheap; from an envelope at ground it never shuts off.",
  parts,
  conditions,
  targets,
  results,
  analyse,
  design: ({ targets: { outputCurrent }, conditions: given }) => design(outputCurrent, given),
  anchors: [],
  curves: [
    currentCurve<{ parts: PartValues<P>; conditions: ConditionValues<C> }>((state, x) =>
      pinCurrent(state.parts.r, x, pinOf(state.conditions)),
    ),
  ],
  limits,
  formulas: resistorFormulas,
  sources,
  network: resistorNetwork,
  joints: converterJoints(({ parts: values }) => ({ resistance: values.r! })),
  devices: [],
  traits: [
    { label: "Devices", text: "none" },
    { label: "At rest", text: "about 5 dB under the peak" },
    { label: "Dead band", text: "none" },
    { label: "Drift", text: "4 mV/K over the voltage across the resistor" },
    { label: "Envelope refers to", text: "the negative rail, if it is to shut off" },
  ],
  leavesOut: ["the change of the bias pin's voltage with its current", "the source resistance of the envelope"],
});
