import type { ReferenceCase } from "../../stage/kind.ts";

const arithmetic = {
  title: "Arithmetic",
  place: "the formula of the threshold, by hand",
  howKnown: "computed",
} as const;
const scipy = {
  title: "scipy solve_ivp, Radau",
  place: "tests/reference/trigger_input.py",
  howKnown: "computed",
} as const;
const threshold = { ra: 100e3, rb: 47e3, rc: 10e3, cd: 22e-9, rd: 47e3, rs: 1e3 };
const levels = { railPositive: 12, outputHigh: 10.5, outputLow: -10.5 };

/** Values computed elsewhere; no published worked example of these networks is known. */
export const reference: readonly ReferenceCase[] = [
  {
    id: "divider-100k-47k",
    topology: "transistor-threshold",
    given: { parts: threshold, conditions: { baseEmitterVoltage: 0.6 } },
    expect: { threshold: 1.877, inputResistance: 147e3, thresholdDrift: -6.255e-3 },
    tolerance: 3e-4,
    source: arithmetic,
  },
  {
    id: "pulse-through-junction",
    topology: "transistor-threshold",
    given: { parts: threshold, conditions: { beta: 100, pulseHeight: 10 } },
    expect: { pulseWidthHalf: 1.0064742e-3, thresholdHalf: 2.582934 },
    tolerance: 1e-6,
    source: scipy,
  },
  {
    id: "hysteresis-2-volts",
    topology: "comparator",
    given: { parts: { rin: 100e3, rh: 1e6, rr1: 100e3, rr2: 20e3 }, conditions: levels },
    expect: { reference: 2, threshold: 3.25, fallingThreshold: 1.15, hysteresis: 2.1 },
    tolerance: 1e-9,
    source: arithmetic,
  },
  {
    id: "hysteresis-designed",
    topology: "comparator",
    given: { targets: { threshold: 3.25, hysteresis: 2.1 }, conditions: levels },
    expect: { rh: 1e6, rr2: 20e3 },
    tolerance: 1e-9,
    source: arithmetic,
  },
  {
    id: "thresholds-of-a-3-v-supply",
    topology: "comparator",
    given: {
      parts: { rin: 100e3, rh: 750e3, rr1: 100e3, rr2: 100e3 },
      conditions: { outputHigh: 3, outputLow: 0, railPositive: 3 },
    },
    expect: { threshold: 1.7, fallingThreshold: 1.3, hysteresis: 0.4 },
    tolerance: 1e-9,
    source: {
      title: "Texas Instruments, CIRCUIT060078, non-inverting comparator with hysteresis",
      place: "design goals: 1.7 V and 1.3 V on a supply of 3 V",
      howKnown: "read",
    },
    note: "The thresholds are printed; the resistors follow from the equations of the next case's source.",
  },
  {
    id: "resistor-ratio-for-thresholds",
    topology: "comparator",
    given: {
      parts: { rin: 10e3, rr1: 100e3 },
      targets: { threshold: 1.7, hysteresis: 0.4 },
      conditions: { outputHigh: 3, outputLow: 0, railPositive: 3 },
    },
    expect: { rh: 75e3, rr2: 100e3 },
    tolerance: 1e-9,
    source: {
      title: "All About Circuits, comparator with hysteresis calculator",
      place: "R = (VP − VN)/(VTH − VTL) and VREF = VN + R/(1 + R)·(VTH − VN)",
      howKnown: "read",
    },
    note: "With those figures R is 7.5 and the reference half the supply.",
  },
];
