import { swingOn, type Rails } from "../../device/opAmp.ts";
import type { Joints, JointState } from "../../stage/joint.ts";
import { ownMix, type AudioSignal, type TriggerSignal } from "../../stage/signal.ts";

interface Shape {
  /** Ω that the source sees, near the centre. */
  input: (parts: JointState["parts"]) => number;
  /** No op amp that could clip. */
  passive?: true;
  /** Rings when a pulse strikes it. */
  struck?: true;
}

const strike = {
  insteadOf: "in",
  takes: ({ height, width }: TriggerSignal) => ({ strikeVoltage: height, strikeWidth: width }),
};

/** Sound in, its band out: a wave of its own, for what the filter leaves has little in common with what it is fed. */
export const filterJoints = ({ input, passive, struck }: Shape): Joints => ({
  in: {
    takes: ({ rms, signal, resistance, bandwidth }: AudioSignal) => ({
      sourceResistance: resistance,
      sourceRms: signal === "noise" && rms > 0 ? rms : null,
      sourceBandwidth: bandwidth,
    }),
    asks: ({ parts }) => ({ resistance: input(parts) }),
  },
  ...(struck && { strike }),
  out: {
    gives({ conditions, results, inputs }): AudioSignal | undefined {
      const source = inputs.in as AudioSignal | undefined;
      const { outputRms, ringPeak } = results;
      const rings = inputs.strike !== undefined && typeof ringPeak === "number";
      // Silence in is silence out, though a level of zero is no figure that the filter computes with.
      const passed = source?.rms === 0 ? 0 : outputRms;
      const rms = rings ? ringPeak / Math.SQRT2 : passed;
      if (typeof rms !== "number" || (!source && !rings)) return undefined;
      return {
        sort: "audio",
        rms,
        signal: rings ? "sine" : "noise",
        // An op amp's, or counted with its load already.
        resistance: 0,
        floor: source && !rings && source.rms > 0 ? source.floor * (rms / source.rms) : 0,
        ...(!passive && { clip: swingOn(conditions as unknown as Rails) }),
        mix: ownMix(rms),
      };
    },
    bears: ({ resistance }) => ({ loadResistance: resistance ?? null }),
  },
});
