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

const gatedOscillator = defineTopology({
  id: "gated-oscillator",
  name: "Gated oscillator",
  summary: "A comparator oscillates while a gate is open; the end of the gate starts the tail.",
  parts,
  conditions,
  targets,
  results,
  analyse,
  design,
  anchors: [{ part: "ct", least: 10e-9, most: 1e-6 }],
  curves,
  limits,
  formulas,
  sources,
  network,
  joints,
  devices: [
    { key: "u1", letter: "U", label: "comparator", deviceClass: "JFET-input op amp, one of two in a package" },
    { key: "d1", letter: "D", label: "hits", deviceClass: "small-signal diode" },
    { key: "d2", letter: "D", label: "tail", deviceClass: "small-signal diode" },
  ],
  traits: [
    { label: "Op amps", text: "1, and the gate" },
    { label: "Hits", text: "2 to 6, by the ratio of two time constants" },
    { label: "Spacing", text: "one for all, the first interval apart" },
  ],
  leavesOut: [
    "the comparator's delay, slew rate and offset",
    "how far each hit charges its capacitor",
    "loads on the hit and tail capacitors",
    "the spread of the thresholds",
  ],
});

export const burstEnvelope = defineStageKind({
  id: "burst-envelope",
  name: "Burst envelope",
  summary: "Gives a clap its hands: several short decays a few milliseconds apart, then one tail.",
  place: "trigger and control",
  ports: [
    { id: "in", label: "trigger in", sort: "trigger", direction: "in" },
    { id: "out", label: "envelope out", sort: "control", direction: "out" },
  ],
  topologies: [gatedOscillator],
  telling: ["hits", "spacing"],
  reference,
  version: 1,
});
