import type { LimitCase } from "../../support/limitCase.ts";

const topology = "inverting";
const both = { level1: 1, level2: 1 };

/** Each limit of trade brief 2.16 from both sides, as near to its bound as is clear. */
export const limitCases: readonly LimitCase[] = [
  {
    topology,
    code: "paths-subtract",
    raised: { conditions: { ...both, parity2: "odd", correlation: 0.31 } },
    quiet: { conditions: { ...both, parity2: "odd", correlation: 0.3 } },
  },
  {
    topology,
    code: "paths-subtract",
    raised: { conditions: { ...both, parity1: "odd" } },
    quiet: { conditions: { ...both, parity1: "odd", parity2: "odd" } },
  },
  {
    topology,
    code: "source-loads-path",
    raised: { conditions: { source2: 11.1e3 } },
    quiet: { conditions: { source2: 11e3 } },
  },
  // Noise gain 2.1 at 1 kHz.
  {
    topology,
    code: "slow-op-amp",
    raised: { conditions: { gainBandwidth: 209e3 } },
    quiet: { conditions: { gainBandwidth: 211e3 } },
  },
];
