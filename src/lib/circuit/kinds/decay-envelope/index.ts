import { defineStageKind } from "../../stage/kind.ts";
import { defineTopology } from "../../stage/topology.ts";
import { analyse, design } from "./analyse.ts";
import { curves } from "./curves.ts";
import { conditions, parts, results, targets } from "./fields.ts";
import { formulas } from "./formulas.ts";
import { chargeDraw, joints } from "./joints.ts";
import { limits } from "./limits.ts";
import { network } from "./network.ts";
import { reference } from "./reference.ts";
import { sources } from "./sources.ts";

const diodeCharged = defineTopology({
  id: "diode-charged",
  name: "Diode-charged",
  summary: "A pulse charges a capacitor through a diode; a pot sets how long it takes to empty.",
  parts,
  conditions,
  targets,
  results,
  analyse,
  design,
  anchors: [{ part: "c", least: 10e-9, most: 10e-6 }],
  curves,
  limits,
  formulas,
  sources,
  network,
  joints,
  draws: chargeDraw,
  devices: [
    { key: "d1", letter: "D", label: "diode", deviceClass: "small-signal diode" },
    { key: "u1", letter: "U", label: "buffer", deviceClass: "JFET-input op amp, one of two in a package" },
  ],
  traits: [
    { label: "Op amps", text: "1, as a buffer" },
    { label: "Decay", text: "5 ms to 20 s" },
    { label: "Attack", text: "the charging time constant" },
    { label: "Velocity", text: "the peak follows the pulse, less the diode drop" },
  ],
  leavesOut: [
    "the diode's reverse current and stored charge",
    "the current limit of what drives the pulse",
    "what is left on the capacitor from the hit before",
    "dielectric absorption and the capacitor's change with voltage",
    "the pot's end resistance",
  ],
});

export const decayEnvelope = defineStageKind({
  id: "decay-envelope",
  name: "Decay envelope",
  summary: "Turns a pulse into one decaying control voltage: the peak by velocity, the time by a pot.",
  place: "trigger and control",
  ports: [
    { id: "in", label: "pulse in", sort: "trigger", direction: "in" },
    { id: "out", label: "envelope out", sort: "control", direction: "out" },
  ],
  topologies: [diodeCharged],
  telling: ["decayTime60", "peakVoltage"],
  reference,
  version: 1,
});
