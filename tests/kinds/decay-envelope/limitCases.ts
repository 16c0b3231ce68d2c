import type { LimitCase } from "../../support/limitCase.ts";

const topology = "diode-charged";

/** Each limit of trade brief 2.2 from both sides, as near to its bound as is clear. */
export const limitCases: readonly LimitCase[] = [
  {
    topology,
    code: "never-charges",
    raised: { conditions: { pulseHeight: 0.6, diodeDrop: 0.65 } },
    quiet: { conditions: { pulseHeight: 0.7, diodeDrop: 0.65 } },
  },
  {
    topology,
    code: "inside-dead-band",
    raised: { conditions: { pulseHeight: 1.1, diodeDrop: 0.65, deadBand: 0.6 } },
    quiet: { conditions: { pulseHeight: 1.3, diodeDrop: 0.65, deadBand: 0.6 } },
  },
  {
    topology,
    code: "never-closes",
    // 60 dB under 10 V is 10 mV: what 40 nA leave across 260 kΩ.
    raised: { conditions: { biasCurrent: 40e-9 } },
    quiet: { conditions: { biasCurrent: 38e-9 } },
  },
  {
    topology,
    code: "charge-current",
    raised: { parts: { rs: 490 }, conditions: { pulseHeight: 10 } },
    quiet: { parts: { rs: 510 }, conditions: { pulseHeight: 10 } },
  },
  {
    topology,
    code: "knob-changes-level",
    raised: { parts: { rs: 201, rMin: 10e3 } },
    quiet: { parts: { rs: 200, rMin: 10e3 } },
  },
  {
    topology,
    code: "short-pulse",
    raised: { conditions: { pulseWidth: 1.4e-3 } },
    quiet: { conditions: { pulseWidth: 1.42e-3 } },
  },
  {
    topology,
    code: "load-shortens-decay",
    raised: { conditions: { loadResistance: 5e6 } },
    quiet: { conditions: { loadResistance: 5.2e6 } },
  },
  {
    topology,
    code: "pedestal",
    raised: { conditions: { biasCurrent: 40e-9 } },
    quiet: { conditions: { biasCurrent: 38e-9 } },
  },
  {
    topology,
    code: "dead-band-shortens",
    raised: { conditions: { deadBand: 0.11 } },
    quiet: { conditions: { deadBand: 0.09 } },
  },
  {
    topology,
    code: "tail-chopped",
    raised: { conditions: { deadBand: 0.51 } },
    quiet: { conditions: { deadBand: 0.49 } },
  },
  {
    topology,
    code: "class-2-ceramic",
    raised: { conditions: { dielectric: "class-2" } },
    quiet: { conditions: { dielectric: "electrolytic" } },
  },
  {
    topology,
    code: "electrolytic",
    raised: { conditions: { dielectric: "electrolytic" } },
    quiet: { conditions: { dielectric: "class-2" } },
  },
];
