import type { Joints } from "../../stage/joint.ts";
import type { ControlSignal, TriggerSignal } from "../../stage/signal.ts";

/** A trigger in, several hits and a tail out. */
export const joints: Joints = {
  in: { takes: ({ height }: TriggerSignal) => ({ gateSource: height }) },
  out: {
    gives({ conditions, results }): ControlSignal {
      const { tailTimeConstant } = results;
      return {
        sort: "control",
        peak: conditions.hitHeight as number,
        rest: 0,
        resistance: 0,
        ...(typeof tailTimeConstant === "number" && { timeConstant: tailTimeConstant }),
      };
    },
  },
};
