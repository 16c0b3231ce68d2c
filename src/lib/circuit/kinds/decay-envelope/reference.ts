import type { ReferenceCase } from "../../stage/kind.ts";

const course = {
  title: "US Army correspondence course MM0704",
  place: "time constants, fig. 1-14",
  howKnown: "read",
} as const;
const scipy = {
  title: "scipy solve_ivp, Radau",
  place: "tests/reference/decay_envelope.py",
  howKnown: "computed",
} as const;

/** A unit capacitor and resistor, charged to so many time constants of R_S·C with next to no discharge. */
const charging = (id: string, multiple: number, charged: number): ReferenceCase => ({
  id,
  topology: "diode-charged",
  given: {
    parts: { rs: 1000, c: 1e-6, rMin: 1e9, rPot: 0 },
    conditions: { pulseHeight: 1, pulseWidth: multiple * 1e-3 },
  },
  expect: { simplePeakVoltage: charged, peakVoltage: charged },
  tolerance: 1e-3,
  source: course,
});

const worked = { rs: 470, c: 1e-6, rMin: 10e3, rPot: 500e3 };
const diode = { pulseHeight: 9.5, saturationCurrent: 4e-9, emissionCoefficient: 1.9, loadResistance: 1e6 };

/** Worked examples that others print, and values computed elsewhere; each is checked by the conformance suite. */
export const reference: readonly ReferenceCase[] = [
  charging("one-time-constant", 1, 0.632),
  charging("two-time-constants", 2, 0.865),
  { ...charging("three-time-constants", 3, 0.951), note: "Printed 95.1 %, a chained rounding error: exact 95.02 %." },
  charging("four-time-constants", 4, 0.982),
  charging("five-time-constants", 5, 0.993),
  {
    id: "microfarad-ten-kilohms",
    topology: "diode-charged",
    given: { parts: { c: 1e-6, rMin: 10e3, rPot: 500e3 }, conditions: { rotation: 0 } },
    expect: { timeConstant: 10e-3, decayTime20: 23.03e-3, decayTime60: 69.08e-3 },
    tolerance: 2e-4,
    source: { title: "Arithmetic", place: "τ = R·C, ln 10 and 3·ln 10 of it", howKnown: "computed" },
  },
  {
    id: "exponential-diode-long",
    topology: "diode-charged",
    given: { parts: worked, conditions: { ...diode, rotation: 1, pulseWidth: 1e-3 } },
    expect: { peakVoltage: 7.7603858, peakVoltageShort: 7.5090735, peakChargeCurrent: 18.6181114e-3 },
    tolerance: 1e-8,
    source: scipy,
  },
  {
    id: "exponential-diode-narrow-pulse",
    topology: "diode-charged",
    given: { parts: worked, conditions: { ...diode, rotation: 1, pulseWidth: 1.0038013e-3 } },
    expect: { peakVoltage: 7.7690944, peakVoltageShort: 7.5169417, knobLevelDb: -0.2865844 },
    tolerance: 1e-7,
    source: scipy,
  },
];
