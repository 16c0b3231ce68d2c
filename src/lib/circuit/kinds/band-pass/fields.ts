import { target } from "../../stage/fields.ts";
import type { ResultField } from "../../stage/fields.ts";

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
