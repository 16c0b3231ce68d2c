import type { Joints, JointState } from "../../stage/joint.ts";
import type { ControlSignal, TriggerSignal } from "../../stage/signal.ts";

/** The pulse that leaves: as high as the velocity makes it, or as the stage's own output where no velocity is given. */
function heightOf({ conditions }: JointState, ownHeight: number): number {
  const { velocity, velocityGain } = conditions;
  return typeof velocity === "number" ? velocity * (velocityGain as number) : ownHeight;
}

/** Trigger and velocity in, one pulse out. */
export const triggerJoints = (ownHeight: (state: JointState) => number): Joints => ({
  in: {
    takes: ({ height }: TriggerSignal) => ({ pulseHeight: height }),
    asks: ({ results }) =>
      typeof results?.inputResistance === "number" ? { resistance: results.inputResistance } : {},
  },
  velocity: { takes: ({ peak }: ControlSignal) => ({ velocity: peak }) },
  out: {
    gives(state): TriggerSignal {
      const width = state.results.pulseWidth;
      return {
        sort: "trigger",
        height: heightOf(state, ownHeight(state)),
        ...(typeof width === "number" && { width }),
      };
    },
    bears: ({ timeConstant }) => ({ chargeTimeConstant: timeConstant }),
  },
});
