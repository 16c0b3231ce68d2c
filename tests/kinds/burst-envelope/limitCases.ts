import type { LimitCase } from "../../support/limitCase.ts";

const topology = "gated-oscillator";
/** Rests at the lower threshold, so that every interval is alike: T = 9.6994 ms, gate ratio Rg·Cg·ln 2/T. */
const even = { restVoltage: -10.5 * (10 / 32) };

/** Each limit of trade brief 2.3 from both sides, as near to its bound as is clear. */
export const limitCases: readonly LimitCase[] = [
  {
    topology,
    code: "does-not-oscillate",
    raised: { conditions: { restVoltage: 3.3 } },
    quiet: { conditions: { restVoltage: 3.2 } },
  },
  {
    topology,
    code: "no-gate",
    raised: { conditions: { gateSource: 5, gateThreshold: 5 } },
    quiet: { conditions: { gateSource: 5.1, gateThreshold: 5 } },
  },
  { topology, code: "too-many-hits", raised: { parts: { rg: 2e6 } }, quiet: { parts: { rg: 1.8e6 } } },
  {
    topology,
    code: "count-can-change",
    // With four even hits the ratio may err by 14.3 %; parts of 5 % and 1 % reach 12.8 %, of 10 % and 1 % 24.7 %.
    raised: { parts: { rg: 104.2e3 }, conditions: { ...even, capacitorTolerance: 0.1 } },
    quiet: { parts: { rg: 104.2e3 }, conditions: { ...even, capacitorTolerance: 0.05 } },
  },
  {
    topology,
    code: "count-can-change",
    raised: { parts: { rg: 118e3 }, conditions: { ...even, capacitorTolerance: 0.02 } },
    quiet: { parts: { rg: 104.2e3 }, conditions: { ...even, capacitorTolerance: 0.02 } },
  },
  {
    topology,
    code: "first-interval",
    raised: { conditions: { restVoltage: -1.6 } },
    quiet: { conditions: { restVoltage: -2 } },
  },
  {
    topology,
    code: "hits-merge",
    // −12 dB are 1.382 time constants in 9.6994 ms: 7.02 ms.
    raised: { parts: { rBurst: 70.5e3 }, conditions: even },
    quiet: { parts: { rBurst: 70e3 }, conditions: even },
  },
  { topology, code: "buzz", raised: { parts: { rt: 38.6e3 } }, quiet: { parts: { rt: 38.7e3 } } },
  {
    topology,
    code: "loose-capacitors",
    raised: { conditions: { capacitorTolerance: 0.1 } },
    quiet: { conditions: { capacitorTolerance: 0.09 } },
  },
  {
    topology,
    code: "tail-early",
    raised: { conditions: { tailFrom: "first-hit" } },
    quiet: { conditions: { tailFrom: "gate-end" } },
  },
  {
    topology,
    code: "bias-shifts-timing",
    raised: { conditions: { biasCurrent: 0.45e-6 } },
    quiet: { conditions: { biasCurrent: 0.43e-6 } },
  },
];
