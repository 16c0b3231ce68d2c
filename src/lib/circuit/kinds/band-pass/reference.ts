import type { ReferenceCase } from "../../stage/kind.ts";

const handbook = {
  title: "Texas Instruments, Op Amps for Everyone (R. Mancini ed., SLOD006B, August 2002)",
  howKnown: "read",
} as const;

/** Worked examples that others print, and values computed elsewhere; each is checked by the conformance suite. */
export const reference: readonly ReferenceCase[] = [
  {
    id: "decade-q10-gain2",
    topology: "multiple-feedback",
    given: { targets: { centreFrequency: 1000, qualityFactor: 10, peakGain: 2 }, parts: { c1: 100e-9, c2: 100e-9 } },
    expect: { rf: 31.8e3, ra: 7.96e3, rb: 80.4 },
    tolerance: 1e-3,
    source: { ...handbook, place: "section 16.5.1.2, example 16-5, second-order band-pass" },
    note: "Printed to three figures; the source calls them R2 (feedback), R1 (input), R3 (to ground).",
  },
  {
    id: "staggered-lower",
    topology: "multiple-feedback",
    given: {
      targets: { centreFrequency: 9653, qualityFactor: 14.15, peakGain: 1.415 },
      parts: { c1: 10e-9, c2: 10e-9 },
    },
    expect: { rf: 46.7e3, ra: 16.5e3 },
    tolerance: 1e-3,
    source: { ...handbook, place: "section 16.5.2, example 16-6, filter 1 of a staggered fourth-order band-pass" },
    note: "Printed to three figures, each from the rounded one before it. Its resistor to ground, 0.7 % low, is left out: the source forgets there that the gain is negative.",
  },
  {
    id: "staggered-upper",
    topology: "multiple-feedback",
    given: {
      targets: { centreFrequency: 10360, qualityFactor: 14.15, peakGain: 1.415 },
      parts: { c1: 10e-9, c2: 10e-9 },
    },
    expect: { rf: 43.5e3, ra: 15.4e3 },
    tolerance: 2.5e-3,
    source: { ...handbook, place: "section 16.5.2, example 16-6, filter 2 of a staggered fourth-order band-pass" },
    note: "Printed to three figures, each from the rounded one before it. Its resistor to ground, 0.7 % low, is left out: the source forgets there that the gain is negative.",
  },
  {
    id: "q10-gain-20-db",
    topology: "multiple-feedback",
    given: { targets: { centreFrequency: 1000, qualityFactor: 10, peakGain: 10 }, parts: { c1: 10e-9, c2: 10e-9 } },
    expect: { rf: 318.3e3, ra: 15.92e3, rb: 837.7 },
    tolerance: 3e-4,
    source: {
      title: "S. Franco, Design with Operational Amplifiers and Analog Integrated Circuits",
      place: "example 3.15: f0 = 1 kHz, Q = 10, resonance gain 20 dB, C = 10 nF",
      howKnown: "read",
    },
    note: "Task, method and capacitor read in a companion of the book's worked examples; the printed figures are from memory. The source calls them R2 (feedback), R1A (input), R1B (to ground).",
  },
  {
    id: "q3-gain10",
    topology: "multiple-feedback",
    given: { targets: { centreFrequency: 1000, qualityFactor: 3, peakGain: 10 }, parts: { c1: 10e-9, c2: 10e-9 } },
    expect: { rf: 95.5e3, ra: 4.77e3, rb: 5.97e3 },
    tolerance: 1e-3,
    source: {
      title: "R. A. Gayakwad, Op-Amps and Linear Integrated Circuits",
      place: "example 7-8(a), narrow band-pass filter",
      howKnown: "read",
    },
    note: "Task and figures read in a companion of the book's worked examples. The source calls them R3 (feedback), R1 (input), R2 (to ground). Its example 7-8(b) retunes to 1.5 kHz by R2·(fc/fc')² = 2.65 kΩ, which holds only for R2 far below R1: exactly it takes 1.57 kΩ.",
  },
];
