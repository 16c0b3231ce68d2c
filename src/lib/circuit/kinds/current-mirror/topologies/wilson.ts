import { saturationVoltage } from "../../../device/bipolar.ts";
import type { Network } from "../../../stage/network.ts";
import { defineTopology } from "../../../stage/topology.ts";
import { mirrorCurves } from "../curves.ts";
import { refuseFixedRatio } from "../design.ts";
import { conditions, results, targets } from "../fields.ts";
import { mirrorFigures, worldOf, type MirrorShape } from "../figures.ts";
import { wilsonFormulas } from "../formulas.ts";
import { joints } from "../joints.ts";
import { commonLimits } from "../limits.ts";
import { solveWilson } from "../model.ts";
import { sources } from "../sources.ts";

const shape: MirrorShape = {
  solve: solveWilson,
  nominal: 1,
  compliance: ({ baseEmitter }) => baseEmitter + saturationVoltage,
  textbook: ({ beta, earlyVoltage, referenceCurrent }) => (beta * earlyVoltage) / (2 * referenceCurrent),
};

const { degenerationVoltage: _, ...own } = results;

const network: Network = {
  width: 19,
  height: 18,
  items: [
    { draw: "rail", at: [6, 2], label: "V+" },
    { draw: "rail", at: [14, 2], label: "V+" },
    {
      draw: "transistor",
      name: "Q1",
      polarity: "pnp",
      at: [8, 4],
      facing: "left",
      nodes: { base: "b", collector: "r", emitter: "vp" },
    },
    {
      draw: "transistor",
      name: "Q2",
      polarity: "pnp",
      at: [12, 4],
      nodes: { base: "b", collector: "b", emitter: "vp" },
    },
    {
      draw: "wire",
      through: [
        [8, 4],
        [12, 4],
      ],
    },
    { draw: "dot", at: [11, 4] },
    {
      draw: "wire",
      through: [
        [11, 4],
        [11, 6],
        [14, 6],
      ],
    },
    { draw: "dot", at: [14, 6] },
    { draw: "node", at: [15.2, 6.8], label: "b" },
    {
      draw: "wire",
      through: [
        [14, 6],
        [14, 8],
      ],
    },
    {
      draw: "transistor",
      name: "Q3",
      polarity: "pnp",
      at: [12, 10],
      nodes: { base: "r", collector: "o", emitter: "b" },
    },
    {
      draw: "wire",
      through: [
        [6, 6],
        [6, 13],
      ],
    },
    {
      draw: "wire",
      through: [
        [6, 10],
        [12, 10],
      ],
    },
    { draw: "dot", at: [6, 10] },
    { draw: "node", at: [6, 10], label: "r" },
    { draw: "source", name: "I_ref", sort: "current", from: [6, 13], to: [6, 17], nodes: ["r", "0"] },
    { draw: "ground", at: [6, 17] },
    {
      draw: "wire",
      through: [
        [14, 12],
        [14, 14],
        [18, 14],
      ],
    },
    { draw: "port", at: [18, 14], label: "out", side: "right" },
  ],
};

const pnp = "general-purpose PNP";
const half = `${pnp}, half of a matched pair` as const;

export const wilson = defineTopology({
  id: "wilson",
  name: "Wilson",
  summary: "A third transistor cancels the base currents and shields the copy from the output's voltage.",
  parts: {},
  conditions,
  targets,
  results: own,
  analyse: ({ conditions: given }) => mirrorFigures(worldOf(given), shape),
  design: ({ targets: { ratio }, conditions: given }) =>
    refuseFixedRatio(ratio, mirrorFigures(worldOf(given), shape).ratio),
  anchors: [],
  curves: mirrorCurves(() => shape),
  limits: commonLimits,
  formulas: wilsonFormulas,
  sources,
  network,
  joints,
  devices: [
    { key: "q1", letter: "Q", label: "reference transistor", deviceClass: half },
    { key: "q2", letter: "Q", label: "copying transistor", deviceClass: half },
    { key: "q3", letter: "Q", label: "output transistor", deviceClass: pnp },
  ],
  traits: [
    { label: "Transistors", text: "3" },
    { label: "Base-current error", text: "2/β²" },
    { label: "Early effect", text: "one V_BE over V_A, about 1 %" },
    { label: "Mismatch", text: "full: 4 % per millivolt" },
    { label: "Voltage needed", text: "0.85 V" },
    { label: "Ratio set by", text: "the pair, 1" },
  ],
  leavesOut: [
    "series resistance of base and emitter",
    "change of β with current",
    "charge storage: the mirror is far faster than any envelope",
    "self-heating, but for the warmth entered",
  ],
});
