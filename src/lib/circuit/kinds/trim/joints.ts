import type { AnalysedState, Joints } from "../../stage/joint.ts";
import { scaledMix, type AudioSignal, type ControlSignal } from "../../stage/signal.ts";

/** What the divider leaves of what stands across it, as set. */
function shareOf({ conditions, results }: AnalysedState): number | undefined {
  return typeof results.value === "number" ? results.value / (conditions.referenceVoltage as number) : undefined;
}

const resistanceOf = ({ results: { wiperResistance } }: AnalysedState): number =>
  typeof wiperResistance === "number" ? wiperResistance : 0;

const asks = ({ parts }: { parts: Record<string, number> }) => ({
  resistance: parts.rTop! + parts.rPot! + parts.rBottom!,
});
const bears = ({ resistance }: { resistance?: number }) => ({ loadResistance: resistance ?? null });

/** A voltage or a sound across the pot, a share of it at the wiper. */
export const dividerJoints: Joints = {
  in: { takes: ({ peak }: ControlSignal) => ({ referenceVoltage: peak }), asks },
  out: {
    gives(state): ControlSignal | undefined {
      const source = state.inputs.in as ControlSignal | undefined;
      const share = shareOf(state);
      if (!source || share === undefined) return undefined;
      return { ...source, peak: source.peak * share, rest: source.rest * share, resistance: resistanceOf(state) };
    },
    bears,
  },
  soundIn: { asks },
  soundOut: {
    gives(state): AudioSignal | undefined {
      const source = state.inputs.soundIn as AudioSignal | undefined;
      const loaded = shareOf(state);
      if (!source || loaded === undefined) return undefined;
      // Without the load: what takes the sound counts the wiper's resistance as that of its source.
      const { loadResistance } = state.conditions;
      const share = typeof loadResistance === "number" ? loaded * (1 + resistanceOf(state) / loadResistance) : loaded;
      const { clip: _, inside: __, ...passed } = source;
      return {
        ...passed,
        rms: source.rms * share,
        floor: source.floor * share,
        resistance: resistanceOf(state),
        mix: scaledMix(source.mix, share),
      };
    },
    bears,
  },
};
