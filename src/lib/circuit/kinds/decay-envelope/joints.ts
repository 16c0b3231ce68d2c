import type { Draw } from "../../stage/draw.ts";
import type { AnalysedState, Joints } from "../../stage/joint.ts";
import type { ControlSignal, TriggerSignal } from "../../stage/signal.ts";

/** What charges the capacitor comes from the rail of whatever drives the pulse. */
export function chargeDraw({ parts, conditions, results }: AnalysedState): Draw[] {
  const { peakChargeCurrent: current, peakVoltage } = results;
  if (typeof current !== "number" || typeof peakVoltage !== "number" || current <= 0) return [];
  const width = conditions.pulseWidth;
  const pulse = { current, timeConstant: parts.rs! * parts.c!, charge: parts.c! * peakVoltage };
  return [
    { label: "envelope", positive: 0, negative: 0, pulse: { ...pulse, ...(typeof width === "number" && { width }) } },
  ];
}

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
