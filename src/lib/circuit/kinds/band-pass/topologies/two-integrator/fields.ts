import { capacitor, condition, pot, resistor, type ResultField } from "../../../../stage/fields.ts";
import {
  centreTarget,
  outputNoise,
  potConditions,
  qualityTarget,
  responseResults,
  retuneResults,
  surroundings,
} from "../../fields.ts";

const gang = { default: 0, most: 500e3 };
const timing = { default: 10e-9, least: 470e-12, most: 100e-9 };

export const parts = {
  r1: resistor({
    label: "first integrator",
    symbol: "R_1",
    default: 16e3,
    help: "From the high-pass output to the first integrator.",
  }),
  r2: resistor({
    label: "second integrator",
    symbol: "R_2",
    default: 16e3,
    help: "From the band-pass output to the second integrator.",
  }),
  r1Pot: pot({
    ...gang,
    label: "retune, first gang",
    symbol: "R_V1",
    padding: ["r1"],
    help: "In series with R_1; 0 where none is fitted.",
  }),
  r2Pot: pot({
    ...gang,
    label: "retune, second gang",
    symbol: "R_V2",
    padding: ["r2"],
    help: "The other gang of the same pot, in series with R_2.",
  }),
  rq1: resistor({
    label: "damping, upper",
    symbol: "R_Q1",
    default: 82e3,
    help: "From the band-pass output to the summer's non-inverting input; with R_Q2 it sets the quality factor.",
  }),
  rq2: resistor({ label: "damping, lower", symbol: "R_Q2", default: 10e3, help: "From there to ground." }),
  ri: resistor({ label: "input", symbol: "R_i", default: 10e3, help: "From the input to the summer." }),
  ra: resistor({ label: "loop", symbol: "R_a", default: 10e3, help: "From the low-pass output to the summer." }),
  rb: resistor({ label: "summer's feedback", symbol: "R_b", default: 10e3, help: "Across the summer." }),
  c1: capacitor({ ...timing, label: "first integrator", symbol: "C_1" }),
  c2: capacitor({ ...timing, label: "second integrator", symbol: "C_2" }),
} as const;

export const targets = {
  centreFrequency: { ...centreTarget, most: 15e3 },
  qualityFactor: { ...qualityTarget, most: 30 },
} as const;

export const conditions = {
  ...potConditions,
  gangMismatch: condition({
    label: "Gang mismatch",
    symbol: "m",
    unit: "dB",
    default: 0,
    least: 0,
    most: 6,
    accepts: [-40, 40],
    scale: "linear",
    help: "By how much the second gang's resistance exceeds the first one's law; worst near the low end of a log pot.",
  }),
  ...surroundings,
} as const;

export const results = {
  ...responseResults,
  idealQuality: {
    label: "Quality factor, ideal op amps",
    symbol: "Q_0",
    unit: "",
    formula: "quality",
  },
  qualityLimit: {
    label: "Ideal Q at which it oscillates",
    symbol: "Q_osc",
    unit: "",
    formula: "enhancement",
    help: "First order in f0/ft: where 1/Q would reach zero.",
  },
  stabilityMargin: {
    label: "Stability margin",
    symbol: "",
    unit: "",
    formula: "enhancement",
    help: "Share of the damping that the op amps leave: 1 for ideal ones, 0 where it oscillates.",
  },
  noiseGain: {
    label: "Noise gain of the summer",
    symbol: "N",
    unit: "",
    formula: "enhancement",
    help: "3 for equal resistors.",
  },
  highPassPeak: { label: "Peak gain, high-pass output", symbol: "|H_hp|", unit: "", formula: "outputs" },
  lowPassPeak: { label: "Peak gain, low-pass output", symbol: "|H_lp|", unit: "", formula: "outputs" },
  ...retuneResults,
  ...outputNoise,
  highPassRms: {
    label: "Noise at the high-pass output",
    symbol: "V_hp",
    unit: "V",
    formula: "inner-noise",
    help: "RMS.",
  },
  lowPassRms: {
    label: "Noise at the low-pass output",
    symbol: "V_lp",
    unit: "V",
    formula: "inner-noise",
    help: "RMS.",
  },
} as const satisfies Record<string, ResultField>;
