import { common } from "../../../../stage/commonConditions.ts";
import { capacitor, condition, pot, resistor, target, type ResultField } from "../../../../stage/fields.ts";
import {
  centreTarget,
  outputNoise,
  potConditions,
  responseResults,
  retuneResults,
  surroundings,
} from "../../fields.ts";

const arm = { default: 22e-9, least: 1e-9, most: 220e-9 };

export const parts = {
  r1: resistor({
    label: "leg, fixed",
    symbol: "R_1",
    default: 1e3,
    help: "From the middle node to ground; sets the pitch.",
  }),
  r1Pot: pot({
    label: "pitch pot",
    symbol: "R_V",
    padding: ["r1"],
    default: 0,
    most: 100e3,
    help: "Rheostat in series with R_1; 0 where none is fitted.",
  }),
  r2: resistor({
    label: "bridge",
    symbol: "R_2",
    default: 1e6,
    help: "From the output to the inverting input; sets the ring time.",
  }),
  rin: resistor({ label: "strike", symbol: "R_in", default: 1e6, help: "From the input to the inverting input." }),
  c1: capacitor({ ...arm, label: "first arm", symbol: "C_1", help: "From the inverting input to the middle node." }),
  c2: capacitor({ ...arm, label: "second arm", symbol: "C_2", help: "From the middle node to the output." }),
} as const;

export const targets = {
  centreFrequency: { ...centreTarget, default: 230, least: 30, most: 2e3, help: "The pitch: of the pair of poles." },
  ringTime60: target({
    label: "Ring time to −60 dB",
    symbol: "t_60",
    unit: "s",
    default: 0.15,
    least: 20e-3,
    most: 2,
    window: 0.1,
    result: "ringTime60",
  }),
} as const;

export const conditions = {
  ...potConditions,
  strikeVoltage: condition({
    label: "Strike, height",
    symbol: "V_p",
    unit: "V",
    default: 5,
    least: 0.5,
    most: 12,
    help: "Of the pulse at the input.",
  }),
  strikeWidth: condition({
    label: "Strike, width",
    symbol: "t_p",
    unit: "s",
    default: 1e-3,
    least: 50e-6,
    most: 10e-3,
  }),
  ...surroundings,
  leakageResistance: condition({
    label: "Leakage across the bridge",
    symbol: "R_leak",
    unit: "Ω",
    default: null,
    least: 1e6,
    most: 1e9,
    suggestion: 10e6,
    help: "Of a board that is not quite clean, beside R_2.",
  }),
  offsetVoltage: common.offsetVoltage,
  biasCurrent: condition({
    label: "Op amp bias current",
    symbol: "I_b",
    unit: "A",
    default: 0,
    least: 0,
    most: 1e-6,
    suggestion: 200e-12,
  }),
} as const;

const { lowerEdge: _, upperEdge: __, ...shared } = responseResults;

export const results = {
  ...shared,
  centreFrequency: { ...shared.centreFrequency, help: "Of the pair of poles: the pitch of the ring." },
  qualityFactor: { ...shared.qualityFactor, help: "Of the pair of poles." },
  peakGain: { ...shared.peakGain, help: "At the centre; the very top lies the share 1/(8Q²) higher." },
  bandwidth: { ...shared.bandwidth, help: "Of the pair of poles: centre over quality factor." },
  ringTime60: { label: "Ring time to −60 dB", symbol: "t_60", unit: "s", formula: "ring-time" },
  timeConstant: { label: "Time constant of the ring", symbol: "τ", unit: "s", formula: "ring-time" },
  ringPeak: {
    label: "Peak of the struck ring",
    symbol: "V_pk",
    unit: "V",
    formula: "ring-peak",
    help: "The farthest that the output goes from rest, the pulse itself included.",
  },
  ringEstimate: {
    label: "Ring amplitude, short-pulse estimate",
    symbol: "",
    unit: "V",
    formula: "ring-estimate",
  },
  dcGain: {
    label: "Gain at DC",
    symbol: "|H(0)|",
    unit: "",
    formula: "dc-gain",
    help: "The strike passes to the output by this.",
  },
  noiseGain: { label: "Noise gain at the centre", symbol: "N", unit: "", formula: "noise-gain" },
  outputOffset: { label: "Offset at the output", symbol: "V_o", unit: "V", formula: "offset" },
  ...retuneResults,
  ...outputNoise,
} as const satisfies Record<string, ResultField>;
