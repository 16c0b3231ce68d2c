import type { ReferenceCase } from "../../stage/kind.ts";

const scipy = {
  title: "scipy, quadrature over the drive",
  place: "tests/reference/transistor_cell.py",
  howKnown: "computed",
} as const;
const parts = { ri: 10e3, rb: 100e3, rc: 10e3, ro: 1e12 };

/** Values computed elsewhere; no published worked example of this network is known. */
export const reference: readonly ReferenceCase[] = [
  {
    id: "eight-volts",
    topology: "swing",
    given: { parts, conditions: { controlVoltage: 8, sourceRms: 1 } },
    expect: { outputRms: 2.446, thump: 7.118 },
    tolerance: 1e-4,
    source: scipy,
    note: "R_o left out by a value far above any resistor.",
  },
  {
    id: "one-volt",
    topology: "swing",
    given: { parts, conditions: { controlVoltage: 1, sourceRms: 1 } },
    expect: { outputRms: 0.3165, thump: 0.8799 },
    tolerance: 2e-4,
    source: scipy,
  },
];
