import { scaledMix, type AudioSignal } from "../../stage/signal.ts";
import type { Joints, JointState } from "../../stage/joint.ts";

/** Sound in, the jack out. */
export const driverJoints = (inputResistance: (state: JointState) => number | undefined): Joints => ({
  in: {
    takes: ({ rms, signal, resistance }: AudioSignal) => ({ sourceRms: rms, signal, sourceResistance: resistance }),
    asks(state) {
      const resistance = inputResistance(state);
      return resistance === undefined ? {} : { resistance };
    },
  },
  out: {
    // Linked to another stage it is no jack: that stage counts R_o as its source's resistance.
    bears: () => ({ loadResistance: null, cableCapacitance: 0 }),
    gives({ parts, results, inputs }): AudioSignal | undefined {
      const source = inputs.in as AudioSignal | undefined;
      const { outputRms, inverting, swing, noiseFloor, loadLossDb } = results;
      if (!source || typeof outputRms !== "number" || typeof swing !== "number") return undefined;
      const gain = source.rms > 0 ? outputRms / source.rms : 0;
      const loss = typeof loadLossDb === "number" ? 10 ** (loadLossDb / 20) : 1;
      return {
        sort: "audio",
        rms: outputRms,
        signal: source.signal,
        resistance: parts.ro!,
        floor: Math.hypot(typeof noiseFloor === "number" ? noiseFloor * loss : 0, source.floor * gain),
        clip: swing * loss,
        mix: scaledMix(source.mix, inverting === 1 ? -gain : gain),
      };
    },
  },
});
