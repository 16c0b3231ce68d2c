import { common } from "../../../../stage/commonConditions.ts";
import { condition, resistor, target, type ResultField } from "../../../../stage/fields.ts";
import { inputConditions, inputResults, thresholdTarget } from "../../fields.ts";

export const parts = {
  rin: resistor({
    label: "input",
    symbol: "R_in",
    default: 100e3,
    least: 22e3,
    most: 1e6,
    help: "From the jack to the comparator's plus input.",
  }),
  rh: resistor({
    label: "hysteresis",
    symbol: "R_h",
    default: 1e6,
    least: 100e3,
    most: 10e6,
    help: "From the output back to the plus input.",
  }),
  rr1: resistor({ label: "reference, upper", symbol: "R_r1", default: 100e3, least: 1e3, most: 1e6 }),
  rr2: resistor({ label: "reference, lower", symbol: "R_r2", default: 20e3, least: 1e3, most: 1e6 }),
} as const;

export const targets = {
  threshold: { ...thresholdTarget, default: 3.25 },
  hysteresis: target({
    label: "Hysteresis",
    symbol: "V_h",
    unit: "V",
    default: 2,
    least: 0.1,
    most: 3,
    window: 0.2,
    result: "hysteresis",
    help: "Between the threshold for a rising and that for a falling edge.",
  }),
} as const;

export const conditions = {
  ...inputConditions,
  outputHigh: common.outputHigh,
  outputLow: common.outputLow,
  gateLength: condition({
    label: "Gate length",
    symbol: "t_g",
    unit: "s",
    default: 10e-3,
    least: 0.2e-3,
    most: 1,
    help: "How long the pulse at the jack stays up, its edges not counted.",
  }),
  differentiator: condition({
    label: "Differentiator in front, time constant",
    symbol: "τ_d",
    unit: "s",
    default: null,
    least: 50e-6,
    most: 10e-3,
    suggestion: 1e-3,
    help: "Buffered or of much lower resistance than R_in; left out, the gate itself is compared.",
  }),
} as const;

export const results = {
  ...inputResults,
  fallingThreshold: {
    label: "Threshold, falling",
    symbol: "V_T−",
    unit: "V",
    formula: "threshold",
    help: "Below it the output falls again.",
  },
  hysteresis: { label: "Hysteresis", symbol: "V_h", unit: "V", formula: "threshold" },
  reference: { label: "Reference", symbol: "V_ref", unit: "V", formula: "threshold" },
  lowestPin: {
    label: "Lowest voltage at the plus input",
    symbol: "V_p,low",
    unit: "V",
    formula: "input-resistance",
    help: "With the output low and the jack at its lowest.",
  },
} as const satisfies Record<string, ResultField>;
