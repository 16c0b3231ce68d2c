import type { Limit } from "../../stage/topology.ts";
import { mostHits, type C, type P, type R } from "./analyse.ts";
import { perCent } from "../../stage/shown.ts";

/** What the trade warns of in this network (trade brief 2.3). */
export const limits: readonly Limit<P, C, R>[] = [
  {
    code: "does-not-oscillate",
    severity: "fault",
    unit: "V",
    source: "derivation",
    template:
      "The capacitor rests at {value} and must lie below the upper threshold of {limit} and be able to reach both thresholds: there is no burst. Lower the rest, or take a comparator of less bias current.",
    check: ({ conditions, results: { spacing, thresholdShare } }) =>
      spacing === undefined
        ? { value: conditions.restVoltage, limit: thresholdShare! * conditions.outputHigh }
        : undefined,
  },
  {
    code: "no-gate",
    severity: "fault",
    unit: "V",
    source: "derivation",
    template:
      "The gate is charged to {value}, not above its threshold of {limit}: it never opens. Lower the threshold.",
    check: ({ conditions, results: { gateLength } }) =>
      gateLength === undefined ? { value: conditions.gateSource, limit: conditions.gateThreshold } : undefined,
  },
  {
    code: "too-many-hits",
    severity: "fault",
    unit: "",
    source: "practice",
    template: "The gate holds {value} hits, more than {limit}: their times are not listed. Shorten the gate.",
    check: ({ results: { hits } }) =>
      hits !== undefined && hits > mostHits ? { value: hits, limit: mostHits } : undefined,
  },
  {
    code: "count-can-change",
    severity: "caution",
    unit: "",
    source: "derivation",
    template:
      "At worst case a board gives {value} hits instead of {limit}: the gate and the spacing stray apart. Centre the gate, or take closer parts.",
    check: ({ results: { hits, hitsLeast, hitsMost } }) => {
      if (hits === undefined || hitsLeast === undefined || hitsMost === undefined) return undefined;
      if (hitsLeast < hits) return { value: hitsLeast, limit: hits };
      return hitsMost > hits ? { value: hitsMost, limit: hits } : undefined;
    },
  },
  {
    code: "first-interval",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "practice",
    template:
      "The first interval differs from the others by {value} of them, more than {limit}: the capacitor does not rest at the lower threshold. Hold it there between bursts.",
    check: ({ results: { firstIntervalError } }) =>
      firstIntervalError !== undefined && Math.abs(firstIntervalError) > 0.1
        ? { value: Math.abs(firstIntervalError), limit: 0.1 }
        : undefined,
  },
  {
    code: "hits-merge",
    severity: "caution",
    unit: "dB",
    source: "practice",
    template: "The shallowest valley is {value}, above {limit}: the hits merge. Shorten the decay of each hit.",
    check: ({ results: { valleyDb, firstValleyDb } }) => {
      if (valleyDb === undefined || firstValleyDb === undefined) return undefined;
      const shallowest = Math.max(valleyDb, firstValleyDb);
      return shallowest > -12 ? { value: shallowest, limit: -12 } : undefined;
    },
  },
  {
    code: "buzz",
    severity: "caution",
    unit: "s",
    source: "practice",
    template:
      "The spacing is {value}, under {limit}: the hits are heard as a buzz, not one by one. Lengthen the spacing.",
    check: ({ results: { spacing } }) =>
      spacing !== undefined && spacing < 5e-3 ? { value: spacing, limit: 5e-3 } : undefined,
  },
  {
    code: "loose-capacitors",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "practice",
    template:
      "Capacitors of {value} with four hits or more: above {limit} the count is a matter of luck. Take capacitors of 5 %.",
    check: ({ conditions: { capacitorTolerance }, results: { hits } }) =>
      hits !== undefined && hits >= 4 && capacitorTolerance >= 0.1
        ? { value: capacitorTolerance, limit: 0.05 }
        : undefined,
  },
  {
    code: "tail-early",
    severity: "caution",
    unit: "s",
    source: "practice",
    template:
      "The tail starts at {value}, before the last hit at {limit}: it fills the valleys. Delay the tail, or shorten the burst.",
    check: ({ results: { tailStart, hitTimes } }) => {
      const last = hitTimes?.at(-1);
      return tailStart !== undefined && last !== undefined && tailStart < last
        ? { value: tailStart, limit: last }
        : undefined;
    },
  },
  {
    code: "bias-shifts-timing",
    severity: "note",
    unit: "V",
    source: "derivation",
    template:
      "The comparator's bias current drops {value} across R_T, more than {limit} (a hundredth of the upper threshold). The figures include it, but parts differ: take a comparator of less bias current, or a smaller R_T.",
    check: ({ conditions, results: { biasShift, thresholdShare } }) => {
      const limit = 0.01 * thresholdShare! * conditions.outputHigh;
      return biasShift! > limit ? { value: biasShift!, limit } : undefined;
    },
  },
];
