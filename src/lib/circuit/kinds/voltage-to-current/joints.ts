import type { Draw } from "../../stage/draw.ts";
import type { AnalysedState, Joint, Joints } from "../../stage/joint.ts";
import type { BiasSignal, ControlSignal } from "../../stage/signal.ts";

/** The current comes from the upper rail, through what takes it up, and goes to ground. */
export const sinkDraw = ({ results: { outputCurrent } }: AnalysedState): Draw[] =>
  typeof outputCurrent === "number"
    ? [{ label: "converter, in a hit", positive: outputCurrent, negative: 0, onlyInHits: true }]
    : [];

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
