/**
 * The units that Clatterbench shows. `prefixed` units take SI prefixes (kHz, nF); the others are printed as they are.
 * `spoken` is what a screen reader should say. Every stored and exchanged figure is in the plain unit named here.
 */
export const units = {
  Hz: { prefixed: true, spoken: "hertz" },
  Ω: { prefixed: true, spoken: "ohms" },
  F: { prefixed: true, spoken: "farads" },
  V: { prefixed: true, spoken: "volts" },
  A: { prefixed: true, spoken: "amperes" },
  S: { prefixed: true, spoken: "siemens" },
  W: { prefixed: true, spoken: "watts" },
  s: { prefixed: true, spoken: "seconds" },
  m: { prefixed: true, spoken: "metres" },
  K: { prefixed: false, spoken: "kelvins" },
  "V/s": { prefixed: true, spoken: "volts per second" },
  "V/√Hz": { prefixed: true, spoken: "volts per root hertz" },
  "A/√Hz": { prefixed: true, spoken: "amperes per root hertz" },
  "V/K": { prefixed: true, spoken: "volts per kelvin" },
  "1/K": { prefixed: false, spoken: "per kelvin" },
  "ppm/K": { prefixed: false, spoken: "parts per million per kelvin" },
  dB: { prefixed: false, spoken: "decibels" },
  "°": { prefixed: false, spoken: "degrees" },
  semitones: { prefixed: false, spoken: "semitones" },
  "cents/°": { prefixed: false, spoken: "cents per degree" },
  /** How a relative figure is shown; stored ones are plain ratios. */
  "%": { prefixed: false, spoken: "per cent" },
  /** A plain ratio, such as a gain or a quality factor. */
  "": { prefixed: false, spoken: "" },
} as const satisfies Record<string, { prefixed: boolean; spoken: string }>;

export type Unit = keyof typeof units;
