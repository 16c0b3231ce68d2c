import { readCentre } from "../../../../network/resonance.ts";
import { defineTopology } from "../../../../stage/topology.ts";
import { responseCurves } from "../../curves.ts";
import { filterJoints } from "../../joints.ts";
import { sourcesOf } from "../../sources.ts";
import { analyse, design, type PassiveState } from "./analyse.ts";
import { conditions, parts, results, targets } from "./fields.ts";
import { formulas } from "./formulas.ts";
import { limits } from "./limits.ts";
import { nothingAround, transferOf } from "./model.ts";
import { network } from "./network.ts";

const transferOfState = ({ parts: values, conditions: around }: PassiveState) => transferOf(values, around);

export const passive = defineTopology({
  id: "passive",
  name: "Passive",
  summary: "Two resistors, two capacitors, no op amp. Broad: Q stays below one half.",
  parts,
  conditions,
  targets,
  results,
  analyse,
  design,
  anchors: [{ part: "c1", least: 2.2e-9, most: 1e-6 }],
  curves: responseCurves(
    transferOfState,
    (state) => readCentre(transferOfState(state))!,
    (state) =>
      state.conditions.sourceResistance > 0 || state.conditions.loadResistance !== null
        ? [
            {
              id: "unloaded",
              label: "without source and load",
              state: { ...state, conditions: { ...state.conditions, ...nothingAround } },
            },
          ]
        : [],
  ),
  limits,
  formulas,
  sources: sourcesOf(formulas, limits),
  network,
  joints: filterJoints({ input: ({ r1 }) => r1!, passive: true }),
  devices: [],
  traits: [
    { label: "Op amps", text: "0" },
    { label: "Q range", text: "below 0.5" },
    { label: "Single-resistor retune", text: "no" },
    { label: "Constant under retune", text: "–" },
    { label: "Finite gain-bandwidth", text: "none" },
    { label: "Inverts", text: "no" },
  ],
  leavesOut: ["losses and voltage dependence of the capacitors", "noise of the resistors"],
});
