import { common } from "../../../../stage/commonConditions.ts";
import { capacitor, condition, pot, resistor, type ResultField } from "../../../../stage/fields.ts";
import { centreTarget, gainTarget, qualityTarget, responseResults } from "../../fields.ts";

export const parts = {
  ra: resistor({
    label: "input",
    symbol: "R_A",
    default: 22e3,
    help: "From the input to the middle node; sets the gain.",
  }),
  rb: resistor({
    label: "to ground, fixed",
    symbol: "R_B",
    default: 2200,
    help: "From the middle node to ground; sets the centre.",
  }),
  rbPot: pot({
    label: "retune pot",
    symbol: "R_V",
    default: 0,
    most: 100e3,
    help: "Rheostat in series with R_B; 0 where none is fitted.",
  }),
  rf: resistor({
    label: "feedback",
    symbol: "R_F",
    default: 100e3,
    help: "From the output to the inverting input; sets the bandwidth.",
  }),
  c1: capacitor({
    label: "feedback",
    symbol: "C_1",
    default: 10e-9,
    least: 470e-12,
    most: 470e-9,
    help: "From the middle node to the output.",
  }),
  c2: capacitor({
    label: "coupling",
    symbol: "C_2",
    default: 10e-9,
    least: 470e-12,
    most: 470e-9,
    help: "From the middle node to the inverting input.",
  }),
} as const;

export const targets = { centreFrequency: centreTarget, qualityFactor: qualityTarget, peakGain: gainTarget } as const;

export const conditions = {
  rotation: {
    ...common.rotation,
    label: "Retune pot, rotation",
    help: "Share of the electrical travel; at 1 the whole pot is in circuit.",
  },
  potLaw: common.potLaw,
  gainBandwidth: common.gainBandwidth,
  openLoopGain: common.openLoopGain,
  outputResistance: common.outputResistance,
  sourceResistance: common.sourceResistance,
  loadResistance: common.loadResistance,
  sourceRms: condition({
    label: "Noise at the input",
    symbol: "V_n",
    unit: "V",
    default: null,
    least: 1e-3,
    most: 10,
    suggestion: 1,
    help: "RMS of white noise, to see what the filter leaves of it.",
  }),
  sourceBandwidth: condition({
    label: "Noise band limit",
    symbol: "f_c",
    unit: "Hz",
    default: 20e3,
    least: 1e3,
    most: 1e6,
    help: "Corner of the one pole that limits the noise.",
  }),
  railPositive: common.railPositive,
  railNegative: common.railNegative,
  resistorTolerance: common.resistorTolerance,
  capacitorTolerance: common.capacitorTolerance,
  potTolerance: common.potTolerance,
  dielectric: common.dielectric,
} as const;

export const results = {
  ...responseResults,
  retuneLow: {
    label: "Retune range, lowest",
    symbol: "f_0(1)",
    unit: "Hz",
    formula: "centre",
    help: "The whole pot in circuit.",
  },
  retuneHigh: {
    label: "Retune range, highest",
    symbol: "f_0(0)",
    unit: "Hz",
    formula: "centre",
    help: "The pot turned out of circuit.",
  },
  retuneSpan: { label: "Retune span", symbol: "", unit: "semitones", formula: "centre" },
  retunePerDegree: {
    label: "Retune sensitivity",
    symbol: "",
    unit: "cents/°",
    formula: "centre",
    help: "At the present rotation, over 270° of electrical travel.",
  },
  reachLow: { label: "Reached by every board, from", symbol: "", unit: "Hz", formula: "reach" },
  reachHigh: { label: "Reached by every board, to", symbol: "", unit: "Hz", formula: "reach" },
  noiseGain: { label: "Noise gain at the centre", symbol: "", unit: "", formula: "noise-gain" },
  loopGain: { label: "Loop gain at the centre", symbol: "", unit: "", formula: "noise-gain" },
  outputRms: { label: "Noise at the output", symbol: "V_o", unit: "V", formula: "noise", help: "RMS." },
} as const satisfies Record<string, ResultField>;
