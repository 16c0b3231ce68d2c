import type { Change, LimitCase } from "../../support/limitCase.ts";

const real = { beta: 150, earlyVoltage: 50 };
const everywhere = (code: string, raised: Change, quiet: Change): LimitCase[] =>
  ["simple", "degenerated", "wilson"].map((topology) => ({ topology, code, raised, quiet }));

export const limitCases: readonly LimitCase[] = [
  ...everywhere(
    "output-saturates",
    { conditions: { outputVoltage: 11.9 } },
    { conditions: { outputVoltage: 10, referenceCurrent: 100e-6 } },
  ),
  ...everywhere("little-headroom", { conditions: { outputVoltage: 10.95 } }, { conditions: { outputVoltage: 10 } }).map(
    (one) => (one.topology === "simple" ? { ...one, raised: { conditions: { outputVoltage: 11.5 } } } : one),
  ),
  {
    topology: "simple",
    code: "bends-decay",
    raised: { conditions: { ...real, seriesResistance: 40e3 } },
    quiet: { conditions: { ...real, seriesResistance: 10e3 } },
  },
  {
    topology: "degenerated",
    code: "bends-decay",
    raised: { conditions: real },
    quiet: { conditions: { ...real, outputVoltage: 6 } },
  },
  ...everywhere(
    "error-untrimmed",
    { conditions: { beta: 20, mismatchVoltage: 20e-3, referenceCurrent: 10e-6 } },
    { conditions: { beta: 20, mismatchVoltage: 20e-3, referenceCurrent: 10e-6, trim: "fitted" } },
  ),
  ...everywhere(
    "unmatched-pair",
    { conditions: { mismatchVoltage: 5e-3, referenceCurrent: 50e-6 } },
    { conditions: { mismatchVoltage: 1e-3, referenceCurrent: 50e-6 } },
  ),
  {
    topology: "wilson",
    code: "unmatched-pair",
    raised: { conditions: { ...real, mismatchVoltage: 2e-3 } },
    quiet: { conditions: real },
  },
  {
    topology: "simple",
    code: "high-collector-voltage",
    raised: { conditions: real },
    quiet: { conditions: { ...real, seriesResistance: 33e3 } },
  },
  {
    topology: "degenerated",
    code: "high-collector-voltage",
    raised: { parts: { r1: 0, r2: 0 }, conditions: real },
    quiet: { conditions: real },
  },
];
