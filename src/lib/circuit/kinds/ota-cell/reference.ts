import type { ReferenceCase } from "../../stage/kind.ts";

const computed = {
  title: "Kirchhoff's laws and integrals by scipy",
  place: "tests/reference/ota_cell.py",
  howKnown: "computed",
} as const;
const sheet = {
  title: "Data sheet SNOSBW2 of a dual bipolar transconductance amplifier",
  place: "forward transconductance at 500 µA, typical",
  howKnown: "read",
} as const;

/** Worked examples that others print, and values computed elsewhere; each is checked by the conformance suite. */
export const reference: readonly ReferenceCase[] = [
  {
    id: "typical-transconductance",
    topology: "transimpedance",
    given: { conditions: { biasCurrent: 500e-6 } },
    expect: { transconductance: 9.6e-3 },
    tolerance: 0.02,
    source: sheet,
    note: "Printed limits are 6.7 and 13 mS: an ideal pair lies 1.4 % above the typical figure.",
  },
  {
    id: "bench-gain",
    topology: "transimpedance",
    given: { parts: { rin: 33e3, rsh: 1e3, rf: 10e3, cf: 100e-12 }, conditions: { biasCurrent: 500e-6 } },
    expect: { gain: 2.861893, bandwidth: 159154.94 },
    tolerance: 1e-7,
    source: computed,
  },
  {
    id: "sine-10-mv",
    topology: "transimpedance",
    given: { parts: { rin: 33e3, rsh: 1e3 }, conditions: { sourcePeak: 0.34 } },
    expect: { distortion: 0.3126485e-2 },
    tolerance: 1e-6,
    source: computed,
  },
  {
    id: "typical-transconductance-load",
    topology: "resistor-load",
    given: { conditions: { biasCurrent: 500e-6 } },
    expect: { transconductance: 9.6e-3 },
    tolerance: 0.02,
    source: sheet,
  },
  {
    id: "noise-10-mv",
    topology: "resistor-load",
    given: { parts: { rin: 33e3, rsh: 1e3 }, conditions: { signal: "noise", sourceRms: 0.34 } },
    expect: { distortionDb: -31.085563 },
    tolerance: 1e-7,
    source: computed,
  },
  {
    id: "load-20k",
    topology: "resistor-load",
    given: { parts: { rl: 20e3, cl: 150e-12 } },
    expect: { bandwidth: 53051.648, outputSlew: 3.3333333e6 },
    tolerance: 1e-7,
    source: computed,
  },
  {
    id: "transconductance-at-room-temperature",
    topology: "resistor-load",
    given: { conditions: { biasCurrent: 1e-3 } },
    expect: { transconductance: 19.2e-3 },
    tolerance: 0.015,
    source: {
      title: "R. M. Marston, Op-Amp Circuits Manual, including OTA circuits",
      place: "gm ≈ 19.2·I_abc at room temperature, as quoted",
      howKnown: "read",
    },
    note: "19.2 rounds the thermal voltage to 26 mV; at 25 °C it is 19.46.",
  },
];
