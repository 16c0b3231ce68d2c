import { headroomToRail } from "../../device/opAmp.ts";
import { correlationOf, scaledMix, sumOfWaves, type AudioSignal, type Signal } from "../../stage/signal.ts";
import type { AnalysedState, Joint, Joints, JointState } from "../../stage/joint.ts";
import type { PlainConditions } from "../../stage/defaults.ts";
import { paths } from "./fields.ts";

/** The rails are no condition of this stage; those of the trade. */
const usualRail = 12;

const input = (path: number): Joint => ({
  fitted: ({ parts }) => parts[`r${path}`]! > 0,
  takes: ({ rms, resistance }: AudioSignal) => ({ [`level${path}`]: rms, [`source${path}`]: resistance }),
  asks: ({ parts }) => (parts[`r${path}`]! > 0 ? { resistance: parts[`r${path}`]! } : {}),
});

/** Up to eight sounds in, their sum out. */
export const joints: Joints = {
  ...Object.fromEntries(paths.map((path) => [`in${path}`, input(path)])),
  out: { gives: sumOut },
};

const weightOf = ({ parts, conditions }: JointState, path: number, signal: AudioSignal): number =>
  parts.rf! / (parts[`r${path}`]! + (signal.resistance || (conditions[`source${path}`] as number)));

function weighted(inputs: AnalysedState["inputs"], state: JointState) {
  return paths.flatMap((path) => {
    const signal = inputs[`in${path}`] as AudioSignal | undefined;
    if (!signal || !(state.parts[`r${path}`]! > 0)) return [];
    const gain = weightOf(state, path, signal);
    return [{ path, signal, gain, rms: signal.rms * gain, mix: scaledMix(signal.mix, gain) }];
  });
}

/** Parity and correlation of the paths, told by the waves themselves: the loudest one counts as even. */
export function meets(inputs: Readonly<Record<string, Signal | undefined>>, state: JointState): PlainConditions {
  const waves = weighted(inputs, state).sort((a, b) => b.rms - a.rms);
  const [loudest, next] = waves;
  if (!loudest || !next) return {};
  return {
    correlation: Math.min(1, Math.abs(correlationOf(loudest, next))),
    ...Object.fromEntries(
      waves.map((wave) => [`parity${wave.path}`, correlationOf(loudest, wave) < 0 ? "odd" : "even"]),
    ),
  };
}

function sumOut(state: AnalysedState): AudioSignal | undefined {
  const waves = weighted(state.inputs, state);
  if (waves.length === 0) return undefined;
  const { rms, mix } = sumOfWaves(waves);
  return {
    sort: "audio",
    rms,
    signal: waves.every(({ signal }) => signal.signal === "sine") ? "sine" : "noise",
    resistance: 0,
    floor: Math.hypot(...waves.map(({ signal, gain }) => signal.floor * gain)),
    clip: usualRail - headroomToRail,
    mix: scaledMix(mix, -1),
  };
}
