import { smallSignalTransconductance } from "../../../device/ota.ts";
import { common } from "../../../stage/commonConditions.ts";
import { capacitor, resistor } from "../../../stage/fields.ts";
import { defineTopology, type Limit } from "../../../stage/topology.ts";
import type { ConditionValues, PartValues } from "../../../stage/values.ts";
import { otaCurves } from "../curves.ts";
import { conditions as shared, inputParts, targets } from "../fields.ts";
import { inputOf, otaFigures, type OtaStage } from "../figures.ts";
import { transimpedanceFormulas } from "../formulas.ts";
import { biasDraw, cellJoints } from "../joints.ts";
import { limits as otaLimits } from "../limits.ts";
import { attenuation, pairInput, twoPoleBandwidth } from "../model.ts";
import { transimpedanceNetwork } from "../networks.ts";
import { results } from "../results.ts";
import { sources } from "../sources.ts";
import { leavesOut, traits } from "../texts.ts";

const parts = {
  ...inputParts,
  rf: resistor({
    label: "feedback",
    symbol: "R_f",
    default: 10e3,
    least: 1e3,
    most: 1e6,
    help: "Turns the amplifier's current into volts.",
  }),
  cf: capacitor({
    label: "feedback",
    symbol: "C_f",
    default: 100e-12,
    least: 10e-12,
    most: 10e-9,
    help: "Across R_f; sets the bandwidth.",
  }),
} as const;

const conditions = { ...shared, gainBandwidth: common.gainBandwidth } as const;

interface State {
  parts: PartValues<typeof parts>;
  conditions: ConditionValues<typeof conditions>;
}

const poles = ({ parts: { rf, cf }, conditions: { gainBandwidth } }: State): [number, number] => [
  1 / (2 * Math.PI * rf * cf),
  gainBandwidth ?? Infinity,
];

const stageOf = (state: State): OtaStage => ({
  input: inputOf(state.parts, state.conditions),
  load: state.parts.rf,
  inverting: true,
  bandwidth: twoPoleBandwidth(...poles(state)),
});

function magnitudeAt(state: State, frequency: number): number {
  const { input, load } = stageOf(state);
  const gain = attenuation(input) * smallSignalTransconductance(pairInput(input), state.conditions.biasCurrent) * load;
  return poles(state).reduce((left, pole) => left / Math.hypot(1, frequency / pole), gain);
}

const limits: readonly Limit<typeof parts, typeof conditions, typeof results>[] = otaLimits;

export const transimpedance = defineTopology({
  id: "transimpedance",
  name: "Transimpedance",
  summary: "The amplifier's current into an op amp with one feedback resistor: full swing, low output resistance.",
  parts,
  conditions,
  targets,
  results,
  analyse: (state) => otaFigures(stageOf(state), state.conditions),
  design: ({ targets: { gain }, conditions: given, given: decided }) => {
    const rin = decided.rin ?? parts.rin.default;
    const rsh = decided.rsh ?? parts.rsh.default;
    const input = inputOf({ rin, rsh }, given);
    const rf = gain / (attenuation(input) * smallSignalTransconductance(pairInput(input), given.biasCurrent));
    return { rin, rsh, rf, cf: decided.cf ?? parts.cf.default };
  },
  anchors: [
    { part: "rin", least: 10e3, most: 100e3 },
    { part: "rsh", least: 1e3, most: 1e3 },
    { part: "cf", least: 100e-12, most: 100e-12 },
  ],
  curves: otaCurves<State>(stageOf, magnitudeAt),
  limits,
  formulas: transimpedanceFormulas,
  sources,
  network: transimpedanceNetwork,
  joints: cellJoints(() => 0),
  draws: biasDraw,
  devices: [
    { key: "u1", letter: "U", label: "amplifier cell", deviceClass: "bipolar transconductance amplifier, one of two" },
    { key: "u2", letter: "U", label: "current to voltage", deviceClass: "JFET-input op amp, one of two in a package" },
  ],
  traits: traits({
    opAmps: "1",
    inverts: "yes",
    bandwidth: "R_f and C_f, the same at any bias current",
    swing: "the op amp's",
  }),
  leavesOut,
});
