import type { Joints } from "../../stage/joint.ts";
import type { ControlSignal, TriggerSignal } from "../../stage/signal.ts";

/** A pulse in, a decaying voltage out. */
export const joints: Joints = {
  in: {
    takes: ({ height, width }: TriggerSignal) => ({ pulseHeight: height, pulseWidth: width }),
    asks: ({ parts }) => ({ resistance: parts.rs!, timeConstant: parts.rs! * parts.c! }),
  },
  out: {
    gives({ results }): ControlSignal | undefined {
      const { peakVoltage, pedestal, timeConstant } = results;
      if (typeof peakVoltage !== "number" || typeof timeConstant !== "number") return undefined;
      return {
        sort: "control",
        peak: peakVoltage,
        rest: typeof pedestal === "number" ? pedestal : 0,
        resistance: 0,
        timeConstant,
      };
    },
    bears: ({ resistance, deadBand }, { conditions }) => ({
      // Behind the buffer no load reaches the capacitor, but a dead band is heard all the same.
      ...(conditions.output === "capacitor" && { loadResistance: resistance ?? null }),
      deadBand,
    }),
  },
};
