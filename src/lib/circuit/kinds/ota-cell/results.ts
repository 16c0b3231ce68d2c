import type { ResultField } from "../../stage/fields.ts";
import { perCent, perMillion } from "../../stage/shown.ts";

export const results = {
  transconductance: { label: "Transconductance", symbol: "g_m", unit: "S", formula: "transconductance" },
  effectiveTransconductance: {
    label: "Transconductance from behind the divider",
    symbol: "g_m'",
    unit: "S",
    formula: "diodes",
    help: "Lower than g_m where the diodes are used.",
  },
  attenuation: { label: "Divider", symbol: "k", unit: "", formula: "attenuation" },
  attenuationDb: { label: "Divider", symbol: "k", unit: "dB", formula: "attenuation" },
  gain: { label: "Gain", symbol: "|A|", unit: "", formula: "gain" },
  gainDb: { label: "Gain", symbol: "|A|", unit: "dB", formula: "gain" },
  ceiling: { label: "Ceiling", symbol: "V_c", unit: "V", formula: "ceiling", help: "The output can get no further." },
  inverting: { label: "Polarity", symbol: "±", unit: "", formula: "gain", words: { yes: "inverts", no: "keeps" } },
  bandwidth: { label: "Bandwidth", symbol: "f_3", unit: "Hz", formula: "bandwidth" },
  inputRms: { label: "Behind the divider, RMS", symbol: "V_d", unit: "V", formula: "attenuation" },
  inputPeak: {
    label: "Behind the divider, peak",
    symbol: "V_d,pk",
    unit: "V",
    formula: "attenuation",
    help: "Four times RMS for noise.",
  },
  outputPeak: { label: "Output at that peak", symbol: "V_o,pk", unit: "V", formula: "ceiling" },
  distortion: {
    label: "Distortion",
    symbol: "d",
    unit: "",
    shown: perCent,
    formula: "distortion",
    help: "Total harmonic distortion of a sine; of noise, what is not the signal scaled, over the signal.",
  },
  distortionDb: { label: "Distortion", symbol: "d", unit: "dB", formula: "distortion" },
  compressionDb: { label: "Compression", symbol: "Δ", unit: "dB", formula: "distortion" },
  linearity: {
    label: "Linearity gained by the diodes",
    symbol: "D",
    unit: "",
    formula: "diodes",
    help: "How many times 2·V_T the diode current drops.",
  },
  temperatureCoefficient: { label: "Drift of the gain", symbol: "α", unit: "1/K", shown: perMillion, formula: "drift" },
  warmingDb: { label: "Gain from 10 °C to 40 °C", symbol: "Δ_T", unit: "dB", formula: "drift" },
  offsetSum: { label: "Offset, worst sum", symbol: "V_Σ", unit: "V", formula: "thump" },
  thump: { label: "Thump", symbol: "V_th", unit: "V", formula: "thump", help: "What the envelope alone puts out." },
  thumpDb: { label: "Thump under the peak signal", symbol: "V_th", unit: "dB", formula: "thump" },
  trimRange: { label: "Trim reaches, either way", symbol: "V_t", unit: "V", formula: "trim" },
  trimPerDegree: { label: "Trim, volts per degree", symbol: "V_t'", unit: "V", formula: "trim" },
  noiseDensity: { label: "Noise floor", symbol: "e_o", unit: "V/√Hz", formula: "noise" },
  noiseRms: { label: "Noise floor, one pole at 20 kHz", symbol: "E_o", unit: "V", formula: "noise" },
} as const satisfies Record<string, ResultField>;

export const resistorLoadResults = {
  ...results,
  outputSlew: { label: "Slew rate of the output", symbol: "SR", unit: "V/s", formula: "slew" },
  largestLoad: { label: "Largest load for the swing", symbol: "R_L,max", unit: "Ω", formula: "largest-load" },
} as const satisfies Record<string, ResultField>;
