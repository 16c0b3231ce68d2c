import { defineTopology } from "../../../../stage/topology.ts";
import { potEnds, responseCurves, retuneCurve } from "../../curves.ts";
import { filterJoints } from "../../joints.ts";
import { sourcesOf } from "../../sources.ts";
import { analyse, centreAt, design, networkAt, transferAt, type SallenKeyState } from "./analyse.ts";
import { conditions, parts, results, targets } from "./fields.ts";
import { formulas } from "./formulas.ts";
import { limits } from "./limits.ts";
import { idealCentre } from "./model.ts";
import { network } from "./network.ts";

/** A centre to draw about even where the network oscillates. */
const drawnCentre = (state: SallenKeyState) => centreAt(state) || idealCentre(networkAt(state));

const atRotation = (state: SallenKeyState, rotation: number): SallenKeyState => ({
  ...state,
  conditions: { ...state.conditions, rotation },
});

export const sallenKey = defineTopology({
  id: "sallen-key",
  name: "Sallen-Key",
  summary: "One op amp, not inverting. The amplifier's gain sets Q, which strays with every per cent of it.",
  parts,
  conditions,
  targets,
  results,
  analyse,
  design,
  anchors: [{ part: "c1", least: 470e-12, most: 470e-9, follows: ["c2"] }],
  curves: [
    ...responseCurves(transferAt, drawnCentre, (state) =>
      state.parts.r2Pot > 0 ? potEnds((rotation) => atRotation(state, rotation)) : [],
    ),
    retuneCurve(centreAt, (state) => state.conditions.rotation),
  ],
  limits,
  formulas,
  sources: sourcesOf(formulas, limits),
  network,
  joints: filterJoints({ input: ({ r1 }) => r1! }),
  devices: [{ key: "u1", letter: "U", label: "op amp", deviceClass: "JFET-input op amp, one of two in a package" }],
  traits: [
    { label: "Op amps", text: "1" },
    { label: "Q range", text: "0.5 to 3" },
    { label: "Single-resistor retune", text: "R_2, moves Q too" },
    { label: "Constant under retune", text: "nothing" },
    { label: "Finite gain-bandwidth", text: "centre down, Q up by K²·f0/(2.83·ft)" },
    { label: "Inverts", text: "no" },
  ],
  leavesOut: [
    "the op amp's output resistance, second pole, slew rate and input capacitance",
    "noise of the resistors and the op amp",
    "losses and voltage dependence of the capacitors",
    "the pot's end resistance",
  ],
});
