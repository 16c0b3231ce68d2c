import type { AnalysedState, Joints } from "../../stage/joint.ts";
import { scaledMix, type AudioSignal, type ControlSignal } from "../../stage/signal.ts";

/** Sound and an envelope in, sound out; the envelope is loaded by the collector. */
export const joints: Joints = {
  in: {
    takes: ({ rms, resistance }: AudioSignal) => ({ sourceRms: rms, sourceResistance: resistance }),
    asks: ({ parts }) => ({ resistance: parts.ri! }),
  },
  control: {
    takes: ({ peak, rest, timeConstant }: ControlSignal) => ({
      controlVoltage: peak,
      controlRest: rest,
      decayTimeConstant: timeConstant,
    }),
    asks: ({ results }) => (typeof results?.envelopeLoad === "number" ? { resistance: results.envelopeLoad } : {}),
  },
  out: { gives: soundOf },
};

function soundOf({ parts, results, inputs }: AnalysedState): AudioSignal | undefined {
  const source = inputs.in as AudioSignal | undefined;
  const { outputRms, correlation, bleedRms, inverting } = results;
  if (!source || typeof outputRms !== "number") return undefined;
  const gain = source.rms > 0 ? outputRms / source.rms : 0;
  return {
    sort: "audio",
    rms: outputRms,
    signal: "noise",
    // The collector resistor stays in the path while the transistor is off.
    resistance: 1 / (1 / parts.rc! + 1 / parts.ro!),
    floor: typeof bleedRms === "number" ? bleedRms : 0,
    mix: scaledMix(source.mix, inverting === 1 ? -gain : gain, typeof correlation === "number" ? correlation : 1),
  };
}
