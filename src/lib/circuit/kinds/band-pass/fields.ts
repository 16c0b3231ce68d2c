import { common } from "../../stage/commonConditions.ts";
import { condition, target, type ResultField } from "../../stage/fields.ts";

/** Wanted figures that every adjustable band-pass shares. */
export const centreTarget = target({
  label: "Centre frequency",
  symbol: "f_0",
  unit: "Hz",
  default: 1000,
  least: 20,
  most: 12e3,
  window: 0.05,
  result: "centreFrequency",
  help: "Where the response peaks.",
});

export const qualityTarget = target({
  label: "Quality factor",
  symbol: "Q",
  unit: "",
  default: 3,
  least: 0.5,
  most: 15,
  window: 0.1,
  result: "qualityFactor",
  help: "Centre over the bandwidth between the −3 dB points.",
});

export const gainTarget = target({
  label: "Peak gain",
  symbol: "|H_0|",
  unit: "",
  default: 2,
  least: 0.3,
  most: 20,
  window: 0.1,
  result: "peakGain",
  help: "As a ratio; the sign is the topology's own.",
});

/** Figures read off the response of any band-pass; see `model.ts`. */
export const responseResults = {
  centreFrequency: { label: "Centre frequency", symbol: "f_0", unit: "Hz", formula: "centre" },
  qualityFactor: { label: "Quality factor", symbol: "Q", unit: "", formula: "quality" },
  peakGain: { label: "Peak gain", symbol: "|H_0|", unit: "", formula: "gain" },
  peakGainDb: { label: "Peak gain", symbol: "|H_0|", unit: "dB", formula: "gain" },
  bandwidth: { label: "Bandwidth", symbol: "B", unit: "Hz", formula: "bandwidth", help: "Between the −3 dB points." },
  lowerEdge: { label: "Lower −3 dB point", symbol: "f_1", unit: "Hz", formula: "bandwidth" },
  upperEdge: { label: "Upper −3 dB point", symbol: "f_2", unit: "Hz", formula: "bandwidth" },
  noiseBandwidth: {
    label: "Noise bandwidth",
    symbol: "B_n",
    unit: "Hz",
    formula: "noise-bandwidth",
    help: "Of the ideal rectangular filter that passes as much white noise.",
  },
  inverting: { label: "Polarity", symbol: "±", unit: "", formula: "gain", words: { yes: "inverts", no: "keeps" } },
} as const satisfies Record<string, ResultField>;

/** What the filter is fed with, to see what it leaves of it. */
export const noiseConditions = {
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
} as const;

/** Surroundings of a band-pass whose op amps have no output resistance to speak of. */
export const surroundings = {
  gainBandwidth: common.gainBandwidth,
  openLoopGain: common.openLoopGain,
  sourceResistance: common.sourceResistance,
  loadResistance: common.loadResistance,
  ...noiseConditions,
  railPositive: common.railPositive,
  railNegative: common.railNegative,
  dielectric: common.dielectric,
} as const;

/** The retune pot as it stands. */
export const potConditions = {
  rotation: {
    ...common.rotation,
    label: "Retune pot, rotation",
    help: "Share of the electrical travel; at 1 the whole pot is in circuit.",
  },
  potLaw: common.potLaw,
} as const;

/** Figures of a retune pot; see `retune.ts`. */
export const retuneResults = {
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
} as const satisfies Record<string, ResultField>;

export const outputNoise = {
  outputRms: { label: "Noise at the output", symbol: "V_o", unit: "V", formula: "noise", help: "RMS." },
} as const satisfies Record<string, ResultField>;
