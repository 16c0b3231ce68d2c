import { swingOn } from "../../../../device/opAmp.ts";
import { crestOf } from "../../../../stage/signal.ts";
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
import { perCent } from "../../../../stage/shown.ts";

const source = "two-integrator-derivation";

/** What the trade warns of in this network (trade brief 2.10). */
export const limits: readonly Limit<P, C, R>[] = [
  oscillationLimit(
    source,
    "No peak with two −3 dB points can be read off this response: op amps of {value} make the loop oscillate, or are far too slow for it.",
  ),
  {
    code: "op-amps-too-slow",
    severity: "fault",
    unit: "",
    shown: perCent,
    source,
    template:
      "The op amps take {value} of the damping, above {limit}: Q is more than doubled and a slightly slower op amp oscillates. Take faster op amps or a lower Q.",
    check: ({ results: { stabilityMargin } }) =>
      stabilityMargin! < 0.5 ? { value: 1 - stabilityMargin!, limit: 0.5 } : undefined,
  },
  {
    code: "slow-op-amps",
    severity: "caution",
    unit: "",
    shown: perCent,
    source,
    template:
      "The op amps take {value} of the damping, above {limit}: they raise Q by this share. The figures here include it; other op amps will differ.",
    check: ({ results: { stabilityMargin } }) => {
      const lost = 1 - stabilityMargin!;
      return lost > 0.05 && lost <= 0.5 ? { value: lost, limit: 0.05 } : undefined;
    },
  },
  {
    code: "gang-mismatch",
    severity: "caution",
    unit: "dB",
    source: "practice",
    template:
      "The gangs of the pot differ by {value}, more than {limit}: Q changes as the pot is turned. Take a pot whose gangs track, or fixed resistors that swamp it.",
    check: ({ parts, conditions }) => {
      const { gangMismatch } = conditions;
      if (parts.r1Pot === 0 || parts.r2Pot === 0) return undefined;
      return Math.abs(gangMismatch) > 3 ? { value: Math.abs(gangMismatch), limit: 3 } : undefined;
    },
  },
  {
    code: "gangs-unequal",
    severity: "caution",
    unit: "",
    source,
    template:
      "One gang of the retune pot is {value} times the other (more than {limit}): Q moves with the centre. Fit both gangs, of the same value.",
    check: ({ parts: { r1Pot, r2Pot } }) => {
      const [less, more] = [Math.min(r1Pot, r2Pot), Math.max(r1Pot, r2Pot)];
      // A gang that is left out is as if it were far smaller than any that is sold.
      return more > 1.1 * less ? { value: less > more / 1000 ? more / less : 1000, limit: 1.1 } : undefined;
    },
  },
  {
    code: "inner-output-clips",
    severity: "caution",
    unit: "V",
    source: "memory",
    template:
      "Noise peaks of {value} (four times RMS) at the {detail} output pass the {limit} that an op amp can swing, while the band-pass output may look fine. Lower the level or Q.",
    check: ({ conditions, results: { highPassRms, lowPassRms } }) => {
      if (highPassRms === undefined || lowPassRms === undefined) return undefined;
      const [peak, swing] = [crestOf.noise * Math.max(highPassRms, lowPassRms), swingOn(conditions)];
      const detail = highPassRms > lowPassRms ? "high-pass" : "low-pass";
      return peak > swing ? { value: peak, limit: swing, detail } : undefined;
    },
  },
  sourceLimit("ri", "R_i", source),
  ...capacitorLimits,
  retuneLimit,
  retuneEndLimit(["r1Pot", "r2Pot"]),
  ...outputLimits,
];
