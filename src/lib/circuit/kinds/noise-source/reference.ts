import type { ReferenceCase } from "../../stage/kind.ts";

const computed = {
  title: "Worked values, computed apart from this library",
  place: "tests/reference/worked.json",
  howKnown: "computed",
} as const;
/** Coupling that reaches far below what is heard, so that one pole alone limits the band. */
const coupled = { cn: 1 };

/** Figures that others print, and values computed elsewhere; each is checked by the conformance suite. */
export const reference: readonly ReferenceCase[] = [
  {
    id: "one-volt-in-20-khz",
    topology: "measured",
    given: { parts: coupled, conditions: { sourceRms: 20e-3, bandLimit: 20e3 } },
    expect: { gain: 50, rms: 1 },
    tolerance: 1e-7,
    source: computed,
    note: "R_F1/R_1 = 10 and R_F2/R_2 = 5; the coupling corner is put out of the way.",
  },
  {
    id: "density-of-one-volt",
    topology: "measured",
    given: { parts: coupled, conditions: { sourceRms: 20e-3, bandLimit: 20e3 } },
    expect: { density: 5.6418958e-3, gainDb: 33.9794, gainBandwidthSingle: 1e6 },
    tolerance: 1e-7,
    source: computed,
  },
  {
    id: "flat-noise-band-pass",
    topology: "measured",
    given: {
      parts: coupled,
      conditions: { centreFrequency: 954.93, qualityFactor: 3, peakGain: 2.2727273, window: 0.1 },
    },
    expect: { bandNoiseBandwidth: 500, bandRmsRule: 0.2867196, hitSpreadRule: 0.05 },
    tolerance: 1e-5,
    source: computed,
    note: "A noise bandwidth of 500 Hz; centre and quality factor are chosen for it.",
  },
  {
    id: "noise-bandwidth-of-one-pole",
    topology: "measured",
    given: { parts: coupled, conditions: { bandLimit: 1e3 } },
    expect: { noiseBandwidth: 1570 },
    tolerance: 6e-3,
    source: {
      title: "T. J. Sobering, Technote 1, Equivalent Noise Bandwidth (1991, revised 2008)",
      place: "table 1, one pole: 1.57 f3dB",
      howKnown: "read",
    },
    note: "Exactly π/2.",
  },
  {
    id: "thermal-noise-of-1k",
    topology: "measured",
    given: { parts: { r1: 1e3 }, conditions: { temperature: 300 } },
    expect: { thermalDensity: 4.07e-9 },
    tolerance: 2e-3,
    source: {
      title: "Open encyclopedia, Johnson–Nyquist noise",
      place: "1 kΩ at 300 K: 4.07 nV/√Hz",
      howKnown: "read",
    },
  },
  {
    id: "thermal-noise-of-10k",
    topology: "measured",
    given: { parts: { r1: 10e3 } },
    expect: { thermalDensity: 12.831843e-9 },
    tolerance: 1e-7,
    source: computed,
  },
];
