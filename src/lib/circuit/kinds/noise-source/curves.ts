import { swingOn } from "../../device/opAmp.ts";
import { crestOf } from "../../stage/signal.ts";
import { cascade, magnitudeAt } from "../../network/transfer.ts";
import { shareBeyond } from "../../numeric/gaussianTail.ts";
import type { Curve } from "../../stage/curve.ts";
import {
  bandLevelOf,
  bandTransferOf,
  boardTransfer,
  hitSpreadOf,
  levelOf,
  sourceDensity,
  type SourceState,
} from "./analyse.ts";
import { bandPassTransfer, spreadRule } from "./model.ts";
import { perCent } from "../../stage/shown.ts";

const positive = [Number.MIN_VALUE, Number.MAX_VALUE] as const;
const decibels = (ratio: number) => 20 * Math.log10(ratio);

export const curves: readonly Curve<SourceState>[] = [
  {
    id: "density",
    name: "Density",
    x: { quantity: "Frequency", unit: "Hz", scale: "logarithmic" },
    y: { quantity: "Density", unit: "V/√Hz", scale: "logarithmic" },
    domain: ({ conditions }) => [10, 10 * conditions.bandLimit],
    defined: positive,
    lines: (state) => {
      const density = sourceDensity(state.conditions);
      const board = boardTransfer(state);
      const band = cascade(board, bandTransferOf(state.conditions));
      return [
        { id: "now", label: "board", at: (frequency) => density * magnitudeAt(board, frequency) },
        { id: "band", label: "behind the band-pass", at: (frequency) => density * magnitudeAt(band, frequency) },
      ];
    },
  },
  {
    id: "peaks",
    name: "Share of time beyond a level",
    x: { quantity: "Level, either sign", unit: "V", scale: "linear" },
    y: { quantity: "Share", unit: "", shown: perCent, scale: "logarithmic" },
    // A little past the four standard deviations that are planned for.
    domain: (state) => [0, 4.2 * levelOf(state)],
    defined: [0, Number.MAX_VALUE],
    lines: (state) => {
      const rms = levelOf(state);
      return [{ id: "now", label: "board", at: (level) => shareBeyond(level / rms) }];
    },
    mark: (state) => ({
      x: Math.min(swingOn(state.conditions) || crestOf.noise * levelOf(state), crestOf.noise * levelOf(state)),
      label: "peaks planned for",
    }),
  },
  {
    id: "retune",
    name: "Level behind the band-pass over its centre",
    x: { quantity: "Centre", unit: "Hz", scale: "logarithmic" },
    y: { quantity: "Level over the present one", unit: "dB", scale: "linear" },
    domain: ({ conditions }) => [conditions.centreFrequency / 4, conditions.centreFrequency * 4],
    defined: positive,
    lines: (state) => {
      const { centreFrequency, qualityFactor, peakGain } = state.conditions;
      const now = bandLevelOf(state);
      const at = (centre: number, quality: number) =>
        decibels(bandLevelOf(state, bandPassTransfer(centre, quality, peakGain)) / now);
      return [
        { id: "now", label: "at this Q", at: (centre) => at(centre, qualityFactor) },
        {
          id: "constant-bandwidth",
          label: "at this bandwidth",
          at: (centre) => at(centre, (qualityFactor * centre) / centreFrequency),
        },
      ];
    },
    mark: ({ conditions }) => ({ x: conditions.centreFrequency, label: "as set" }),
  },
  {
    id: "hit-spread",
    name: "Spread from hit to hit",
    x: { quantity: "Length of a hit", unit: "s", scale: "logarithmic" },
    y: { quantity: "Spread", unit: "dB", scale: "linear" },
    domain: ({ conditions }) => [conditions.window / 10, conditions.window * 10],
    defined: positive,
    lines: ({ conditions }) => {
      const statistical = (Math.PI * conditions.centreFrequency) / conditions.qualityFactor;
      return [
        { id: "now", label: "behind the band-pass", at: (window) => decibels(1 + hitSpreadOf(conditions, window)) },
        {
          id: "rule",
          label: "rule for long hits",
          at: (window) => decibels(1 + spreadRule(statistical, window)),
        },
      ];
    },
    mark: ({ conditions }) => ({ x: conditions.window, label: "as set" }),
  },
];
