import type { ReferenceCase } from "../../stage/kind.ts";

const scipy = {
  title: "scipy solve_ivp with event location",
  place: "tests/reference/burst_envelope.py",
  howKnown: "computed",
} as const;
const parts = { rt: 75e3, ct: 100e-9, r1: 10e3, r2: 22e3, rg: 100e3, cg: 470e-9, rBurst: 40e3, cBurst: 100e-9 };

/** A period printed in textbooks as 2RC·ln((1 + β)/(1 − β)), and values computed elsewhere. */
export const reference: readonly ReferenceCase[] = [
  {
    id: "half-swing-thresholds",
    topology: "gated-oscillator",
    given: { parts: { ...parts, rt: 100e3, r1: 10e3, r2: 10e3 } },
    expect: { spacing: 21.97e-3 },
    tolerance: 3e-4,
    source: {
      title: "The op-amp relaxation oscillator of the textbooks",
      place: "β = 1/2, where T = 2RC ln 3 = 2.197 RC",
      howKnown: "from memory",
    },
  },
  {
    id: "unequal-swings",
    topology: "gated-oscillator",
    given: { parts, conditions: { outputHigh: 10.5, outputLow: -9.5 } },
    expect: { highTime: 4.678e-3, lowTime: 5.035e-3, spacing: 9.713e-3, firstInterval: 7.846e-3, hits: 4 },
    tolerance: 1e-4,
    source: scipy,
  },
  {
    id: "biased-comparator",
    topology: "gated-oscillator",
    given: { parts, conditions: { outputHigh: 10.5, outputLow: -9.5, biasCurrent: 2e-6 } },
    expect: { highTime: 4.7511687e-3, lowTime: 4.9525633e-3 },
    tolerance: 1e-7,
    source: scipy,
  },
  {
    id: "relaxation-oscillator-fraction-0.9",
    topology: "gated-oscillator",
    given: { parts: { rt: 1e3, ct: 100e-9, r1: 18e3, r2: 2e3 } },
    expect: { spacing: 589e-6 },
    tolerance: 1e-3,
    source: {
      title: "Electronics textbook, problem 36.8 with its solution (holooly.com)",
      place: "feedback fraction 0.9, 1 kΩ and 0.1 µF: 589 µs",
      howKnown: "read",
    },
  },
];
