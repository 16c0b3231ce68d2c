import { cascade } from "../../../network/transfer.ts";
import { resistor } from "../../../stage/fields.ts";
import { defineTopology, type DesignRefusal, type DesignRequest, type Limit } from "../../../stage/topology.ts";
import type { PartValues, State } from "../../../stage/values.ts";
import { driverCurves } from "../curves.ts";
import { outputResistorFor } from "../design.ts";
import { conditions, results, sharedParts, targets } from "../fields.ts";
import { figuresOf, type Amplifier, type C, type R } from "../figures.ts";
import { formulasFor } from "../formulas.ts";
import { driverJoints } from "../joints.ts";
import { limits } from "../limits.ts";
import { jackTransfer, nonInvertingTransfer } from "../model.ts";
import { nonInvertingNetwork } from "../networks.ts";
import { sources } from "../sources.ts";

const parts = {
  ...sharedParts,
  ri: { ...sharedParts.ri, label: "gain, to ground" },
  rf: { ...sharedParts.rf, default: 10e3 },
  rb: resistor({
    label: "bias",
    symbol: "R_B",
    default: 0,
    least: 0,
    most: 1e6,
    suggestion: 100e3,
    help: "From the + input to ground, needed behind a coupling capacitor; 0 where none is fitted.",
  }),
} as const;
type P = typeof parts;
type DriverState = State<P, C>;

const usualResistor = 10e3;
const usualBias = 100e3;
const usualCoupling = 1e-6;

/** The share of the source that its resistance and the bias resistor leave. */
const inputShare = (rb: number, source: number) => (rb > 0 ? rb / (rb + source) : 1);

function amplifierOf({ parts: { ri, rf, rb, cin }, conditions: { sourceResistance } }: DriverState): Amplifier {
  return {
    idealGain: (1 + rf / ri) * inputShare(rb, sourceResistance),
    inverting: false,
    noiseGain: 1 + rf / ri,
    offsetGain: 1 + rf / ri,
    noisyResistance: 1 / (1 / rf + 1 / ri),
    couplingResistance: rb > 0 ? rb + sourceResistance : 0,
    cin,
  };
}

function responses({ parts: values, conditions: around }: DriverState) {
  const { sourceResistance } = around;
  const amplifier = nonInvertingTransfer({ ...values, sourceResistance }, around);
  const load = around.loadResistance === null ? 0 : around.loads / around.loadResistance;
  const { ro, cout } = values;
  return { amplifier, jack: cascade(amplifier, jackTransfer({ ro, cout, load, cable: around.cableCapacitance })) };
}

const noBias: Limit<P, C, R> = {
  code: "no-bias-path",
  severity: "caution",
  unit: "Ω",
  source: "practice",
  template:
    "A capacitor blocks the + input and R_B is {value}, not fitted: the input drifts to a rail. Fit some {limit}; the corner is left out until then.",
  check: ({ parts: { cin, rb } }) => (cin > 0 && rb === 0 ? { value: 0, limit: usualBias } : undefined),
};

/** Exact resistors for an ideal op amp; `designExactly` corrects for a real one. */
function design({
  targets: wanted,
  conditions: around,
  given,
}: DesignRequest<P, C, typeof targets>): PartValues<P> | DesignRefusal {
  const ri = given.ri ?? usualResistor;
  const rb = given.rb ?? usualBias;
  const gain = wanted.gain / inputShare(rb, around.sourceResistance);
  if (!(gain > 1)) {
    return {
      refused: true,
      field: "gain",
      message: "This stage has a gain of more than 1. Ask for more, or take the inverting one.",
    };
  }
  const ro = outputResistorFor(wanted, around, given.ro);
  if (typeof ro !== "number") return ro;
  const [cin, cout] = [given.cin ?? usualCoupling, given.cout ?? 0];
  return { ri, rf: (gain - 1) * ri, ro, cin, cout, rb };
}

export const nonInverting = defineTopology({
  id: "non-inverting",
  name: "Non-inverting",
  summary: "Gain of one and more, and an input that takes no current.",
  parts,
  conditions,
  targets,
  results,
  analyse: (state: DriverState) => figuresOf(amplifierOf(state), state.parts, state.conditions),
  design,
  anchors: [],
  curves: driverCurves(responses, (state: DriverState) => amplifierOf(state).idealGain),
  limits: [...limits, noBias],
  formulas: formulasFor(false),
  sources,
  network: nonInvertingNetwork,
  joints: driverJoints(({ parts: values }) => (values.rb! > 0 ? values.rb : undefined)),
  devices: [{ key: "u1", letter: "U", label: "op amp", deviceClass: "JFET-input op amp, one of two in a package" }],
  traits: [
    { label: "Gain", text: "1 + R_F/R_i" },
    { label: "Input resistance", text: "R_B" },
    { label: "Noise gain at a gain of 2", text: "2" },
    { label: "Inverts", text: "no" },
  ],
  leavesOut: [
    "the op amp's second pole, bias current, current noise and flicker noise",
    "distortion before clipping, and reversal where the input passes the common-mode limit",
    "thermal noise of the source and of R_B",
    "losses of the coupling capacitors",
  ],
});
