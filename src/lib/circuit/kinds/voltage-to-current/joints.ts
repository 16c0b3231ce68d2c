import type { Joint, Joints } from "../../stage/joint.ts";
import type { BiasSignal, ControlSignal } from "../../stage/signal.ts";

/** The envelope in, a current out. */
export const converterJoints = (asks: NonNullable<Joint["asks"]>): Joints => ({
  in: { takes: ({ peak, rest }: ControlSignal) => ({ controlVoltage: peak, controlRest: rest }), asks },
  out: {
    gives({ results: { outputCurrent, floorCurrent } }): BiasSignal | undefined {
      if (typeof outputCurrent !== "number") return undefined;
      return { sort: "bias", peak: outputCurrent, rest: typeof floorCurrent === "number" ? floorCurrent : 0 };
    },
    bears: ({ degeneration }) => ({ mirrorDegeneration: degeneration }),
  },
});
