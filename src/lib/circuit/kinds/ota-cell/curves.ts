import { currentShare, smallSignalTransconductance } from "../../device/ota.ts";
import type { Curve } from "../../stage/curve.ts";
import type { ConditionValues } from "../../stage/values.ts";
import { type C, type OtaStage, levelsOf } from "./figures.ts";
import { attenuation, ofNoise, ofSine, pairInput } from "./model.ts";

interface OtaState {
  parts: Readonly<Record<string, number>>;
  conditions: ConditionValues<C>;
}

const volts = (quantity: string) => ({ quantity, unit: "V", scale: "linear" }) as const;
/** Source levels are drawn up to here where none is given, V behind the divider. */
const drawnInput = 0.1;

/** Transfer, distortion and gain of any amplifier cell, and its response given by `magnitudeAt`. */
export function otaCurves<S extends OtaState>(
  stageOf: (state: S) => OtaStage,
  magnitudeAt: (state: S, frequency: number) => number,
): Curve<S>[] {
  const peakOf = (state: S) => {
    const { input } = stageOf(state);
    return (levelsOf(input, state.conditions)?.peak ?? drawnInput) / attenuation(input);
  };
  return [
    {
      id: "transfer",
      name: "Output over input",
      x: volts("Source voltage"),
      y: volts("Output voltage, polarity aside"),
      domain: (state) => [-2 * peakOf(state), 2 * peakOf(state)],
      defined: [-1000, 1000],
      lines: (state) => {
        const { input, load } = stageOf(state);
        const [pair, k] = [pairInput(input), attenuation(input)];
        const { biasCurrent } = state.conditions;
        const slope = k * smallSignalTransconductance(pair, biasCurrent) * load;
        return [
          { id: "now", label: "as set", at: (x) => biasCurrent * load * currentShare(pair, k * x) },
          { id: "small", label: "small signals", at: (x) => slope * x },
        ];
      },
      mark: (state) => ({ x: peakOf(state), label: "peak" }),
    },
    {
      id: "distortion",
      name: "Distortion over input level",
      x: { quantity: "Source voltage, peak of a sine or RMS of noise", unit: "V", scale: "logarithmic" },
      y: { quantity: "Distortion", unit: "dB", scale: "linear" },
      domain: (state) => {
        const { input } = stageOf(state);
        return [1e-3 / attenuation(input), 0.2 / attenuation(input)];
      },
      defined: [1e-9, 1000],
      lines: (state) => {
        const { input } = stageOf(state);
        const [pair, k] = [pairInput(input), attenuation(input)];
        const db = (ratio: number) => 20 * Math.log10(ratio);
        const sine = { id: "sine", label: "sine", at: (x: number) => db(ofSine(pair, k * x).distortion) };
        const noise = { id: "noise", label: "noise", at: (x: number) => db(ofNoise(pair, k * x).distortion) };
        const [now, other] = state.conditions.signal === "sine" ? [sine, noise] : [noise, sine];
        return [{ ...now, id: "now" }, other];
      },
      mark: (state) => {
        const levels = levelsOf(stageOf(state).input, state.conditions);
        if (!levels) return undefined;
        const x = (state.conditions.signal === "sine" ? levels.peak : levels.rms) / attenuation(stageOf(state).input);
        return { x, label: "as set" };
      },
    },
    {
      id: "gain",
      name: "Gain over bias current",
      x: { quantity: "Bias current", unit: "A", scale: "logarithmic" },
      y: { quantity: "Gain", unit: "dB", scale: "linear" },
      domain: ({ conditions }) => [conditions.biasCurrent / 1000, conditions.biasCurrent],
      defined: [1e-12, 10],
      lines: (state) => {
        const { input, load } = stageOf(state);
        const factor = attenuation(input) * smallSignalTransconductance(pairInput(input), 1) * load;
        return [{ id: "now", label: "as set", at: (x) => 20 * Math.log10(factor * x) }];
      },
      mark: ({ conditions }) => ({ x: conditions.biasCurrent, label: "peak" }),
      window: ({ gain }) => gain && { y: [20 * Math.log10(gain.least), 20 * Math.log10(gain.most)] },
    },
    {
      id: "magnitude",
      name: "Magnitude",
      x: { quantity: "Frequency", unit: "Hz", scale: "logarithmic" },
      y: { quantity: "Gain", unit: "dB", scale: "linear" },
      domain: () => [100, 1e6],
      defined: [Number.MIN_VALUE, Number.MAX_VALUE],
      lines: (state) => [{ id: "now", label: "as set", at: (x) => 20 * Math.log10(magnitudeAt(state, x)) }],
      mark: (state) => ({ x: stageOf(state).bandwidth, label: "−3 dB" }),
    },
  ];
}
