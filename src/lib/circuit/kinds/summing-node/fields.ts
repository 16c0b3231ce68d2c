import { common } from "../../stage/commonConditions.ts";
import {
  capacitor,
  choice,
  condition,
  resistor,
  target,
  type PartField,
  type ResultField,
} from "../../stage/fields.ts";

export const paths = [1, 2, 3, 4, 5, 6, 7, 8] as const;
export type Path = (typeof paths)[number];

/** One entry for each path, its name made of a stem and the path's number. */
function each<S extends string, V>(stem: S, make: (path: Path) => V): Readonly<Record<`${S}${Path}`, V>> {
  return Object.fromEntries(paths.map((path) => [`${stem}${path}`, make(path)])) as Record<`${S}${Path}`, V>;
}

const usual: Record<number, number> = { 1: 22e3, 2: 220e3 };

export const parts = {
  ...each("r", (path): PartField => {
    const fitted = usual[path];
    return resistor({
      label: `path ${path}`,
      symbol: `R_${path}`,
      ...(fitted === undefined
        ? { default: 0, least: 0, suggestion: 100e3, help: "0 where the path is not fitted." }
        : { default: fitted }),
    });
  }),
  rf: resistor({
    label: "feedback",
    symbol: "R_F",
    default: 22e3,
    least: 1e3,
    most: 470e3,
    help: "Sets every path's gain.",
  }),
  cf: capacitor({
    label: "feedback",
    symbol: "C_F",
    default: 0,
    least: 0,
    most: 1e-6,
    suggestion: 47e-12,
    help: "Beside R_F, to limit the band; 0 where none is fitted.",
  }),
};

const gain = (path: 1 | 2, wanted: number) =>
  target({
    label: `Gain of path ${path}`,
    symbol: `A_${path}`,
    unit: "",
    default: wanted,
    least: 0.02,
    most: 20,
    window: 0.05,
    result: `gain${path}`,
    help: "As a ratio; the stage inverts.",
  });

export const targets = { gain1: gain(1, 1), gain2: gain(2, 0.1) } as const;

export const conditions = {
  ...each("level", (path) =>
    condition({
      label: `Level of path ${path}`,
      ofPart: `r${path}`,
      symbol: `V_${path}`,
      unit: "V",
      default: null,
      least: 1e-3,
      most: 10,
      suggestion: 1,
      help: "RMS at the path's resistor.",
    }),
  ),
  ...each("parity", (path) =>
    choice({
      label: `Inversions in path ${path}`,
      ofPart: `r${path}`,
      symbol: "",
      default: "even",
      options: [
        { value: "even", label: "even number" },
        { value: "odd", label: "odd number" },
      ],
      help: "Counted from where the paths split.",
    }),
  ),
  ...each("source", (path) =>
    condition({
      label: `Source resistance of path ${path}`,
      ofPart: `r${path}`,
      symbol: `R_s${path}`,
      unit: "Ω",
      default: 0,
      least: 0,
      most: 100e3,
      suggestion: 10e3,
      help: "A collector resistor counts: it stays while its transistor is off.",
    }),
  ),
  correlation: condition({
    label: "Correlation of the paths",
    symbol: "ρ",
    unit: "",
    default: 1,
    least: 0,
    most: 1,
    accepts: [0, 1],
    scale: "linear",
    help: "Of any two, without sign: 1 where they carry the same noise, 0 where they are independent.",
  }),
  gainBandwidth: common.gainBandwidth,
  openLoopGain: common.openLoopGain,
  offsetVoltage: common.offsetVoltage,
  loadResistance: {
    ...common.loadResistance,
    help: "What a sum without the op amp would drive, for comparison; an op amp does not notice it.",
  },
  signalFrequency: condition({
    label: "Centre of the signal",
    symbol: "f_0",
    unit: "Hz",
    default: 1e3,
    least: 20,
    most: 15e3,
    help: "Against which the op amp must be fast.",
  }),
};

const level = { unit: "V", formula: "level", help: "RMS." } as const;

export const results = {
  gains: {
    label: "Gains",
    symbol: "A_k",
    unit: "",
    formula: "gain",
    list: true,
    help: "Of each fitted path, at low frequency.",
  },
  gain1: { label: "Gain of path 1", symbol: "A_1", unit: "", formula: "gain" },
  gain2: { label: "Gain of path 2", symbol: "A_2", unit: "", formula: "gain" },
  inverting: { label: "Polarity", symbol: "±", unit: "", formula: "gain", words: { yes: "inverts", no: "keeps" } },
  noiseGain: { label: "Noise gain", symbol: "N", unit: "", formula: "noise-gain" },
  bandwidth: {
    label: "Bandwidth",
    symbol: "f_3",
    unit: "Hz",
    formula: "bandwidth",
    help: "To −3 dB; without limit where the op amp is ideal and no C_F is fitted.",
  },
  outputOffset: { label: "Offset at the output", symbol: "V_o", unit: "V", formula: "offset" },
  outputRms: { ...level, label: "Level at the output", symbol: "V", help: "RMS, for the parity and correlation set." },
  outputRmsInPhase: { ...level, label: "Level, all adding", symbol: "V_+" },
  outputRmsIndependent: { ...level, label: "Level, independent", symbol: "V_0" },
  outputRmsOpposed: {
    ...level,
    label: "Level, opposed",
    symbol: "V_-",
    help: "The loudest path against all others, fully correlated.",
  },
  parityCost: {
    label: "What wrong parity costs",
    symbol: "",
    unit: "dB",
    formula: "parity-cost",
    help: "All paths adding over the loudest one against the others, at the correlation set.",
  },
  passiveGains: {
    label: "Gains without the op amp",
    symbol: "",
    unit: "",
    formula: "passive",
    list: true,
    help: "The same resistors joined at a buffer or load.",
  },
} as const satisfies Record<string, ResultField>;
