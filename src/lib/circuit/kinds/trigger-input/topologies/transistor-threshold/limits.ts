import type { Limit } from "../../../../stage/topology.ts";
import { sharedLimits } from "../../limits.ts";
import type { C, P, R } from "./analyse.ts";
import { offNetwork } from "./model.ts";

/** Reverse voltage that a base-emitter junction stands. */
const reverseLimit = 5;
/** A source of 1 kΩ loses a tenth into this. */
const heavyEdge = 10e3;

export const limits: readonly Limit<P, C, R>[] = [
  {
    code: "no-trigger",
    severity: "fault",
    unit: "V",
    source: "derivation",
    template:
      "The pulse stands at {value} after the differentiator, and the threshold at {limit}: the stage does not fire. Lower the threshold, or expect a higher or steeper pulse.",
    check: ({ results: { pulseWidth, threshold, edgePeak } }) =>
      pulseWidth === undefined || edgePeak! < threshold! ? { value: edgePeak!, limit: threshold! } : undefined,
  },
  {
    code: "slow-edge",
    severity: "caution",
    unit: "s",
    source: "derivation",
    template:
      "The edge takes {value}, longer than the differentiator's {limit}: less than 63 % of the step reaches the threshold. Raise C_D or R_D.",
    check: ({ parts, conditions: { riseTime } }) => {
      const { timeConstant } = offNetwork(parts);
      return riseTime !== null && riseTime > timeConstant ? { value: riseTime, limit: timeConstant } : undefined;
    },
  },
  {
    code: "base-reversed",
    severity: "caution",
    unit: "V",
    source: "breakdown",
    template:
      "Without a clamp the base goes {value} below ground when the gate falls, past {limit}: the junction breaks down and becomes noisy. Fit a diode from ground to the base.",
    check: ({ parts, conditions }) => {
      const swing = Math.max(conditions.pulseHeight, -conditions.lowestInput);
      const reverse = (swing * offNetwork(parts).share * parts.rb) / (parts.ra + parts.rb);
      return conditions.clamp === "none" && reverse > reverseLimit
        ? { value: reverse, limit: reverseLimit }
        : undefined;
    },
  },
  {
    code: "heavy-edge",
    severity: "note",
    unit: "Ω",
    source: "practice",
    template:
      "During the edge the source sees {value}, less than {limit}: an output of 1 kΩ loses more than a tenth. Raise R_A or R_D, or drive the input from a buffer.",
    check: ({ results: { edgeResistance } }) =>
      edgeResistance! < heavyEdge ? { value: edgeResistance!, limit: heavyEdge } : undefined,
  },
  ...sharedLimits<P, C, R>(),
];
