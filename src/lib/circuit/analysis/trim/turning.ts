import { electricalAngle } from "../../parts/electricalAngle.ts";
import { potFraction } from "../../parts/potLaw.ts";
import { completeConditions, type PlainConditions, type PlainValues } from "../../stage/defaults.ts";
import type { AnyTopology } from "../../stage/topology.ts";
import type { Knob } from "./request.ts";

/** A pot with the fixed parts that bound its travel. */
export interface TurnedPot {
  pot: string;
  padding: readonly string[];
}

/** Of the sort that the trade calls usual; from memory. */
const usual: Knob = {
  law: "linear",
  shape: "curve",
  midFraction: 0.15,
  endResistance: 0,
  electricalAngle,
};

/** The knob as a stage's conditions say it; what they leave out is usual. */
export function usualKnob(topology: AnyTopology, given: PlainConditions = {}): Knob {
  const conditions = completeConditions(topology, given);
  const figure = (name: string, other: number) => {
    const value = conditions[name];
    return typeof value === "number" ? value : other;
  };
  return {
    law: (conditions["potLaw"] ?? usual.law) as Knob["law"],
    shape: (conditions["lawShape"] ?? usual.shape) as Knob["shape"],
    midFraction: figure("midFraction", usual.midFraction),
    endResistance: figure("endResistance", usual.endResistance),
    electricalAngle: figure("electricalAngle", usual.electricalAngle),
  };
}

/** Pots that are fitted and turned; all of a stage turn together. */
export function turnedPots(topology: AnyTopology, parts: PlainValues): TurnedPot[] {
  if (!("rotation" in topology.conditions)) return [];
  return Object.entries(topology.parts)
    .filter(([key, { partClass }]) => partClass === "pot" && parts[key]! > 0)
    .map(([pot, { padding = [] }]) => ({ pot, padding }));
}

/**
 * Sets a rotation of 0 to 1 in a stage's conditions. The law is worked out here, so that every stage with a pot knows
 * every law: the stage is told a linear pot, turned to the share of the track that the law gives.
 */
export function turn(topology: AnyTopology, conditions: PlainConditions, knob: Knob, rotation: number): void {
  const share = potFraction(knob.law, rotation, knob.midFraction, knob.shape);
  if ("potLaw" in topology.conditions) conditions["potLaw"] = "linear";
  // A stage that knows of ends sets them itself, at both where it has both.
  const knowsEnds = "endResistance" in topology.conditions;
  if (knowsEnds) conditions["endResistance"] = knob.endResistance;
  conditions["rotation"] = knowsEnds ? share : knob.endResistance + (1 - knob.endResistance) * share;
}
