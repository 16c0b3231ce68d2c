import type { LimitCase } from "../../support/limitCase.ts";

const topology = "multiple-feedback";
const withPot = { rb: 2200, rbPot: 2000 };

/** Each limit of trade brief 2.7 from both sides, as near to its bound as is clear. */
export const limitCases: readonly LimitCase[] = [
  {
    topology,
    code: "oscillates",
    // A gain-bandwidth far below the centre, behind a large output resistance, leaves no peak to read.
    raised: { conditions: { gainBandwidth: 500, outputResistance: 1e6 } },
    quiet: { conditions: { gainBandwidth: 3e6, outputResistance: 100 } },
  },
  {
    topology,
    code: "gain-near-limit",
    raised: { parts: { ra: 22e3, rb: 221e3 } },
    quiet: { parts: { ra: 22e3, rb: 219e3 } },
  },
  {
    topology,
    code: "slow-op-amp",
    raised: { conditions: { gainBandwidth: 300e3 } },
    quiet: { conditions: { gainBandwidth: 500e3 } },
  },
  {
    topology,
    code: "little-loop-gain",
    raised: { conditions: { gainBandwidth: 500e3 } },
    quiet: { conditions: { gainBandwidth: 700e3 } },
  },
  { topology, code: "small-resistor-to-ground", raised: { parts: { rb: 99 } }, quiet: { parts: { rb: 100 } } },
  { topology, code: "large-feedback-resistor", raised: { parts: { rf: 1.01e6 } }, quiet: { parts: { rf: 1e6 } } },
  {
    topology,
    code: "capacitor-near-stray",
    raised: { parts: { c1: 10e-9, c2: 219e-12 } },
    quiet: { parts: { c1: 220e-12, c2: 220e-12 } },
  },
  {
    topology,
    code: "source-loads-input",
    raised: { parts: { ra: 22e3 }, conditions: { sourceResistance: 441 } },
    quiet: { parts: { ra: 22e3 }, conditions: { sourceResistance: 440 } },
  },
  {
    topology,
    code: "class-2-ceramic",
    raised: { conditions: { dielectric: "class-2" } },
    quiet: { conditions: { dielectric: "film-or-class-1" } },
  },
  {
    topology,
    code: "retune-misses-target",
    // Every board reaches 938.4 to 1061.2 Hz (mfb.bot_wc and mfb.top_wc of the worked values).
    raised: { parts: withPot, targets: { centreFrequency: 1062 } },
    quiet: { parts: withPot, targets: { centreFrequency: 1061 } },
  },
  {
    topology,
    code: "retune-misses-target",
    raised: { parts: withPot, targets: { centreFrequency: 938 } },
    quiet: { parts: withPot, targets: { centreFrequency: 939 } },
  },
  {
    topology,
    code: "retune-misses-target",
    // Tolerances wider than the pot's range leave no centre that every board reaches.
    raised: { parts: withPot, conditions: { capacitorTolerance: 0.2 }, targets: { centreFrequency: 1000 } },
    quiet: { parts: { rbPot: 0 }, conditions: { capacitorTolerance: 0.2 }, targets: { centreFrequency: 1000 } },
  },
  {
    topology,
    code: "output-clips",
    raised: { conditions: { sourceRms: 10, sourceBandwidth: 20e3 } },
    quiet: { conditions: { sourceRms: 8, sourceBandwidth: 20e3 } },
  },
  {
    topology,
    code: "heavy-load",
    raised: { conditions: { loadResistance: 9.9e3 } },
    quiet: { conditions: { loadResistance: 10e3 } },
  },
];
