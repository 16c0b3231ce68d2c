import type { ReferenceCase } from "../../stage/kind.ts";

const handbook = {
  title: "Texas Instruments, Op Amps for Everyone (R. Mancini ed., SLOD006B, August 2002)",
  howKnown: "read",
} as const;

const nodal = {
  title: "Nodal analysis of the network, computed apart from this library",
  place: "tests/reference/worked.json",
  howKnown: "computed",
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
  {
    id: "sallen-key-q10",
    topology: "sallen-key",
    given: { targets: { centreFrequency: 1000, qualityFactor: 10 }, parts: { c1: 10e-9, c2: 10e-9, rg: 10e3 } },
    expect: { r1: 22.5e3, r2: 22.5e3, r3: 22.5e3, rf: 28.58e3 },
    tolerance: 1e-3,
    source: {
      title: "S. Franco, Design with Operational Amplifiers and Analog Integrated Circuits",
      place: "example 3.13(a): KRC band-pass, f0 = 1 kHz, bandwidth 100 Hz",
      howKnown: "read",
    },
    note: "Read in a companion of the book's worked examples. The source truncates R_F, 28.586 kΩ exactly, and calls the gain resistors R_B (feedback) and R_A.",
  },
  {
    id: "sallen-key-q10-gain",
    topology: "sallen-key",
    given: { parts: { r1: 22.5e3, r2: 22.5e3, r3: 22.5e3, rf: 28.5858e3, rg: 10e3, c1: 10e-9, c2: 10e-9 } },
    expect: { amplifierGain: 3.858, peakGain: 27.28 },
    tolerance: 1e-3,
    source: {
      title: "S. Franco, Design with Operational Amplifiers and Analog Integrated Circuits",
      place: "example 3.13(a), gain at resonance",
      howKnown: "read",
    },
    note: "Given R_F to the digits that the method yields: at this Q the printed 28.58 kΩ alone moves the gain by 0.5 %.",
  },
  {
    id: "sallen-key-nodal",
    topology: "sallen-key",
    given: { parts: { r1: 22e3, r2: 22e3, r3: 22e3, rf: 24e3, rg: 10e3, c1: 10e-9, c2: 10e-9 } },
    expect: { centreFrequency: 1023.0867, qualityFactor: 2.3570226, peakGain: 5.6666667 },
    tolerance: 5e-8,
    source: nodal,
  },
  {
    id: "two-integrator-nodal",
    topology: "two-integrator",
    given: { parts: { r1: 16e3, r2: 16e3, rq1: 82e3, rq2: 10e3, ri: 10e3, ra: 10e3, rb: 10e3, c1: 10e-9, c2: 10e-9 } },
    expect: { centreFrequency: 994.71839, qualityFactor: 3.0666667, peakGain: 3.0666667 },
    tolerance: 5e-8,
    source: nodal,
  },
  {
    id: "two-integrator-design",
    topology: "two-integrator",
    given: {
      targets: { centreFrequency: 994.71839, qualityFactor: 3.0666667 },
      parts: { c1: 10e-9, c2: 10e-9, rq2: 10e3 },
    },
    expect: { r1: 16e3, r2: 16e3, rq1: 82e3 },
    tolerance: 5e-8,
    source: nodal,
  },
  {
    id: "bridged-t-nodal",
    topology: "bridged-t",
    given: { parts: { r1: 1e3, r2: 1e6, rin: 1e6, c1: 22e-9, c2: 22e-9 } },
    expect: { centreFrequency: 228.76915, qualityFactor: 15.811388, peakGain: 15.84298, ringTime60: 0.15197062 },
    tolerance: 5e-8,
    source: nodal,
  },
  {
    id: "bridged-t-design",
    topology: "bridged-t",
    given: { targets: { centreFrequency: 228.76915, ringTime60: 0.15197062 }, parts: { c1: 22e-9, c2: 22e-9 } },
    expect: { r1: 1e3, r2: 1e6 },
    tolerance: 1e-7,
    source: nodal,
  },
  {
    id: "passive-nodal",
    topology: "passive",
    given: { parts: { r1: 4700, c1: 33e-9, r2: 47e3, c2: 3.3e-9 } },
    expect: { centreFrequency: 1026.1441, qualityFactor: 0.47619048, peakGain: 0.47619048 },
    tolerance: 5e-8,
    source: nodal,
  },
  {
    id: "passive-loaded",
    topology: "passive",
    given: { parts: { r1: 4700, c1: 33e-9, r2: 47e3, c2: 3.3e-9 }, conditions: { loadResistance: 100e3 } },
    expect: { centreFrequency: 1263.8663, qualityFactor: 0.47924729, peakGain: 0.38910506 },
    tolerance: 5e-8,
    source: nodal,
  },
];
