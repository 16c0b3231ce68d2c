import type { ReferenceCase } from "../../stage/kind.ts";

const computed = {
  title: "Kirchhoff's laws solved by scipy",
  place: "tests/reference/voltage_to_current.py",
  howKnown: "computed",
} as const;

/** Values computed elsewhere; each is checked by the conformance suite. No worked example of this use is known in print. */
export const reference: readonly ReferenceCase[] = [
  {
    id: "driver-15k5",
    topology: "op-amp-transistor",
    given: { parts: { re: 15.5e3 }, conditions: { controlVoltage: 7.8, beta: 200 } },
    expect: { outputCurrent: 500.7222e-6 },
    tolerance: 1e-7,
    source: computed,
  },
  {
    id: "driver-sized",
    topology: "op-amp-transistor",
    given: { targets: { outputCurrent: 500e-6 }, conditions: { controlVoltage: 7.8 } },
    expect: { re: 15.6e3 },
    tolerance: 1e-9,
    source: computed,
  },
  {
    id: "resistor-37k",
    topology: "resistor",
    given: { parts: { r: 37e3 }, conditions: { controlVoltage: 7.8 } },
    expect: { outputCurrent: 500e-6, floorCurrent: 289.18919e-6 },
    tolerance: 1e-7,
    source: computed,
  },
  {
    id: "resistor-sized",
    topology: "resistor",
    given: { targets: { outputCurrent: 250e-6 }, conditions: { controlVoltage: 5 } },
    expect: { r: 62.8e3 },
    tolerance: 1e-9,
    source: computed,
  },
  {
    id: "ten-ohms-of-sense",
    topology: "op-amp-transistor",
    given: { parts: { re: 10 }, conditions: { controlVoltage: 1 } },
    expect: { outputCurrent: 100e-3 },
    tolerance: 1e-9,
    source: {
      title: "Simulation tutorial of an op-amp current source (mull-overthing.com)",
      place: "1 V across 10 Ω: 100 mA",
      howKnown: "read",
    },
  },
  {
    id: "nine-milliamperes",
    topology: "op-amp-transistor",
    given: { parts: { re: 150 }, conditions: { controlVoltage: 1.36 } },
    expect: { outputCurrent: 9.1e-3 },
    tolerance: 5e-3,
    source: {
      title: "Workshop article on a constant-current source with an op amp (askix.com)",
      place: "1.36 V across 150 Ω: 9.1 mA",
      howKnown: "read",
    },
    note: "Exactly 9.067 mA; there the current is drawn from the positive rail.",
  },
];
