import { scaledMix, type AudioSignal, type BiasSignal } from "../../stage/signal.ts";
import type { Draw } from "../../stage/draw.ts";
import type { AnalysedState, Joints } from "../../stage/joint.ts";
import { swingOn, type Rails } from "../../device/opAmp.ts";

/** Volts that the bias pin stands above the negative rail: 1.2 to 1.4. From memory. */
const pinAboveRail = 1.3;
/** RMS of noise at the pair that keeps distortion below −31 dB. */
const mostNoise = 10e-3;
/** Peak of a sine there that keeps its harmonics at 0.5 %. */
const mostSine = 13e-3;

/** The bias current passes from the upper rail through the pin to the lower one. */
export const biasDraw = ({ conditions }: AnalysedState): Draw[] => [
  { label: "bias", positive: conditions.biasCurrent as number, negative: conditions.biasCurrent as number },
];

/** Sound and a bias current in, sound out; the output resistance is that of the topology. */
export const cellJoints = (outputResistance: (parts: Record<string, number>) => number): Joints => ({
  in: {
    takes: ({ rms, signal, resistance }: AudioSignal) => ({
      signal,
      sourceRms: rms > 0 ? rms : null,
      sourcePeak: signal === "sine" && rms > 0 ? rms * Math.SQRT2 : null,
      sourceResistance: resistance,
    }),
    asks: ({ parts }) => ({ resistance: parts.rin! + parts.rsh! }),
  },
  bias: {
    takes: ({ peak }: BiasSignal) => ({ biasCurrent: peak }),
    asks: ({ conditions }) => ({ voltage: (conditions.railNegative as number) + pinAboveRail }),
  },
  out: {
    gives: (state) => soundOf(state, outputResistance(state.parts)),
  },
});

function soundOf({ conditions, results, inputs }: AnalysedState, resistance: number): AudioSignal | undefined {
  const source = inputs.in as AudioSignal | undefined;
  const bias = inputs.bias as BiasSignal | undefined;
  const { gain, inverting, ceiling, compressionDb, distortion, noiseRms, inputRms } = results;
  if (!source || typeof gain !== "number" || typeof ceiling !== "number") return undefined;
  const bent = gain * 10 ** (numberOr(compressionDb, 0) / 20);
  const fidelity = 1 / Math.hypot(1, numberOr(distortion, 0));
  const rms = (source.rms * bent) / fidelity;
  const openness = bias && bias.peak > 0 ? bias.rest / bias.peak : 0;
  const { signal } = source;
  return {
    sort: "audio",
    rms,
    signal,
    resistance,
    // Between hits: what the rest current still lets through, and the cell's own noise at that current.
    floor: Math.hypot(source.rms * gain * openness, numberOr(noiseRms, 0) * Math.sqrt(openness)),
    clip: Math.min(ceiling, swingOn(conditions as unknown as Rails)),
    mix: scaledMix(source.mix, inverting === 1 ? -bent : bent),
    ...(source.bandwidth !== undefined && { bandwidth: source.bandwidth }),
    ...(typeof inputRms === "number" && {
      inside: [
        { label: "behind the divider", rms: inputRms, most: signal === "noise" ? mostNoise : mostSine / Math.SQRT2 },
      ],
    }),
  };
}

const numberOr = (value: number | readonly number[] | undefined, other: number): number =>
  typeof value === "number" ? value : other;
