import { common } from "../../stage/commonConditions.ts";
import { choice, condition, target, type ResultField } from "../../stage/fields.ts";
import { perCent, perMillion } from "../../stage/shown.ts";

export const targets = {
  outputCurrent: target({
    label: "Current at the peak",
    symbol: "I_pk",
    unit: "A",
    default: 500e-6,
    least: 10e-6,
    most: 1e-3,
    window: 0.05,
    result: "outputCurrent",
    help: "At the control voltage given under conditions.",
  }),
} as const;

/** The envelope and the rails; every topology takes these. */
export const conditions = {
  controlVoltage: condition({
    label: "Control voltage at the peak",
    symbol: "V_env",
    unit: "V",
    default: 7.8,
    least: 1,
    most: 10,
    accepts: [0.01, 100],
    scale: "linear",
  }),
  controlRest: condition({
    label: "Control voltage at rest",
    symbol: "V_rest",
    unit: "V",
    default: 0,
    least: -1,
    most: 1,
    accepts: [-40, 40],
    scale: "linear",
    help: "What the envelope falls back to.",
  }),
  railPositive: common.railPositive,
  railNegative: common.railNegative,
  swingLoss: condition({
    label: "Op amp swing, short of its rail by",
    symbol: "V_loss",
    unit: "V",
    default: 1.5,
    least: 0,
    most: 3,
    accepts: [0, 5],
    scale: "linear",
  }),
  pinAboveRail: condition({
    label: "Bias pin above the negative rail",
    symbol: "V_pin",
    unit: "V",
    default: 1.3,
    least: 1.2,
    most: 1.4,
    accepts: [0, 5],
    scale: "linear",
  }),
} as const;

/** What an op amp and a transistor add. */
export const driverConditions = {
  ...conditions,
  beta: common.beta,
  offsetVoltage: common.offsetVoltage,
  slewRate: common.slewRate,
  baseResistance: condition({
    label: "Base stopper",
    symbol: "R_b",
    unit: "Ω",
    default: 0,
    least: 0,
    most: 4.7e3,
    suggestion: 2.2e3,
  }),
  mirrorDegeneration: condition({
    label: "Mirror's emitter resistor",
    symbol: "R_deg",
    unit: "Ω",
    default: 0,
    least: 0,
    most: 4.7e3,
    suggestion: 1e3,
    help: "The current's drop across it is lost to the transistor.",
  }),
  protection: choice({
    label: "Diode from emitter to base",
    symbol: "",
    default: "fitted",
    options: [
      { value: "fitted", label: "fitted" },
      { value: "none", label: "none" },
    ],
  }),
} as const;

export const results = {
  outputCurrent: { label: "Current at the peak", symbol: "I_pk", unit: "A", formula: "current" },
  halfCurrent: { label: "Current at half the control voltage", symbol: "I_half", unit: "A", formula: "current" },
  leastCurrent: {
    label: "Current at a tenth of the control voltage",
    symbol: "I_tenth",
    unit: "A",
    formula: "current",
  },
  floorCurrent: {
    label: "Current at rest, at most",
    symbol: "I_floor",
    unit: "A",
    formula: "floor",
  },
  floorDb: { label: "Rest under peak", symbol: "D", unit: "dB", formula: "floor" },
  faultCurrent: {
    label: "Current with the op amp stuck high, at most",
    symbol: "I_fault",
    unit: "A",
    formula: "fault",
  },
  headroom: { label: "Voltage to spare at the peak", symbol: "V_CE", unit: "V", formula: "headroom" },
} as const satisfies Record<string, ResultField>;

export const driverResults = {
  ...results,
  baseCurrentError: { label: "Lost to the base", symbol: "ε_β", unit: "", shown: perCent, formula: "current" },
  reach: {
    label: "Control voltage followed up to",
    symbol: "V_reach",
    unit: "V",
    formula: "headroom",
    help: "Beyond it the op amp or the transistor saturates and the current stays put.",
  },
  limitResistance: {
    label: "Resistor in the mirror's output that passes 1 mA at most",
    symbol: "R_lim",
    unit: "Ω",
    formula: "limit-resistor",
  },
  recoveryTime: {
    label: "Recovery from a negative envelope",
    symbol: "t_rec",
    unit: "s",
    formula: "recovery",
    help: "From the negative swing to the base's conduction.",
  },
  reverseVoltage: {
    label: "Reverse voltage of the base, at rest",
    symbol: "V_EB",
    unit: "V",
    formula: "recovery",
  },
} as const satisfies Record<string, ResultField>;

export const resistorResults = {
  ...results,
  pinVoltage: { label: "Bias pin", symbol: "V_p", unit: "V", formula: "current" },
  temperatureCoefficient: { label: "Drift", symbol: "α", unit: "1/K", shown: perMillion, formula: "drift" },
  pinSpreadError: {
    label: "Spread from pin to pin",
    symbol: "ε_p",
    unit: "",
    shown: perCent,
    formula: "drift",
    help: "The pin's own voltage varies by 0.1 V either way.",
  },
} as const satisfies Record<string, ResultField>;
