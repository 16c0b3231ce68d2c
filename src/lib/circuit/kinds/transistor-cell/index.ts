import { defineStageKind } from "../../stage/kind.ts";
import { defineTopology } from "../../stage/topology.ts";
import { analyse, design } from "./analyse.ts";
import { curves } from "./curves.ts";
import { conditions, parts, results, targets } from "./fields.ts";
import { formulas } from "./formulas.ts";
import { joints } from "./joints.ts";
import { limits } from "./limits.ts";
import { network } from "./network.ts";
import { reference } from "./reference.ts";
import { sources } from "./sources.ts";

const swing = defineTopology({
  id: "swing",
  name: "Swing type, overdriven",
  summary: "One transistor whose collector supply is the envelope: the output cannot exceed it.",
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
  devices: [{ key: "q1", letter: "Q", label: "gain cell", deviceClass: "general-purpose NPN" }],
  traits: [
    { label: "Op amps", text: "none" },
    { label: "Gain law", text: "proportional to the envelope, down to 0.25 V" },
    { label: "Drive", text: "12 dB more gives about 4 dB: tone rather than level" },
    { label: "Inverts", text: "yes" },
  ],
  leavesOut: [
    "charge storage: edges are taken as instant",
    "the Early effect and the spread of β and V_BE from part to part",
    "breakdown of a base driven far below ground",
    "the time that C_i takes to settle",
  ],
});

export const transistorCell = defineStageKind({
  id: "transistor-cell",
  name: "Transistor cell",
  summary: "Controls gain with one transistor fed by the envelope: cheap, dirty, punchy.",
  place: "audio",
  ports: [
    { id: "in", label: "audio in", sort: "audio", direction: "in" },
    { id: "control", label: "envelope in", sort: "control", direction: "in" },
    { id: "out", label: "audio out", sort: "audio", direction: "out" },
  ],
  topologies: [swing],
  telling: ["outputRms", "thump"],
  reference,
  version: 1,
});
