import type { LimitCase } from "../../support/limitCase.ts";

const topology = "measured";

/** Each limit of trade brief 2.14 from both sides, as near to its bound as is clear. The stage it starts with gives 1 V. */
export const limitCases: readonly LimitCase[] = [
  {
    topology,
    code: "no-swing",
    raised: { conditions: { railNegative: -1.5 } },
    quiet: { conditions: { railNegative: -1.6 } },
  },
  {
    topology,
    code: "no-breakdown",
    raised: { conditions: { breakdownVoltage: 12 } },
    quiet: { conditions: { breakdownVoltage: 11.9 } },
  },
  {
    topology,
    code: "rail-near-breakdown",
    raised: { conditions: { breakdownVoltage: 9.01 } },
    quiet: { conditions: { breakdownVoltage: 9 } },
  },
  {
    topology,
    code: "rail-near-breakdown",
    raised: { conditions: { breakdownVoltage: 11.9 } },
    quiet: { conditions: { breakdownVoltage: 12.1 } },
  },
  // Four times RMS reaches the 10.5 V of swing at 2.625 V, which a source of 52.5 mV gives.
  {
    topology,
    code: "output-clips",
    raised: { conditions: { sourceRms: 52.6e-3 } },
    quiet: { conditions: { sourceRms: 52.4e-3 } },
  },
  // 6 dB less than that.
  {
    topology,
    code: "loud-device-clips",
    raised: { conditions: { sourceRms: 26.4e-3 } },
    quiet: { conditions: { sourceRms: 26.2e-3 } },
  },
  {
    topology,
    code: "loud-device-clips",
    raised: { conditions: { sourceRms: 52.4e-3 } },
    quiet: { conditions: { sourceRms: 52.6e-3 } },
  },
  // 1.5 · 10 · 20 kHz.
  {
    topology,
    code: "slow-op-amp",
    raised: { conditions: { gainBandwidth: 299e3 } },
    quiet: { conditions: { gainBandwidth: 300e3 } },
  },
  {
    topology,
    code: "level-off",
    raised: { conditions: { interfaceLevel: 1.42 } },
    quiet: { conditions: { interfaceLevel: 1.41 } },
  },
  {
    topology,
    code: "level-off",
    raised: { conditions: { interfaceLevel: 0.707 } },
    quiet: { conditions: { interfaceLevel: 0.709 } },
  },
  {
    topology,
    code: "supply-shared",
    raised: { conditions: { supplyFilter: "shared" } },
    quiet: { conditions: { supplyFilter: "own-rc" } },
  },
  // 113 µV/√Hz over 13.5 nV/√Hz of a 10 kΩ input; a tenth of the first feedback leaves more of R_1's noise.
  {
    topology,
    code: "amplifier-heard",
    raised: { conditions: { sourceRms: 23.8e-6 } },
    quiet: { conditions: { sourceRms: 24e-6 } },
  },
  {
    topology,
    code: "short-hit",
    raised: { conditions: { window: 1e-3 } },
    quiet: { conditions: { window: 20e-3 } },
  },
  {
    topology,
    code: "slow-clock",
    raised: { conditions: { clockFrequency: 99e3 } },
    quiet: { conditions: { clockFrequency: 100e3 } },
  },
  // 2^17 − 1 steps at 131.072 kHz take 8 µs less than a second.
  {
    topology,
    code: "audible-loop",
    raised: { conditions: { clockFrequency: 131.072e3, registerLength: 17 } },
    quiet: { conditions: { clockFrequency: 131.07e3, registerLength: 17 } },
  },
];
