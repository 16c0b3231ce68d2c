import { defineStageKind } from "../../stage/kind.ts";
import { defineTopology } from "../../stage/topology.ts";
import { analyse, design } from "./analyse.ts";
import { curves } from "./curves.ts";
import { conditions, parts, paths, results, targets } from "./fields.ts";
import { formulas } from "./formulas.ts";
import { joints, meets } from "./joints.ts";
import { limits } from "./limits.ts";
import { network } from "./network.ts";
import { reference } from "./reference.ts";
import { sources } from "./sources.ts";

const inverting = defineTopology({
  id: "inverting",
  name: "Inverting",
  summary: "Every path's weight by its own resistor, all against one feedback resistor.",
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
  joints,
  meets,
  devices: [{ key: "u1", letter: "U", label: "op amp", deviceClass: "JFET-input op amp, one of two in a package" }],
  traits: [
    { label: "Op amps", text: "1" },
    { label: "Weight of a path", text: "R_F over its resistor" },
    { label: "Paths see each other", text: "no" },
    { label: "Inverts", text: "yes" },
  ],
  leavesOut: [
    "the op amp's second pole, slew rate, swing and bias current",
    "noise of the resistors and the op amp",
    "coupling capacitors: put one before any path that carries an envelope",
    "a change of correlation with frequency",
  ],
});

export const summingNode = defineStageKind({
  id: "summing-node",
  name: "Summing node",
  summary: "Adds the paths of a voice, and says whether they add at all: they often carry the same noise.",
  place: "audio",
  ports: [
    ...paths.map((path) => ({
      id: `in${path}`,
      label: `path ${path}`,
      sort: "audio" as const,
      direction: "in" as const,
    })),
    { id: "out", label: "sum", sort: "audio", direction: "out" },
  ],
  topologies: [inverting],
  telling: ["gain1", "gain2"],
  reference,
  version: 1,
});
