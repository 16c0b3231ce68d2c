import type { LimitCase } from "../../support/limitCase.ts";

const driver = "op-amp-transistor";
const negative = { controlRest: -0.1 };

export const limitCases: readonly LimitCase[] = [
  { topology: driver, code: "fault-current", raised: { parts: { re: 6.8e3 } }, quiet: { parts: { re: 7.5e3 } } },
  { topology: driver, code: "peak-over-plan", raised: { parts: { re: 7.5e3 } }, quiet: { parts: { re: 8.2e3 } } },
  {
    topology: driver,
    code: "shallow-floor",
    raised: { conditions: { offsetVoltage: 10e-3 } },
    quiet: { conditions: { offsetVoltage: 3e-3 } },
  },
  {
    topology: driver,
    code: "cannot-follow",
    raised: { conditions: { controlVoltage: 10 } },
    quiet: { conditions: { controlVoltage: 9.8 } },
  },
  {
    topology: driver,
    code: "little-headroom",
    raised: { conditions: { mirrorDegeneration: 10e3 } },
    quiet: { conditions: { mirrorDegeneration: 1e3 } },
  },
  { topology: driver, code: "negative-envelope", raised: { conditions: negative }, quiet: {} },
  {
    topology: driver,
    code: "slow-recovery",
    raised: { conditions: { ...negative, slewRate: 0.5e6 } },
    quiet: { conditions: { ...negative, slewRate: 13e6 } },
  },
  {
    topology: driver,
    code: "reverse-base-emitter",
    raised: { conditions: { ...negative, protection: "none" } },
    quiet: { conditions: { ...negative, protection: "fitted" } },
  },
  { topology: "resistor", code: "fault-current", raised: { parts: { r: 12e3 } }, quiet: { parts: { r: 15e3 } } },
  { topology: "resistor", code: "peak-over-plan", raised: { parts: { r: 18e3 } }, quiet: { parts: { r: 20e3 } } },
  {
    topology: "resistor",
    code: "cannot-reach-zero",
    raised: {},
    quiet: { conditions: { controlRest: -12 } },
  },
  {
    topology: "resistor",
    code: "no-current",
    raised: { conditions: { railNegative: -1, pinAboveRail: 3, controlVoltage: 1 } },
    quiet: { conditions: { railNegative: -1, pinAboveRail: 3, controlVoltage: 3 } },
  },
];
