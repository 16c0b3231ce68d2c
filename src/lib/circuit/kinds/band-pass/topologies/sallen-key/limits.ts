import type { Limit } from "../../../../stage/topology.ts";
import {
  capacitorLimits,
  oscillationLimit,
  outputLimits,
  retuneEndLimit,
  retuneLimit,
  sourceLimit,
} from "../../limits.ts";
import type { C, P, R } from "./analyse.ts";
import { amplifierGain, centreShift } from "./model.ts";
import { perCent } from "../../../../stage/shown.ts";

/** What the trade warns of in this network (trade brief 2.8). */
export const limits: readonly Limit<P, C, R>[] = [
  oscillationLimit(
    "sallen-key-derivation",
    "No peak with two −3 dB points can be read off this response: the gain makes it oscillate, or an op amp of {value} is far too slow for it.",
  ),
  {
    code: "quality-out-of-hand",
    severity: "fault",
    unit: "",
    source: "sallen-key-derivation",
    template:
      "Q is {value}, above {limit}: each per cent of the gain moves it by 13 % and more. Take another network, or a lower Q.",
    check: ({ results: { qualityFactor } }) =>
      qualityFactor !== undefined && qualityFactor > 5 ? { value: qualityFactor, limit: 5 } : undefined,
  },
  {
    code: "quality-strays",
    severity: "caution",
    unit: "",
    source: "sallen-key-derivation",
    template:
      "Q is {value}, above {limit}: resistors of 1 % in the gain let it stray by more than 8 %. Take 0.1 % parts, or another network.",
    check: ({ conditions, results: { qualityFactor } }) =>
      qualityFactor !== undefined && qualityFactor > 3 && conditions.resistorTolerance >= 0.01
        ? { value: qualityFactor, limit: 3 }
        : undefined,
  },
  {
    code: "tolerance-reaches-oscillation",
    severity: "caution",
    unit: "",
    source: "sallen-key-derivation",
    template:
      "With R_F high and R_G low by their tolerance the gain is {value}, and at {limit} the network oscillates: some boards will.",
    check: ({ parts, conditions, results: { amplifierGain: gain, oscillationGain: most } }) => {
      const t = conditions.resistorTolerance;
      const highest = amplifierGain({ rf: parts.rf * (1 + t), rg: parts.rg * (1 - t) });
      return gain! < most! && highest >= most! ? { value: highest, limit: most! } : undefined;
    },
  },
  {
    code: "retune-moves-quality",
    severity: "caution",
    unit: "",
    source: "sallen-key-derivation",
    template:
      "The pot in series with R_2 changes Q {value} times over its travel{detail}, more than {limit}: the peak gain goes with it. Retune with all three resistors, or take another network.",
    check: ({ parts, results: { retuneQualityLow: low, retuneQualityHigh: high, qualityFactor } }) => {
      if (parts.r2Pot === 0) return undefined;
      // Where an end of the travel oscillates, what is seen up to the present rotation is all there is to say.
      const known = [low, high, qualityFactor].filter((q) => q !== undefined);
      if (known.length === 0) return undefined;
      const ratio = Math.max(...known) / Math.min(...known);
      const ends = low === undefined || high === undefined;
      return ratio > 1.1 || ends
        ? { value: ratio, limit: 1.1, detail: ends ? ", and oscillates at one end" : "" }
        : undefined;
    },
  },
  {
    code: "slow-op-amp",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "sallen-key-derivation",
    template:
      "The op amp lowers the centre and raises Q by about {value}, above {limit}. The figures here include it; another op amp will differ.",
    check: ({ parts, conditions }) => {
      if (conditions.gainBandwidth === null) return undefined;
      const shift = centreShift(parts, conditions.gainBandwidth);
      return shift > 0.01 ? { value: shift, limit: 0.01 } : undefined;
    },
  },
  sourceLimit("r1", "R_1", "sallen-key-derivation"),
  ...capacitorLimits,
  retuneLimit,
  retuneEndLimit(["r2Pot"]),
  ...outputLimits,
];
