import { shareBeyond } from "../../numeric/gaussianTail.ts";
import { magnitudeDbAt, type Transfer } from "../../network/transfer.ts";
import type { Curve } from "../../stage/curve.ts";
import type { ConditionValues } from "../../stage/values.ts";
import { swingOf, type C } from "./figures.ts";
import { perCent } from "../../stage/shown.ts";

interface DriverState {
  conditions: ConditionValues<C>;
}

/**
 * Magnitude at op amp and jack, and how often noise of each level clips.
 *
 * @param gainOf in the middle of the band
 */
export function driverCurves<S extends DriverState>(
  responses: (state: S) => { amplifier: Transfer; jack: Transfer },
  gainOf: (state: S) => number,
): Curve<S>[] {
  return [
    {
      id: "magnitude",
      name: "Magnitude",
      x: { quantity: "Frequency", unit: "Hz", scale: "logarithmic" },
      y: { quantity: "Gain", unit: "dB", scale: "linear" },
      domain: () => [1, 10e6],
      defined: [Number.MIN_VALUE, Number.MAX_VALUE],
      lines: (state) => {
        const { amplifier, jack } = responses(state);
        return [
          { id: "now", label: "at the jack", at: (frequency) => magnitudeDbAt(jack, frequency) },
          { id: "amplifier", label: "at the op amp", at: (frequency) => magnitudeDbAt(amplifier, frequency) },
        ];
      },
      window: ({ gain }) => gain && { y: [20 * Math.log10(gain.least), 20 * Math.log10(gain.most)] },
    },
    {
      id: "clipping",
      name: "Share of time clipped, noise",
      x: { quantity: "Level at the op amp", unit: "V", scale: "logarithmic" },
      y: { quantity: "Share", unit: "", shown: perCent, scale: "logarithmic" },
      // From 4.5 standard deviations to well into clipping.
      domain: (state) => [swingOf(state.conditions) / 4.5 || 1, swingOf(state.conditions) / 0.5 || 10],
      defined: [Number.MIN_VALUE, Number.MAX_VALUE],
      lines: (state) => [{ id: "now", label: "noise", at: (rms) => shareBeyond(swingOf(state.conditions) / rms) }],
      mark: (state) => ({ x: state.conditions.sourceRms * gainOf(state), label: "as set" }),
    },
  ];
}
