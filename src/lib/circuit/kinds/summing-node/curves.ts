import { magnitudeDbAt } from "../../network/transfer.ts";
import type { Curve } from "../../stage/curve.ts";
import { fittedPaths, sumOf, type SumState } from "./analyse.ts";
import { sumRms, transferOf } from "./model.ts";

const magnitude: Curve<SumState> = {
  id: "magnitude",
  name: "Gain of each path",
  x: { quantity: "Frequency", unit: "Hz", scale: "logarithmic" },
  y: { quantity: "Gain", unit: "dB", scale: "linear" },
  domain: () => [20, 10e6],
  defined: [Number.MIN_VALUE, Number.MAX_VALUE],
  lines: (state) =>
    fittedPaths(state).map(({ path, resistance }, k) => {
      const transfer = transferOf(sumOf(state), resistance);
      return {
        id: k === 0 ? "now" : `path-${path}`,
        label: `path ${path}`,
        at: (frequency) => magnitudeDbAt(transfer, frequency),
      };
    }),
};

/** The level against the correlation, with the parity as set and with every path alike; nothing to draw without levels. */
const level: Curve<SumState> = {
  id: "level",
  name: "Level over correlation",
  x: { quantity: "Correlation", unit: "", scale: "linear" },
  y: { quantity: "Level", unit: "V", scale: "linear" },
  domain: () => [0, 1],
  defined: [0, 1],
  lines: (state) => {
    const playing = fittedPaths(state).map(({ level: own, sign, resistance }) => ({
      level: ((own ?? 1) * state.parts.rf) / resistance,
      sign,
    }));
    const sizes = playing.map((one) => one.level);
    const set = playing.map(({ sign }) => sign);
    const alike = sizes.map(() => 1);
    const against = sizes.map((_, k) => (k === sizes.indexOf(Math.max(...sizes)) ? -1 : 1));
    return [
      { id: "now", label: "as set", at: (correlation) => sumRms(sizes, set, correlation) },
      { id: "adding", label: "all adding", at: (correlation) => sumRms(sizes, alike, correlation) },
      { id: "opposing", label: "loudest against the rest", at: (correlation) => sumRms(sizes, against, correlation) },
    ];
  },
  mark: (state) => ({ x: state.conditions.correlation, label: "as set" }),
};

export const curves = [magnitude, level];
