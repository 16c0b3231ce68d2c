import type { Limit } from "../../stage/topology.ts";
import type { Conditions, Parts, Results } from "../../stage/values.ts";
import { idealRange } from "./model.ts";
import type { inputConditions, inputResults } from "./fields.ts";

type Shared<P extends Parts, C extends Conditions, R extends Results> = Limit<
  P,
  C & typeof inputConditions,
  R & typeof inputResults
>;

/** What the trade warns of at any trigger input (trade brief 2.1). */
export function sharedLimits<P extends Parts, C extends Conditions, R extends Results>(): readonly Limit<P, C, R>[] {
  const limits: readonly Limit<Parts, typeof inputConditions, typeof inputResults>[] = [
    {
      code: "threshold-low",
      severity: "caution",
      unit: "V",
      source: "practice",
      template:
        "The threshold is {value}, below {limit}: ground noise and the tails of slow modulation fire it. Raise it.",
      check: ({ results: { threshold } }) =>
        threshold !== undefined && threshold < 1 ? { value: threshold, limit: 1 } : undefined,
    },
    {
      code: "threshold-high",
      severity: "caution",
      unit: "V",
      source: "practice",
      template:
        "The threshold is {value}, above {limit}: a 5 V gate that lost a little on its cable is missed. Lower it.",
      check: ({ results: { threshold } }) =>
        threshold !== undefined && threshold > 3.5 ? { value: threshold, limit: 3.5 } : undefined,
    },
    {
      code: "low-input-resistance",
      severity: "caution",
      unit: "Ω",
      source: "practice",
      template:
        "The input resistance is {value}, below {limit}: several inputs on one output load it down. Take larger resistors at the input.",
      check: ({ results: { inputResistance } }) =>
        inputResistance !== undefined && inputResistance < 47e3 ? { value: inputResistance, limit: 47e3 } : undefined,
    },
    {
      code: "pulse-too-short-to-charge",
      severity: "caution",
      unit: "",
      source: "derivation",
      template:
        "The pulse lasts {value} charging time constants, fewer than {limit}: the peak is more than 5 % short and depends on the pulse width. Lengthen the pulse, or charge through less.",
      check: ({ conditions, results }) => fillLimit(conditions.chargeTimeConstant, results.pulseWidth, 0, 3),
    },
    {
      code: "pulse-barely-charges",
      severity: "note",
      unit: "",
      source: "derivation",
      template:
        "The pulse lasts {value} charging time constants, fewer than {limit}: the peak is more than 1 % short of full. Lengthen the pulse if that matters.",
      check: ({ conditions, results }) => fillLimit(conditions.chargeTimeConstant, results.pulseWidth, 3, 4.6),
    },
    {
      code: "hold-audible",
      severity: "caution",
      unit: "s",
      source: "practice",
      template:
        "The pulse lasts {value}, longer than {limit}: the hold is heard as a step before the decay. Shorten it.",
      check: ({ results: { pulseWidth } }) =>
        pulseWidth !== undefined && pulseWidth > 10e-3 ? { value: pulseWidth, limit: 10e-3 } : undefined,
    },
    {
      code: "lock-out-short",
      severity: "caution",
      unit: "s",
      source: "bounce",
      template:
        "The lock-out of {value} is shorter than {limit}: a button bounces for 1.6 ms on average and up to 6.2 ms, and a hit doubles. Lengthen the lock-out.",
      check: ({ conditions: { lockOut } }) =>
        lockOut !== null && lockOut < 7e-3 ? { value: lockOut, limit: 7e-3 } : undefined,
    },
    {
      code: "velocity-range",
      severity: "caution",
      unit: "dB",
      source: "practice",
      template:
        "A 5 : 1 velocity gives {value} more or less than the ideal 13.98 dB, beyond {limit}: the diode drop bends it. Put the diode inside the op amp's loop.",
      check: ({ results: { velocityRangeDb } }) => {
        if (velocityRangeDb === undefined) return undefined;
        const error = Math.abs(velocityRangeDb - idealRange);
        return error > 2 ? { value: error, limit: 2 } : undefined;
      },
    },
  ];
  return limits as unknown as readonly Shared<P, C, R>[] as unknown as readonly Limit<P, C, R>[];
}

function fillLimit(tau: number | null, width: number | undefined, least: number, limit: number) {
  if (tau === null || width === undefined) return undefined;
  const ratio = width / tau;
  return ratio >= least && ratio < limit ? { value: ratio, limit } : undefined;
}
