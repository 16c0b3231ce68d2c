import type { Curve } from "../../../../stage/curve.ts";
import { modesOf } from "../../../../network/pulse.ts";
import { defineTopology } from "../../../../stage/topology.ts";
import { potEnds, responseCurves, retuneCurve } from "../../curves.ts";
import { filterJoints } from "../../joints.ts";
import { sourcesOf } from "../../sources.ts";
import { analyse, centreAt, design, strikeOf, transferAt, type BridgedTState } from "./analyse.ts";
import { conditions, parts, results, targets } from "./fields.ts";
import { formulas } from "./formulas.ts";
import { limits } from "./limits.ts";
import { polePair } from "./model.ts";
import { network } from "./network.ts";
import { struckAt } from "./strike.ts";

const atRotation = (state: BridgedTState, rotation: number): BridgedTState => ({
  ...state,
  conditions: { ...state.conditions, rotation },
});

/** Time constants that are worth drawing: to −40 dB. */
const drawnConstants = Math.log(100);

const ring: Curve<BridgedTState> = {
  id: "ring",
  name: "Struck ring",
  x: { quantity: "Time", unit: "s", scale: "linear" },
  y: { quantity: "Output", unit: "V", scale: "linear" },
  domain: (state) => {
    const { timeConstant, centre } = polePair(transferAt(state));
    // Enough of a sharp ring to see its decay, and few enough periods to see each.
    return [0, state.conditions.strikeWidth + Math.min(drawnConstants * timeConstant, 30 / centre)];
  },
  defined: [0, Number.MAX_VALUE],
  lines: (state) => {
    const modes = modesOf(transferAt(state));
    const strike = strikeOf(state);
    return [{ id: "now", label: "as set", at: (time) => (modes ? struckAt(modes, strike, time) : Number.NaN) }];
  },
  mark: (state) => ({ x: state.conditions.strikeWidth, label: "strike ends" }),
};

export const bridgedT = defineTopology({
  id: "bridged-t",
  name: "Bridged T",
  summary:
    "One op amp that rings when it is struck: one resistor sets the ring time, another the pitch without touching it.",
  parts,
  conditions,
  targets,
  results,
  analyse,
  design,
  anchors: [{ part: "c1", least: 1e-9, most: 220e-9, follows: ["c2"] }],
  curves: [
    ring,
    ...responseCurves(
      transferAt,
      (state) => centreAt(state),
      (state) => (state.parts.r1Pot > 0 ? potEnds((rotation) => atRotation(state, rotation)) : []),
    ),
    retuneCurve(centreAt, (state) => state.conditions.rotation),
  ],
  limits,
  formulas,
  sources: sourcesOf(formulas, limits),
  network,
  joints: filterJoints({ input: ({ rin }) => rin!, struck: true }),
  devices: [{ key: "u1", letter: "U", label: "op amp", deviceClass: "JFET-input op amp, one of two in a package" }],
  traits: [
    { label: "Op amps", text: "1" },
    { label: "Q range", text: "5 to 30" },
    { label: "Single-resistor retune", text: "R_1" },
    { label: "Constant under retune", text: "ring time" },
    { label: "Finite gain-bandwidth", text: "centre down by Q·f0/ft" },
    { label: "Inverts", text: "yes" },
  ],
  leavesOut: [
    "clipping and slew rate, which bend the first swings of a hard strike",
    "the op amp's output resistance, second pole and input capacitance",
    "noise of the resistors and the op amp",
    "losses and voltage dependence of the capacitors",
    "the pot's end resistance",
  ],
});
