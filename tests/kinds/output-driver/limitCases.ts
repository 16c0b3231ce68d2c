import type { PlainValues } from "#lib/circuit/index.ts";
import type { LimitCase } from "../../support/limitCase.ts";

/** Each limit of trade brief 2.17 from both sides, as near to its bound as is clear. */
const shared = (topology: string): LimitCase[] => [
  {
    topology,
    code: "no-swing",
    raised: { conditions: { railPositive: 1.5 } },
    quiet: { conditions: { railPositive: 1.6 } },
  },
  // Four times RMS times 2 reaches 10.5 V at 1.3125 V.
  {
    topology,
    code: "output-clips",
    raised: { conditions: { sourceRms: 1.313 } },
    quiet: { conditions: { sourceRms: 1.312 } },
  },
  {
    topology,
    code: "unprotected-output",
    raised: { parts: { ro: 469 }, conditions: { currentLimiting: "unlimited" } },
    quiet: { parts: { ro: 470 }, conditions: { currentLimiting: "unlimited" } },
  },
  {
    topology,
    code: "unprotected-output",
    raised: { parts: { ro: 220 }, conditions: { currentLimiting: "unlimited" } },
    quiet: { parts: { ro: 220 }, conditions: { currentLimiting: "limited" } },
  },
  { topology, code: "large-output-resistor", raised: { parts: { ro: 2201 } }, quiet: { parts: { ro: 2200 } } },
  // 20 kHz at 10.5 V need 1.3195 V/µs.
  {
    topology,
    code: "slow-slewing",
    raised: { conditions: { slewRate: 1.319e6 } },
    quiet: { conditions: { slewRate: 1.32e6 } },
  },
  {
    topology,
    code: "dc-at-jack",
    raised: { conditions: { offsetVoltage: 10.1e-3 } },
    quiet: {
      parts: { cout: 10e-6 },
      conditions: { offsetVoltage: 10.1e-3, loadResistance: 100e3, cableCapacitance: 1e-9 },
    },
  },
  {
    topology,
    code: "coupling-cuts-bass",
    raised: { parts: { cin: 0.79e-6, ...input(topology) } },
    quiet: { parts: { cin: 0.8e-6, ...input(topology) } },
  },
  // 5/(2π·72 ms) is 11.05 Hz.
  {
    topology,
    code: "thump-passes",
    raised: { parts: { cin: 1.45e-6, ...input(topology) }, conditions: { thumpTimeConstant: 72e-3 } },
    quiet: {
      parts: { cin: 1.43e-6, ...input(topology) },
      conditions: { thumpTimeConstant: 72e-3, gainBandwidth: 3e6, inputNoise: 18e-9 },
    },
  },
];

/** What makes the coupling capacitor work into 10 kΩ. */
function input(topology: string): PlainValues {
  return topology === "inverting" ? { ri: 10e3 } : { rb: 10e3 };
}

export const limitCases: readonly LimitCase[] = [
  ...shared("inverting"),
  ...shared("non-inverting"),
  {
    topology: "non-inverting",
    code: "no-bias-path",
    raised: { parts: { cin: 1e-6 } },
    quiet: { parts: { cin: 1e-6, rb: 100e3 } },
  },
];
