import type { Change, LimitCase } from "../../support/limitCase.ts";

const both = (code: string, raised: Change["conditions"], quiet: Change["conditions"]): LimitCase[] =>
  ["transimpedance", "resistor-load"].map((topology) => ({
    topology,
    code,
    raised: { conditions: raised! },
    quiet: { conditions: quiet! },
  }));

const diodes = { diodeCurrent: 1e-3 };
const offset = { offsetVoltage: 2e-3, sourcePeak: 0.34 };

export const limitCases: readonly LimitCase[] = [
  ...both("sine-distorts", { sourcePeak: 0.45 }, { sourcePeak: 0.42 }),
  ...both(
    "noise-distorts",
    { signal: "noise", sourceRms: 0.36 },
    { signal: "noise", sourceRms: 0.36, diodeCurrent: 1e-3 },
  ),
  ...both("bias-over-rating", { biasCurrent: 2.1e-3 }, { biasCurrent: 1.9e-3 }),
  ...both("bias-over-plan", { biasCurrent: 1.1e-3 }, { biasCurrent: 0.9e-3 }),
  ...both("diodes-over-rating", { diodeCurrent: 2.1e-3 }, { diodeCurrent: 1.5e-3 }),
  ...both("input-over-rating", { sourcePeak: 180 }, { sourcePeak: 160 }),
  ...both("ota-clips", { sourcePeak: 1.8 }, { sourcePeak: 1.7 }),
  { topology: "transimpedance", code: "op-amp-clips", raised: { parts: { rf: 22e3 } }, quiet: { parts: { rf: 20e3 } } },
  ...both("thump", offset, { ...offset, offsetVoltage: 0.2e-3 }),
  ...both(
    "trim-too-small",
    { offsetVoltage: 5e-3, trimResistance: 2.2e6 },
    { offsetVoltage: 4e-3, trimResistance: 2.2e6 },
  ),
  ...both(
    "unequal-inputs-with-diodes",
    { ...diodes, resistanceMismatch: 0.01 },
    { ...diodes, resistanceMismatch: 0.004 },
  ),
  ...both("source-in-divider", { sourceResistance: 12.5e3 }, { sourceResistance: 100 }),
  ...both("stiff-bias-drive", { biasDrive: "voltage" }, { biasDrive: "resistor" }),
  ...both("open-half", { otherHalf: "open" }, { otherHalf: "terminated" }),
  {
    topology: "resistor-load",
    code: "load-too-large",
    raised: { parts: { rl: 22e3 } },
    quiet: { parts: { rl: 20e3 } },
  },
];
