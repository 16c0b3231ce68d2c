import { defineTopology } from "../../../../stage/topology.ts";
import { potEnds, responseCurves, retuneCurve } from "../../curves.ts";
import { filterJoints } from "../../joints.ts";
import { sourcesOf } from "../../sources.ts";
import { analyse, centreAt, design, networkAt, transferAt, type MultipleFeedbackState } from "./analyse.ts";
import { conditions, parts, results, targets } from "./fields.ts";
import { formulas } from "./formulas.ts";
import { limits } from "./limits.ts";
import { network } from "./network.ts";
import { idealCentre } from "./model.ts";

/** A centre to draw about even where the response has no peak to read. */
const drawnCentre = (state: MultipleFeedbackState) =>
  centreAt(state) || idealCentre(networkAt(state.parts, state.conditions));

const atRotation = (state: MultipleFeedbackState, rotation: number): MultipleFeedbackState => ({
  ...state,
  conditions: { ...state.conditions, rotation },
});

export const multipleFeedback = defineTopology({
  id: "multiple-feedback",
  name: "Multiple feedback",
  summary: "One op amp, inverting. One resistor moves the centre at constant bandwidth and peak gain.",
  parts,
  conditions,
  targets,
  results,
  analyse,
  design,
  anchors: [{ part: "c1", least: 470e-12, most: 470e-9, follows: ["c2"] }],
  curves: [
    ...responseCurves(transferAt, drawnCentre, (state) =>
      state.parts.rbPot > 0 ? potEnds((rotation) => atRotation(state, rotation)) : [],
    ),
    retuneCurve(centreAt, (state) => state.conditions.rotation),
  ],
  limits,
  formulas,
  sources: sourcesOf(formulas, limits),
  network,
  joints: filterJoints({ input: ({ ra }) => ra! }),
  devices: [{ key: "u1", letter: "U", label: "op amp", deviceClass: "JFET-input op amp, one of two in a package" }],
  traits: [
    { label: "Op amps", text: "1" },
    { label: "Q range", text: "0.5 to 10" },
    { label: "Single-resistor retune", text: "R_B" },
    { label: "Constant under retune", text: "bandwidth and peak gain" },
    { label: "Finite gain-bandwidth", text: "centre down, Q up by Q·f0/ft" },
    { label: "Inverts", text: "yes" },
  ],
  leavesOut: [
    "the op amp's second pole, slew rate and input capacitance",
    "noise of the resistors and the op amp",
    "losses and voltage dependence of the capacitors",
    "the pot's end resistance",
  ],
});
