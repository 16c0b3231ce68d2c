import { defineTopology } from "../../../../stage/topology.ts";
import { triggerJoints } from "../../joints.ts";
import { sources } from "../../sources.ts";
import { analyse, design } from "./analyse.ts";
import { curves } from "./curves.ts";
import { conditions, parts, results, targets } from "./fields.ts";
import { formulas } from "./formulas.ts";
import { limits } from "./limits.ts";
import { network } from "./network.ts";

export const transistorThreshold = defineTopology({
  id: "transistor-threshold",
  name: "Transistor threshold",
  summary: "A differentiator and one transistor: any gate becomes a pulse of one width.",
  parts,
  conditions,
  targets,
  results,
  analyse,
  design,
  anchors: [{ part: "cd", least: 1e-9, most: 470e-9 }],
  curves,
  limits,
  formulas,
  sources,
  network,
  // The collector rests at the rail that it is switched from.
  joints: triggerJoints(({ conditions: around }) => around.railPositive as number),
  devices: [
    { key: "q1", letter: "Q", label: "threshold", deviceClass: "general-purpose NPN" },
    { key: "d1", letter: "D", label: "base clamp", deviceClass: "small-signal diode" },
  ],
  traits: [
    { label: "Op amps", text: "none" },
    { label: "Threshold", text: "drifts with the junction, 1 to 3.5 V" },
    { label: "Pulse width", text: "set by the differentiator, not by the gate" },
    { label: "Slow edges", text: "missed beyond a few time constants" },
  ],
  leavesOut: [
    "the transistor's stored charge and its spread from part to part",
    "the cable and the source's own resistance",
    "the clamp diode's drop and leakage",
    "gates shorter than the pulse",
  ],
});
