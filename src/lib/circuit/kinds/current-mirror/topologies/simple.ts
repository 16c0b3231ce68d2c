import { saturationVoltage } from "../../../device/bipolar.ts";
import { defineTopology } from "../../../stage/topology.ts";
import { mirrorCurves } from "../curves.ts";
import { results, sharedBaseConditions, targets } from "../fields.ts";
import { mirrorFigures, worldOf, type MirrorShape } from "../figures.ts";
import { simpleFormulas } from "../formulas.ts";
import { joints } from "../joints.ts";
import { pairLimits } from "../limits.ts";
import { solvePair } from "../model.ts";
import { refuseFixedRatio } from "../design.ts";
import { sources } from "../sources.ts";
import { pairNetwork } from "./pairNetwork.ts";

const shape: MirrorShape = {
  solve: (world) => solvePair(world, 0, 0),
  nominal: 1,
  compliance: () => saturationVoltage,
  textbook: ({ earlyVoltage, referenceCurrent }, { collectorEmitter }) =>
    (earlyVoltage + collectorEmitter) / referenceCurrent,
};

const { degenerationVoltage: _, ...own } = results;

export const simple = defineTopology({
  id: "simple",
  name: "Simple",
  summary: "Two transistors and nothing else: the copy is off by base current, Early effect and mismatch.",
  parts: {},
  conditions: sharedBaseConditions,
  targets,
  results: own,
  analyse: ({ conditions }) => mirrorFigures(worldOf(conditions), shape),
  design: ({ targets: { ratio }, conditions }) =>
    refuseFixedRatio(ratio, mirrorFigures(worldOf(conditions), shape).ratio),
  anchors: [],
  curves: mirrorCurves(() => shape),
  limits: pairLimits,
  formulas: simpleFormulas,
  sources,
  network: pairNetwork(false),
  joints,
  devices: [
    {
      key: "q1",
      letter: "Q",
      label: "reference transistor",
      deviceClass: "general-purpose PNP, half of a matched pair",
    },
    { key: "q2", letter: "Q", label: "output transistor", deviceClass: "general-purpose PNP, half of a matched pair" },
  ],
  traits: [
    { label: "Transistors", text: "2, and one for each further output" },
    { label: "Base-current error", text: "2/β" },
    { label: "Early effect", text: "full: near 1 % per volt and more" },
    { label: "Mismatch", text: "full: 4 % per millivolt" },
    { label: "Voltage needed", text: "0.2 V" },
    { label: "Ratio set by", text: "number of transistors" },
  ],
  leavesOut: [
    "series resistance of base and emitter",
    "change of β with current",
    "charge storage: the mirror is far faster than any envelope",
    "self-heating, but for the warmth entered",
  ],
});
