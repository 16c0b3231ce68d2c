import type { ReferenceCase } from "../../stage/kind.ts";

/** Worked examples that others print, and values computed elsewhere; each is checked by the conformance suite. */
export const reference: readonly ReferenceCase[] = [
  {
    id: "decade-q10-gain2",
    topology: "multiple-feedback",
    given: { targets: { centreFrequency: 1000, qualityFactor: 10, peakGain: 2 }, parts: { c1: 100e-9, c2: 100e-9 } },
    expect: { rf: 31.8e3, ra: 7.96e3, rb: 80.4 },
    tolerance: 1.5e-3,
    source: {
      title: "Texas Instruments, Op Amps for Everyone (Mancini ed., SLOD006)",
      place: "ch. 16, multiple-feedback band-pass, second-order example",
      howKnown: "from memory",
    },
    note: "Printed to three figures; the source calls them R2 (feedback), R1 (input), R3 (to ground).",
  },
  {
    id: "q10-gain-20-db",
    topology: "multiple-feedback",
    given: { targets: { centreFrequency: 1000, qualityFactor: 10, peakGain: 10 }, parts: { c1: 10e-9, c2: 10e-9 } },
    expect: { rf: 318.3e3, ra: 15.92e3, rb: 837.7 },
    tolerance: 5e-4,
    source: {
      title: "S. Franco, Design with Operational Amplifiers and Analog Integrated Circuits",
      place: "ch. 3, multiple-feedback band-pass, f0 = 1 kHz, Q = 10, resonance gain 20 dB",
      howKnown: "from memory",
    },
    note: "The source calls them R2 (feedback), R1A (input), R1B (to ground).",
  },
];
