import type { LimitCase } from "../../support/limitCase.ts";

/** The limits that both topologies share, with parts of each that lie to either side. */
const shared = (
  topology: string,
  parts: Record<"low" | "lowQuiet" | "high" | "highQuiet" | "small" | "smallQuiet", Record<string, number>>,
  width: number,
): LimitCase[] => [
  { topology, code: "threshold-low", raised: { parts: parts.low }, quiet: { parts: parts.lowQuiet } },
  { topology, code: "threshold-high", raised: { parts: parts.high }, quiet: { parts: parts.highQuiet } },
  { topology, code: "low-input-resistance", raised: { parts: parts.small }, quiet: { parts: parts.smallQuiet } },
  {
    topology,
    code: "pulse-too-short-to-charge",
    raised: { conditions: { chargeTimeConstant: width / 2.95 } },
    quiet: { conditions: { chargeTimeConstant: width / 3.05 } },
  },
  {
    topology,
    code: "pulse-barely-charges",
    raised: { conditions: { chargeTimeConstant: width / 4.55 } },
    quiet: { conditions: { chargeTimeConstant: width / 4.65 } },
  },
  {
    topology,
    code: "lock-out-short",
    raised: { conditions: { lockOut: 6.9e-3 } },
    quiet: { conditions: { lockOut: 7e-3 } },
  },
  {
    topology,
    code: "velocity-range",
    // 20·log((5 − d)/(1 − d)) is 2 dB over 20·log 5 at d = 0.2445.
    raised: { conditions: { velocity: 5, velocityDrop: 0.25 } },
    quiet: { conditions: { velocity: 5, velocityDrop: 0.24 } },
  },
];

const transistor = "transistor-threshold";
const comparator = "comparator";

export const limitCases: readonly LimitCase[] = [
  ...shared(
    transistor,
    {
      low: { rb: 151e3 },
      lowQuiet: { rb: 149e3 },
      high: { rb: 20.6e3 },
      highQuiet: { rb: 20.8e3 },
      small: { ra: 26e3, rb: 20e3 },
      smallQuiet: { ra: 27e3, rb: 20.5e3 },
    },
    1.2555e-3,
  ),
  {
    topology: transistor,
    code: "no-trigger",
    raised: { conditions: { pulseHeight: 1.9 } },
    quiet: { conditions: { pulseHeight: 2 } },
  },
  {
    topology: transistor,
    code: "no-trigger",
    // The slowest edge that still fires takes 4.1 ms.
    raised: { conditions: { riseTime: 4.5e-3 } },
    quiet: { conditions: { riseTime: 3.5e-3 } },
  },
  {
    topology: transistor,
    code: "slow-edge",
    raised: { conditions: { riseTime: 0.85e-3 } },
    quiet: { conditions: { riseTime: 0.78e-3 } },
  },
  {
    topology: transistor,
    code: "hold-audible",
    raised: { parts: { cd: 180e-9 } },
    quiet: { parts: { cd: 170e-9 } },
  },
  {
    topology: transistor,
    code: "base-reversed",
    raised: { parts: { rb: 150e3 }, conditions: { clamp: "none", pulseHeight: 10 } },
    quiet: { parts: { rb: 150e3 }, conditions: { clamp: "fitted", pulseHeight: 10 } },
  },
  {
    topology: transistor,
    code: "base-reversed",
    raised: { parts: { rb: 150e3 }, conditions: { clamp: "none", lowestInput: -9, pulseHeight: 5 } },
    quiet: { parts: { rb: 150e3 }, conditions: { clamp: "none", lowestInput: -8, pulseHeight: 5 } },
  },
  {
    topology: transistor,
    code: "heavy-edge",
    raised: { parts: { rd: 9.5e3 } },
    quiet: { parts: { rd: 9.7e3 } },
  },
  {
    // Both reached results: a button's latency and a width through the junction.
    topology: transistor,
    code: "threshold-low",
    raised: { parts: { rb: 151e3 }, conditions: { buttonTimeConstant: 10e-3, beta: 100 } },
    quiet: { parts: { rb: 47e3 }, conditions: { buttonTimeConstant: 10e-3, beta: 100 } },
  },
  ...shared(
    comparator,
    {
      low: { rh: 2e6, rr2: 3.5e3 },
      lowQuiet: { rh: 2e6, rr2: 4.2e3 },
      high: { rr2: 23.2e3 },
      highQuiet: { rr2: 22.4e3 },
      small: { rin: 22e3, rh: 24e3 },
      smallQuiet: { rin: 22e3, rh: 26e3 },
    },
    10e-3,
  ),
  {
    topology: comparator,
    code: "no-trigger",
    raised: { conditions: { pulseHeight: 3.2 } },
    quiet: { conditions: { pulseHeight: 3.3 } },
  },
  {
    topology: comparator,
    code: "hold-audible",
    raised: { conditions: { gateLength: 10.1e-3 } },
    quiet: { conditions: { gateLength: 10e-3 } },
  },
  {
    topology: comparator,
    code: "slow-edge",
    raised: { conditions: { differentiator: 1e-3, riseTime: 1.01e-3 } },
    quiet: { conditions: { differentiator: 1e-3, riseTime: 1e-3 } },
  },
  {
    topology: comparator,
    code: "phase-reversal",
    raised: { conditions: { lowestInput: -8 } },
    quiet: { conditions: { lowestInput: -7.6 } },
  },
  {
    topology: comparator,
    code: "phase-reversal",
    raised: { conditions: { lowestInput: -8, buttonTimeConstant: 10e-3 } },
    quiet: { conditions: { lowestInput: 0, buttonTimeConstant: 10e-3 } },
  },
];
