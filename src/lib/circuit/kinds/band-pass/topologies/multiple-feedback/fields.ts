import { common } from "../../../../stage/commonConditions.ts";
import { capacitor, pot, resistor, type ResultField } from "../../../../stage/fields.ts";
import {
  centreTarget,
  gainTarget,
  noiseConditions,
  outputNoise,
  potConditions,
  qualityTarget,
  responseResults,
  retuneResults,
} from "../../fields.ts";

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
    padding: ["rb"],
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
  ...potConditions,
  gainBandwidth: common.gainBandwidth,
  openLoopGain: common.openLoopGain,
  outputResistance: common.outputResistance,
  sourceResistance: common.sourceResistance,
  loadResistance: common.loadResistance,
  ...noiseConditions,
  railPositive: common.railPositive,
  railNegative: common.railNegative,
  resistorTolerance: common.resistorTolerance,
  capacitorTolerance: common.capacitorTolerance,
  potTolerance: common.potTolerance,
  dielectric: common.dielectric,
} as const;

export const results = {
  ...responseResults,
  ...retuneResults,
  reachLow: { label: "Reached by every board, from", symbol: "", unit: "Hz", formula: "reach" },
  reachHigh: { label: "Reached by every board, to", symbol: "", unit: "Hz", formula: "reach" },
  noiseGain: { label: "Noise gain at the centre", symbol: "", unit: "", formula: "noise-gain" },
  loopGain: { label: "Loop gain at the centre", symbol: "", unit: "", formula: "noise-gain" },
  ...outputNoise,
} as const satisfies Record<string, ResultField>;
