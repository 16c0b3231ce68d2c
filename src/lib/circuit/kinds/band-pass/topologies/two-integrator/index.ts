import type { Curve } from "../../../../stage/curve.ts";
import { magnitudeDbAt } from "../../../../network/transfer.ts";
import { defineTopology } from "../../../../stage/topology.ts";
import { potEnds, responseCurves, retuneCurve, roundDecades } from "../../curves.ts";
import { filterJoints } from "../../joints.ts";
import { sourcesOf } from "../../sources.ts";
import { analyse, centreAt, design, networkAt, outputsAt, type TwoIntegratorState } from "./analyse.ts";
import { conditions, parts, results, targets } from "./fields.ts";
import { formulas } from "./formulas.ts";
import { limits } from "./limits.ts";
import { idealFigures } from "./model.ts";
import { network } from "./network.ts";

/** A centre to draw about even where the loop oscillates. */
const drawnCentre = (state: TwoIntegratorState) => centreAt(state) || idealFigures(networkAt(state)).centre;

const atRotation = (state: TwoIntegratorState, rotation: number): TwoIntegratorState => ({
  ...state,
  conditions: { ...state.conditions, rotation },
});

const outputs: Curve<TwoIntegratorState> = {
  id: "outputs",
  name: "All three outputs",
  x: { quantity: "Frequency", unit: "Hz", scale: "logarithmic" },
  y: { quantity: "Gain", unit: "dB", scale: "linear" },
  domain: (state) => roundDecades(drawnCentre(state)),
  defined: [Number.MIN_VALUE, Number.MAX_VALUE],
  lines: (state) => {
    const { highPass, bandPass, lowPass } = outputsAt(state);
    return [
      { id: "now", label: "band-pass", at: (x) => magnitudeDbAt(bandPass, x) },
      { id: "high-pass", label: "high-pass", at: (x) => magnitudeDbAt(highPass, x) },
      { id: "low-pass", label: "low-pass", at: (x) => magnitudeDbAt(lowPass, x) },
    ];
  },
  mark: (state) => ({ x: drawnCentre(state), label: "centre" }),
};

export const twoIntegrator = defineTopology({
  id: "two-integrator",
  name: "Two integrators",
  summary:
    "Three op amps, not inverting here. A dual pot moves the centre at constant Q; high-pass and low-pass come with it.",
  parts,
  conditions,
  targets,
  results,
  analyse,
  design,
  anchors: [{ part: "c1", least: 470e-12, most: 100e-9, follows: ["c2"] }],
  curves: [
    ...responseCurves(
      (state: TwoIntegratorState) => outputsAt(state).bandPass,
      drawnCentre,
      (state) => (state.parts.r1Pot + state.parts.r2Pot > 0 ? potEnds((rotation) => atRotation(state, rotation)) : []),
    ),
    outputs,
    retuneCurve(centreAt, (state) => state.conditions.rotation),
  ],
  limits,
  formulas,
  sources: sourcesOf(formulas, limits),
  network,
  joints: filterJoints({ input: ({ ri }) => ri! }),
  devices: [
    { key: "u1", letter: "U", label: "summer", deviceClass: "JFET-input op amp, one of four in a package" },
    { key: "u2", letter: "U", label: "first integrator", deviceClass: "JFET-input op amp, one of four in a package" },
    { key: "u3", letter: "U", label: "second integrator", deviceClass: "JFET-input op amp, one of four in a package" },
  ],
  traits: [
    { label: "Op amps", text: "3" },
    { label: "Q range", text: "0.5 to 30" },
    { label: "Single-resistor retune", text: "no: a dual pot on R_1 and R_2" },
    { label: "Constant under retune", text: "Q" },
    { label: "Finite gain-bandwidth", text: "Q up by 5·Q·f0/ft" },
    { label: "Inverts", text: "no" },
  ],
  leavesOut: [
    "the op amps' output resistance, second pole, slew rate and input capacitance",
    "noise of the resistors and the op amps",
    "losses and voltage dependence of the capacitors",
    "the pot's end resistance",
  ],
});
