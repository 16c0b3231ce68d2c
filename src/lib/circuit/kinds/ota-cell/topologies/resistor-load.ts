import { smallSignalTransconductance } from "../../../device/ota.ts";
import { capacitor, resistor } from "../../../stage/fields.ts";
import { defineTopology, type Limit } from "../../../stage/topology.ts";
import type { ConditionValues, PartValues } from "../../../stage/values.ts";
import { otaCurves } from "../curves.ts";
import { conditions, inputParts, targets } from "../fields.ts";
import { inputOf, otaFigures, type OtaStage } from "../figures.ts";
import { resistorLoadFormulas } from "../formulas.ts";
import { biasDraw, cellJoints } from "../joints.ts";
import { resistorLoadLimits } from "../limits.ts";
import { swingOn } from "../../../device/opAmp.ts";
import { attenuation, pairInput } from "../model.ts";
import { resistorLoadNetwork } from "../networks.ts";
import { resistorLoadResults as results } from "../results.ts";
import { sources } from "../sources.ts";
import { leavesOut, traits } from "../texts.ts";

const parts = {
  ...inputParts,
  rl: resistor({
    label: "load",
    symbol: "R_L",
    default: 10e3,
    least: 1e3,
    most: 1e6,
    help: "From the amplifier's output to ground.",
  }),
  cl: capacitor({
    label: "load",
    symbol: "C_L",
    default: 150e-12,
    least: 10e-12,
    most: 10e-9,
    help: "Across R_L, strays included.",
  }),
} as const;

interface State {
  parts: PartValues<typeof parts>;
  conditions: ConditionValues<typeof conditions>;
}

const stageOf = ({ parts: values, conditions: given }: State): OtaStage => ({
  input: inputOf(values, given),
  load: values.rl,
  inverting: false,
  bandwidth: 1 / (2 * Math.PI * values.rl * values.cl),
});

function magnitudeAt(state: State, frequency: number): number {
  const { input, load, bandwidth } = stageOf(state);
  const gain = attenuation(input) * smallSignalTransconductance(pairInput(input), state.conditions.biasCurrent) * load;
  return gain / Math.hypot(1, frequency / bandwidth);
}

const limits: readonly Limit<typeof parts, typeof conditions, typeof results>[] = resistorLoadLimits;

export const resistorLoad = defineTopology({
  id: "resistor-load",
  name: "Resistor load",
  summary:
    "The amplifier's current into one resistor, with a buffer behind: fewer parts, less swing, slower when quiet.",
  parts,
  conditions,
  targets,
  results,
  analyse: (state) => ({
    ...otaFigures(stageOf(state), state.conditions),
    outputSlew: state.conditions.biasCurrent / state.parts.cl,
    largestLoad: swingOn(state.conditions) / state.conditions.biasCurrent,
  }),
  design: ({ targets: { gain }, conditions: given, given: decided }) => {
    const rin = decided.rin ?? parts.rin.default;
    const rsh = decided.rsh ?? parts.rsh.default;
    const input = inputOf({ rin, rsh }, given);
    const rl = gain / (attenuation(input) * smallSignalTransconductance(pairInput(input), given.biasCurrent));
    return { rin, rsh, rl, cl: decided.cl ?? parts.cl.default };
  },
  anchors: [
    { part: "rin", least: 10e3, most: 100e3 },
    { part: "rsh", least: 1e3, most: 1e3 },
    { part: "cl", least: 150e-12, most: 150e-12 },
  ],
  curves: otaCurves<State>(stageOf, magnitudeAt),
  limits,
  formulas: resistorLoadFormulas,
  sources,
  network: resistorLoadNetwork,
  // The buffer behind the load.
  joints: cellJoints(() => 0),
  draws: biasDraw,
  devices: [
    {
      key: "u1",
      letter: "U",
      label: "amplifier cell",
      deviceClass: "bipolar transconductance amplifier with buffer, one of two",
    },
  ],
  traits: traits({
    opAmps: "none, the package's buffer",
    inverts: "no",
    bandwidth: "R_L and C_L",
    swing: "bias current times R_L",
  }),
  leavesOut: [...leavesOut, "the buffer's offset and input current"],
});
