import type { Joints } from "../../stage/joint.ts";
import type { BiasSignal } from "../../stage/signal.ts";

/** A current in, its copy out. */
export const joints: Joints = {
  in: {
    takes: ({ peak }: BiasSignal) => ({ referenceCurrent: peak }),
    asks: ({ parts }) => (parts.r1 === undefined ? {} : { degeneration: parts.r1 }),
  },
  out: {
    gives({ results: { outputCurrent, ratio }, inputs }): BiasSignal | undefined {
      if (typeof outputCurrent !== "number") return undefined;
      const rest = (inputs.in as BiasSignal | undefined)?.rest ?? 0;
      // The ratio is the one at the peak; at rest it is only told roughly by it.
      return { sort: "bias", peak: outputCurrent, rest: rest * (typeof ratio === "number" ? ratio : 1) };
    },
    bears: ({ voltage }) => ({ outputVoltage: voltage }),
  },
};
