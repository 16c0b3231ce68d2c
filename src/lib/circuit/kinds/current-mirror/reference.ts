import type { ReferenceCase } from "../../stage/kind.ts";

const bench = { referenceCurrent: 500e-6, beta: 150, earlyVoltage: 50 };
const exercise = {
  title: "Sedra and Smith, Microelectronic Circuits",
  place: "exercise 8.26 (β = 100, ro = 100 kΩ)",
  howKnown: "read",
} as const;
const computed = {
  title: "Independent solution of the device equations",
  place: "tests/reference/current_mirror.py",
  howKnown: "computed",
} as const;

/** Worked examples that others print, and values computed elsewhere; each is checked by the conformance suite. */
export const reference: readonly ReferenceCase[] = [
  {
    id: "simple-base-current",
    topology: "simple",
    given: { conditions: { beta: 100 } },
    expect: { baseCurrentError: -0.02 },
    tolerance: 0.025,
    source: exercise,
    note: "The source rounds 2/(β + 2) to 0.02.",
  },
  {
    id: "simple-output-resistance",
    topology: "simple",
    given: { conditions: { referenceCurrent: 1e-3, earlyVoltage: 90, outputVoltage: 11 } },
    expect: { outputResistance: 90e3 },
    tolerance: 0.012,
    source: {
      title: "Sedra and Smith, Microelectronic Circuits",
      place: "problem 8.11 (1 mA, VA = 90 V)",
      howKnown: "from memory",
    },
    note: "The source takes r_o = V_A/I; the exact slope is V_BE/V_A higher.",
  },
  {
    id: "simple-into-bias-pin",
    topology: "simple",
    given: { conditions: bench },
    expect: { outputCurrent: 706.45045e-6, textbookOutputResistance: 145.4e3 },
    tolerance: 1e-7,
    source: computed,
  },
  {
    id: "degenerated-1k",
    topology: "degenerated",
    given: { parts: { r1: 1e3, r2: 1e3 }, conditions: bench },
    expect: { outputCurrent: 501.97744e-6 },
    tolerance: 1e-7,
    source: computed,
  },
  {
    id: "degenerated-mismatch-5-mv",
    topology: "degenerated",
    given: { parts: { r1: 1e3, r2: 1e3 }, conditions: { ...bench, mismatchVoltage: 5e-3 } },
    expect: { mismatchError: 0.9352848e-2 },
    tolerance: 1e-6,
    source: computed,
  },
  {
    id: "ratio-of-two",
    topology: "degenerated",
    given: { parts: { r1: 2e3, r2: 1e3 }, conditions: { referenceCurrent: 250e-6 } },
    expect: { ratio: 1.9323039 },
    tolerance: 1e-7,
    source: computed,
  },
  {
    id: "wilson-base-current",
    topology: "wilson",
    given: { conditions: { beta: 100 } },
    expect: { baseCurrentError: -0.0002 },
    tolerance: 0.025,
    source: exercise,
    note: "The source rounds 2/(β² + 2β + 2) to 0.02 %.",
  },
  {
    id: "wilson-output-resistance",
    topology: "wilson",
    given: { conditions: { referenceCurrent: 1e-3, beta: 100, earlyVoltage: 100, outputVoltage: 10.5 } },
    expect: { outputResistance: 5e6 },
    tolerance: 0.03,
    source: exercise,
    note: "The source takes β·ro/2; the exact slope is a little off it either way.",
  },
];
