import { common } from "../../../../stage/commonConditions.ts";
import { capacitor, choice, condition, resistor, target, type ResultField } from "../../../../stage/fields.ts";
import { inputConditions, inputResults, thresholdTarget } from "../../fields.ts";

export const parts = {
  ra: resistor({
    label: "to the base",
    symbol: "R_A",
    default: 100e3,
    least: 22e3,
    most: 470e3,
    help: "From the differentiator to the base; sets the input resistance.",
  }),
  rb: resistor({
    label: "base to ground",
    symbol: "R_B",
    default: 47e3,
    least: 10e3,
    most: 1e6,
    help: "Sets the threshold.",
  }),
  rc: resistor({
    label: "collector",
    symbol: "R_C",
    default: 10e3,
    least: 1e3,
    most: 100e3,
    help: "To the positive rail.",
  }),
  cd: capacitor({
    label: "differentiator",
    symbol: "C_D",
    default: 22e-9,
    least: 1e-9,
    most: 100e-9,
    help: "Makes the width independent of the gate's length.",
  }),
  rd: resistor({
    label: "differentiator, to ground",
    symbol: "R_D",
    default: 47e3,
    least: 4.7e3,
    most: 1e6,
  }),
  rs: resistor({
    label: "at the jack",
    symbol: "R_S",
    default: 1e3,
    least: 100,
    most: 10e3,
    help: "In series with the jack, against electrostatic discharge.",
  }),
} as const;

export const targets = {
  threshold: thresholdTarget,
  pulseWidth: target({
    label: "Pulse width",
    symbol: "t_w",
    unit: "s",
    default: 1.25e-3,
    least: 0.2e-3,
    most: 10e-3,
    window: 0.1,
    result: "pulseWidth",
  }),
} as const;

export const conditions = {
  ...inputConditions,
  baseEmitterVoltage: condition({
    label: "Base-emitter voltage at the edge of conduction",
    symbol: "V_BE",
    unit: "V",
    default: 0.6,
    least: 0.5,
    most: 0.75,
    scale: "linear",
    accepts: [0.1, 1.5],
    help: "At 25 °C; it falls by 2 mV per kelvin.",
  }),
  baseEmitterSaturated: condition({
    label: "Base-emitter voltage when saturated",
    symbol: "V_BE,sat",
    unit: "V",
    default: 0.65,
    least: 0.5,
    most: 0.8,
    scale: "linear",
    accepts: [0.1, 1.5],
  }),
  beta: common.beta,
  saturationCurrent: {
    ...common.transistorSaturationCurrent,
    help: "For the thresholds at which the collector current has a given value.",
  },
  clamp: choice({
    label: "Clamp diode at the base",
    symbol: "",
    default: "fitted",
    options: [
      { value: "fitted", label: "fitted" },
      { value: "none", label: "none" },
    ],
  }),
} as const;

export const results = {
  ...inputResults,
  thresholdHalf: {
    label: "Threshold, half collector current",
    symbol: "V_th,1/2",
    unit: "V",
    formula: "threshold",
    help: "Where the collector has fallen half-way.",
  },
  thresholdSaturated: { label: "Threshold, saturated", symbol: "V_th,sat", unit: "V", formula: "threshold" },
  thresholdDrift: { label: "Drift of the threshold", symbol: "", unit: "V/K", formula: "threshold" },
  edgeResistance: {
    label: "Load during the edge",
    symbol: "R_edge",
    unit: "Ω",
    formula: "input-resistance",
    help: "What the source sees while the differentiator passes the step.",
  },
  pulseWidthUnloaded: {
    label: "Pulse width, textbook",
    symbol: "t_w,0",
    unit: "s",
    formula: "pulse-width",
    help: "Of the differentiator alone: too long.",
  },
  pulseWidthHalf: {
    label: "Pulse width, half collector current",
    symbol: "t_w,1/2",
    unit: "s",
    formula: "pulse-through-junction",
    help: "With the junction's exponential law.",
  },
  edgePeak: {
    label: "Peak after the differentiator",
    symbol: "V_peak",
    unit: "V",
    formula: "slow-edge",
    help: "Of the given edge, before the transistor conducts.",
  },
} as const satisfies Record<string, ResultField>;
