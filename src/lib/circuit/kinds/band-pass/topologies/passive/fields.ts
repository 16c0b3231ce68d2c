import { common } from "../../../../stage/commonConditions.ts";
import { capacitor, condition, resistor, type ResultField } from "../../../../stage/fields.ts";
import { centreTarget, noiseConditions, outputNoise, responseResults } from "../../fields.ts";

const capacitors = { least: 220e-12, most: 1e-6 };

export const parts = {
  c1: capacitor({
    ...capacitors,
    label: "high-pass",
    symbol: "C_1",
    default: 33e-9,
    help: "From the input to the middle node.",
  }),
  r1: resistor({ label: "high-pass", symbol: "R_1", default: 4700, help: "From the middle node to ground." }),
  r2: resistor({ label: "low-pass", symbol: "R_2", default: 47e3, help: "From the middle node to the output." }),
  c2: capacitor({
    ...capacitors,
    label: "low-pass",
    symbol: "C_2",
    default: 3.3e-9,
    help: "From the output to ground.",
  }),
} as const;

export const targets = { centreFrequency: { ...centreTarget, most: 15e3 } } as const;

export const conditions = {
  sourceResistance: common.sourceResistance,
  loadResistance: common.loadResistance,
  ...noiseConditions,
  qualityWanted: condition({
    label: "Quality factor wanted",
    symbol: "Q",
    unit: "",
    default: null,
    least: 0.1,
    most: 15,
    suggestion: 0.45,
    help: "To see whether a network without an amplifier can have it at all.",
  }),
  dielectric: common.dielectric,
} as const;

const unloaded = "Without source resistance and load.";

export const results = {
  ...responseResults,
  unloadedCentre: { label: "Centre, unloaded", symbol: "", unit: "Hz", formula: "centre", help: unloaded },
  unloadedQuality: { label: "Quality factor, unloaded", symbol: "", unit: "", formula: "quality", help: unloaded },
  unloadedGain: { label: "Peak gain, unloaded", symbol: "", unit: "", formula: "gain", help: unloaded },
  ...outputNoise,
} as const satisfies Record<string, ResultField>;
