import type { LimitCase } from "../../support/limitCase.ts";

const topology = "swing";

/** Each limit of trade brief 2.13 from both sides. */
export const limitCases: readonly LimitCase[] = [
  {
    topology,
    code: "law-off",
    raised: { conditions: { controlVoltage: 0.25 } },
    quiet: { conditions: { controlVoltage: 4 } },
  },
  {
    topology,
    code: "silent",
    // The worked drive that turns the cell on is 0.702 V.
    raised: { conditions: { sourceRms: 0.17 } },
    quiet: { conditions: { sourceRms: 0.18 } },
  },
  {
    topology,
    code: "base-reversed",
    raised: { conditions: { sourceRms: 1.3 } },
    quiet: { conditions: { sourceRms: 1.1 } },
  },
  {
    topology,
    code: "thump-passes",
    // The output's corner is 15.76 Hz; five times the envelope's is 15.9 Hz at 50 ms.
    raised: { conditions: { decayTimeConstant: 50e-3 } },
    quiet: { conditions: { decayTimeConstant: 51e-3 } },
  },
  {
    topology,
    code: "envelope-loaded",
    raised: { conditions: { dischargeResistance: 9.2e3 } },
    quiet: { conditions: { dischargeResistance: 8.8e3 } },
  },
  {
    topology,
    code: "approximate",
    raised: { conditions: { sourceRms: 0.1 } },
    quiet: { conditions: { sourceRms: 0.09 } },
  },
];
