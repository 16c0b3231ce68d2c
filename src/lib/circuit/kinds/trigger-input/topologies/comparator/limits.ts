import type { Limit } from "../../../../stage/topology.ts";
import { sharedLimits } from "../../limits.ts";
import type { C, P, R } from "./analyse.ts";

/** How far above its negative rail a JFET-input op amp must keep its inputs. From memory. */
const commonModeRoom = 4;

export const limits: readonly Limit<P, C, R>[] = [
  {
    code: "no-trigger",
    severity: "fault",
    unit: "V",
    source: "derivation",
    template:
      "A pulse of {value} does not give one pulse at the output: the thresholds are {limit} rising and {detail} falling, and both must lie between ground and the pulse. Move the threshold, or take less hysteresis.",
    check: ({ conditions, results }) =>
      results.pulseWidth === undefined
        ? {
            value: conditions.pulseHeight,
            limit: results.threshold!,
            detail: `${results.fallingThreshold!.toPrecision(3)} V`,
          }
        : undefined,
  },
  {
    code: "slow-edge",
    severity: "caution",
    unit: "s",
    source: "derivation",
    template:
      "The edge takes {value}, longer than the differentiator's {limit}: less than 63 % of the step reaches the comparator. Take a larger time constant in front.",
    check: ({ conditions: { riseTime, differentiator } }) =>
      riseTime !== null && differentiator !== null && riseTime > differentiator
        ? { value: riseTime, limit: differentiator }
        : undefined,
  },
  {
    code: "phase-reversal",
    severity: "caution",
    unit: "V",
    source: "jfet-op-amp",
    template:
      "The plus input goes down to {value}, below the {limit} that a JFET-input op amp stands: its output may reverse. Clamp the input, or take a comparator.",
    check: ({ conditions, results: { lowestPin } }) => {
      const limit = conditions.railNegative + commonModeRoom;
      return lowestPin! < limit ? { value: lowestPin!, limit } : undefined;
    },
  },
  ...sharedLimits<P, C, R>(),
];
