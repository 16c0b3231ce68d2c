import { defineTopology } from "../../../../stage/topology.ts";
import { triggerJoints } from "../../joints.ts";
import { sources } from "../../sources.ts";
import { analyse, design } from "./analyse.ts";
import { curves } from "./curves.ts";
import { conditions, parts, results, targets } from "./fields.ts";
import { formulas } from "./formulas.ts";
import { limits } from "./limits.ts";
import { network } from "./network.ts";

export const comparator = defineTopology({
  id: "comparator",
  name: "Comparator",
  summary: "An op amp with hysteresis: a threshold that does not drift, and slow edges fire once.",
  parts,
  conditions,
  targets,
  results,
  analyse,
  design,
  anchors: [],
  curves,
  limits,
  formulas,
  sources,
  network,
  draws: ({ parts: values, conditions: around }) => [
    {
      label: "reference divider",
      positive: (around.railPositive as number) / (values.rr1! + values.rr2!),
      negative: 0,
    },
  ],
  joints: triggerJoints(({ conditions: around }) => around.outputHigh as number),
  devices: [{ key: "u1", letter: "U", label: "comparator", deviceClass: "JFET-input op amp, one of two in a package" }],
  traits: [
    { label: "Op amps", text: "1" },
    { label: "Threshold", text: "set by resistors, with hysteresis" },
    { label: "Pulse width", text: "the gate's, or a differentiator's in front" },
    { label: "Slow edges", text: "fire once, however slow" },
  ],
  leavesOut: [
    "offset, bias current and slew rate of the op amp",
    "the load of R_in on a differentiator in front",
    "the source's own resistance",
  ],
});
