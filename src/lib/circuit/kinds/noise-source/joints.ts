import type { Draw } from "../../stage/draw.ts";
import type { AnalysedState, Joints } from "../../stage/joint.ts";
import { ownMix, type AudioSignal } from "../../stage/signal.ts";

/** Noise bandwidth of one pole over its corner. */
const onePole = Math.PI / 2;

/** The junction's current runs from the upper rail to ground. */
export const junctionDraw = ({ results: { junctionCurrent } }: AnalysedState): Draw[] =>
  typeof junctionCurrent === "number" ? [{ label: "noise junction", positive: junctionCurrent, negative: 0 }] : [];

/** Noise out: the wave that all paths of a voice share. */
export const joints: Joints = {
  out: {
    gives({ results }): AudioSignal | undefined {
      const { rms, noiseBandwidth, swing, gain, amplifierDensity } = results;
      if (typeof rms !== "number" || typeof noiseBandwidth !== "number") return undefined;
      const amplifier = typeof gain === "number" && typeof amplifierDensity === "number" ? gain * amplifierDensity : 0;
      return {
        sort: "audio",
        rms,
        signal: "noise",
        resistance: 0,
        bandwidth: noiseBandwidth / onePole,
        floor: amplifier * Math.sqrt(noiseBandwidth),
        ...(typeof swing === "number" && { clip: swing }),
        mix: ownMix(rms),
      };
    },
  },
};
