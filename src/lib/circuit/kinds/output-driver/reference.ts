import type { ReferenceCase } from "../../stage/kind.ts";

const note = { title: "Texas Instruments, SBOA270, inverting amplifier circuit", howKnown: "read" } as const;
const computed = {
  title: "Worked values, computed apart from this library",
  place: "tests/reference/worked.json",
  howKnown: "computed",
} as const;

/** Worked examples that others print, and values computed elsewhere; each is checked by the conformance suite. */
export const reference: readonly ReferenceCase[] = [
  {
    id: "bandwidth-from-noise-gain",
    topology: "inverting",
    given: { parts: { ri: 10e3, rf: 20e3 }, conditions: { gainBandwidth: 1.2e6 } },
    expect: { gain: 2, noiseGain: 3, bandwidth: 400e3 },
    tolerance: 1e-9,
    source: { ...note, place: "AC result: noise gain 3 V/V, calculated bandwidth 400 kHz" },
    note: "The signal gain is −2, but the bandwidth follows the noise gain. The source's resistors have the same ratio.",
  },
  {
    id: "slew-14-v-3-khz",
    topology: "inverting",
    given: { conditions: { railPositive: 15.5, railNegative: -15.5, slewRate: 0.26e6 } },
    expect: { swing: 14, slewLimit: 3e3 },
    tolerance: 0.02,
    source: {
      ...note,
      place: "design step: slew rate above 2·π·f·Vp for 3 kHz and 14 V peak",
      howKnown: "from memory",
    },
    note: "Frequency and peak were read, the printed 0.26 V/µs is from memory (exactly 0.2639). Rails chosen so that the swing is 14 V.",
  },
  {
    id: "driver-of-two",
    topology: "inverting",
    given: { targets: { gain: 2, level: 1.25 }, parts: { ri: 10e3, ro: 1e3, cin: 1e-6 } },
    expect: { ri: 10e3, rf: 20e3 },
    tolerance: 1e-9,
    source: computed,
  },
  {
    id: "non-inverting-of-two",
    topology: "non-inverting",
    given: {
      parts: { ri: 10e3, rf: 10e3, ro: 1e3 },
      conditions: { gainBandwidth: 3e6, elementDrop: 0.3, signal: "noise" },
    },
    expect: { gain: 2, bandwidth: 1.5e6, swing: 10.2, largestRms: 2.55 },
    tolerance: 1e-9,
    source: computed,
  },
  {
    id: "non-inverting-load",
    topology: "non-inverting",
    given: { parts: { ro: 1e3 }, conditions: { loadResistance: 100e3, loads: 3 } },
    expect: { loadLossDb: -0.25674449 },
    tolerance: 5e-8,
    source: computed,
  },
];
