import { cascade } from "../../../network/transfer.ts";
import { defineTopology } from "../../../stage/topology.ts";
import type { PartValues, State } from "../../../stage/values.ts";
import { driverCurves } from "../curves.ts";
import { outputResistorFor } from "../design.ts";
import { conditions, results, sharedParts, targets } from "../fields.ts";
import { figuresOf, type Amplifier, type C } from "../figures.ts";
import { formulasFor } from "../formulas.ts";
import { driverJoints } from "../joints.ts";
import { limits } from "../limits.ts";
import { invertingTransfer, jackTransfer } from "../model.ts";
import { invertingNetwork } from "../networks.ts";
import { sources } from "../sources.ts";

const parts = sharedParts;
type DriverState = State<typeof parts, C>;

const usualInput = 10e3;
const usualCoupling = 1e-6;

function amplifierOf({ parts: { ri, rf, cin }, conditions: { sourceResistance } }: DriverState): Amplifier {
  const input = ri + sourceResistance;
  return {
    idealGain: rf / input,
    inverting: true,
    noiseGain: 1 + rf / input,
    offsetGain: cin > 0 ? 1 : 1 + rf / input,
    noisyResistance: 1 / (1 / rf + 1 / input),
    couplingResistance: input,
    cin,
  };
}

function responses({ parts: values, conditions: around }: DriverState) {
  const { rf, cin, ro, cout } = values;
  const amplifier = invertingTransfer({ input: values.ri + around.sourceResistance, rf, cin }, around);
  const load = around.loadResistance === null ? 0 : around.loads / around.loadResistance;
  return { amplifier, jack: cascade(amplifier, jackTransfer({ ro, cout, load, cable: around.cableCapacitance })) };
}

export const inverting = defineTopology({
  id: "inverting",
  name: "Inverting",
  summary: "Gain by two resistors, from below one upwards; joins a sum at its input.",
  parts,
  conditions,
  targets,
  results,
  analyse: (state: DriverState) => figuresOf(amplifierOf(state), state.parts, state.conditions),
  design({ targets: wanted, conditions: around, given }) {
    const ri = given.ri ?? usualInput;
    const ro = outputResistorFor(wanted, around, given.ro);
    if (typeof ro !== "number") return ro;
    const rf = wanted.gain * (ri + around.sourceResistance);
    return { ri, rf, ro, cin: given.cin ?? usualCoupling, cout: given.cout ?? 0 } satisfies PartValues<typeof parts>;
  },
  anchors: [],
  curves: driverCurves(responses, (state: DriverState) => amplifierOf(state).idealGain),
  limits,
  formulas: formulasFor(true),
  sources,
  network: invertingNetwork,
  joints: driverJoints(({ parts: values }) => values.ri),
  devices: [{ key: "u1", letter: "U", label: "op amp", deviceClass: "JFET-input op amp, one of two in a package" }],
  traits: [
    { label: "Gain", text: "R_F/R_i, below one too" },
    { label: "Input resistance", text: "R_i" },
    { label: "Noise gain at a gain of 2", text: "3" },
    { label: "Inverts", text: "yes" },
  ],
  leavesOut: [
    "the op amp's second pole, bias current, current noise and flicker noise",
    "distortion before clipping",
    "losses of the coupling capacitors",
  ],
});
