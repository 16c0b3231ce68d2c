import { common } from "../../../../stage/commonConditions.ts";
import { capacitor, pot, resistor, type ResultField } from "../../../../stage/fields.ts";
import {
  centreTarget,
  outputNoise,
  potConditions,
  qualityTarget,
  responseResults,
  retuneResults,
  surroundings,
} from "../../fields.ts";

export const parts = {
  r1: resistor({ label: "input", symbol: "R_1", default: 22e3, help: "From the input to the middle node." }),
  r2: resistor({
    label: "to ground, fixed",
    symbol: "R_2",
    default: 22e3,
    help: "From the non-inverting input to ground.",
  }),
  r2Pot: pot({
    label: "retune pot",
    symbol: "R_V",
    padding: ["r2"],
    default: 0,
    most: 100e3,
    help: "Rheostat in series with R_2; 0 where none is fitted. It moves the quality factor too.",
  }),
  r3: resistor({
    label: "positive feedback",
    symbol: "R_3",
    default: 22e3,
    help: "From the output to the middle node.",
  }),
  rf: resistor({
    label: "gain, feedback",
    symbol: "R_F",
    default: 24e3,
    help: "From the output to the inverting input; with R_G it sets the quality factor.",
  }),
  rg: resistor({ label: "gain, to ground", symbol: "R_G", default: 10e3, help: "From the inverting input to ground." }),
  c1: capacitor({
    label: "middle node to ground",
    symbol: "C_1",
    default: 10e-9,
    least: 470e-12,
    most: 470e-9,
  }),
  c2: capacitor({
    label: "coupling",
    symbol: "C_2",
    default: 10e-9,
    least: 470e-12,
    most: 470e-9,
    help: "From the middle node to the non-inverting input.",
  }),
} as const;

export const targets = {
  centreFrequency: { ...centreTarget, most: 10e3 },
  qualityFactor: { ...qualityTarget, default: 2, most: 5 },
} as const;

export const conditions = {
  ...potConditions,
  ...surroundings,
  resistorTolerance: common.resistorTolerance,
} as const;

export const results = {
  ...responseResults,
  amplifierGain: { label: "Amplifier gain", symbol: "K", unit: "", formula: "amplifier" },
  oscillationGain: {
    label: "Gain at which it oscillates",
    symbol: "K_osc",
    unit: "",
    formula: "quality",
    help: "4 for equal resistors and capacitors.",
  },
  qualitySensitivity: {
    label: "Sensitivity of Q to the gain",
    symbol: "S",
    unit: "",
    formula: "sensitivity",
    help: "Per cent of Q for each per cent of K.",
  },
  qualityLow: {
    label: "Quality factor, least",
    symbol: "Q_min",
    unit: "",
    formula: "sensitivity",
    help: "R_F low and R_G high by their tolerance.",
  },
  qualityHigh: {
    label: "Quality factor, most",
    symbol: "Q_max",
    unit: "",
    formula: "sensitivity",
    help: "R_F high and R_G low by their tolerance.",
  },
  ...retuneResults,
  retuneQualityLow: { label: "Quality factor, whole pot in", symbol: "Q(1)", unit: "", formula: "quality" },
  retuneQualityHigh: { label: "Quality factor, pot out", symbol: "Q(0)", unit: "", formula: "quality" },
  ...outputNoise,
} as const satisfies Record<string, ResultField>;
