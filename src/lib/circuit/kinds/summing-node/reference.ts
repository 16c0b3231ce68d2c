import type { ReferenceCase } from "../../stage/kind.ts";

/** Worked examples that others print, and values computed elsewhere; each is checked by the conformance suite. */
export const reference: readonly ReferenceCase[] = [
  {
    id: "gain-of-ten",
    topology: "inverting",
    // 2 V and 3 V, fully correlated: 50 V, outside any usual rails as the source's own.
    given: { parts: { r1: 1e3, r2: 1e3, rf: 10e3 }, conditions: { level1: 2, level2: 3, correlation: 1 } },
    expect: { gain1: 10, gain2: 10, outputRms: 50 },
    tolerance: 1e-9,
    source: {
      title: "US Navy, NEETS Module 8, Introduction to Amplifiers",
      place: "figure 3-23, summing amplifier with gain −10, inputs of 2 V and 3 V",
      howKnown: "read",
    },
    note: "Direct voltages in the source. The input resistors of 1 kΩ follow from the gain printed with the 10 kΩ feedback resistor.",
  },
  {
    id: "noise-gain-3",
    topology: "inverting",
    given: { parts: { r1: 20e3, r2: 20e3, rf: 20e3 }, conditions: { gainBandwidth: 1.2e6 } },
    expect: { noiseGain: 3, bandwidth: 400e3 },
    tolerance: 1e-9,
    source: {
      title: "Texas Instruments, SBOA270, inverting amplifier circuit",
      place: "noise gain 3 V/V, calculated bandwidth 400 kHz at a gain-bandwidth of 1.2 MHz",
      howKnown: "read",
    },
    note: "The signal gain is 2, but the bandwidth follows the noise gain. The source has one path of half the resistance in place of two.",
  },
  {
    id: "two-paths",
    topology: "inverting",
    given: { targets: { gain1: 1, gain2: 0.1 }, parts: { rf: 22e3 } },
    expect: { r1: 22e3, r2: 220e3 },
    tolerance: 1e-9,
    source: {
      title: "Nodal analysis of the network, computed apart from this library",
      place: "tests/reference/worked.json",
      howKnown: "computed",
    },
  },
];
