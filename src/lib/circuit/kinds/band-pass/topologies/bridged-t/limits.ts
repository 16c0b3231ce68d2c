import { swingOn } from "../../../../device/opAmp.ts";
import type { Limit } from "../../../../stage/topology.ts";
import { capacitorLimits, outputLimits, retuneLimit, sourceLimit } from "../../limits.ts";
import { withRheostat } from "../../model.ts";
import type { C, P, R } from "./analyse.ts";
import { perCent } from "../../../../stage/shown.ts";

const source = "bridged-t-derivation";

/** What the trade warns of in this network (trade brief 2.9). */
export const limits: readonly Limit<P, C, R>[] = [
  {
    code: "does-not-ring",
    severity: "fault",
    unit: "",
    source,
    template:
      "Q is {value}, not above {limit}: the poles are real and nothing rings, so there is no ring time. Raise R_2 over R_1.",
    check: ({ results: { qualityFactor, ringTime60 } }) =>
      qualityFactor !== undefined && ringTime60 === undefined ? { value: qualityFactor, limit: 0.5 } : undefined,
  },
  {
    code: "large-bridge-resistor",
    severity: "caution",
    unit: "Ω",
    source: "practice",
    template:
      "R_2 is {value}, above {limit}: board leakage sets the ring time with it (10 MΩ beside 1 MΩ cost 4.7 % of Q). Take larger capacitors.",
    check: ({ parts }) => (parts.r2 > 1e6 ? { value: parts.r2, limit: 1e6 } : undefined),
  },
  {
    code: "small-leg-resistor",
    severity: "caution",
    unit: "Ω",
    source: "practice",
    template: "The leg is {value}, below {limit}: track and wiper resistance become part of the pitch.",
    check: ({ parts, conditions }) => {
      const leg = withRheostat(parts.r1, parts.r1Pot, conditions.potLaw, conditions.rotation);
      return leg < 100 ? { value: leg, limit: 100 } : undefined;
    },
  },
  {
    code: "ring-clips",
    severity: "caution",
    unit: "V",
    source: "memory",
    template:
      "The struck ring would reach {value}, past the {limit} that the op amp can swing: it clips. Strike it lower or shorter, or raise R_in.",
    check: ({ conditions, results: { ringPeak } }) => {
      const swing = swingOn(conditions);
      return ringPeak !== undefined && ringPeak > swing ? { value: ringPeak, limit: swing } : undefined;
    },
  },
  {
    code: "strike-too-long",
    severity: "caution",
    unit: "",
    shown: perCent,
    source,
    template:
      "The strike lasts {value} of a period, longer than {limit}: its end kills the ring or doubles it, as the pitch falls. Strike shorter.",
    check: ({ conditions, results: { centreFrequency } }) => {
      const share = conditions.strikeWidth * (centreFrequency ?? 0);
      return share > 0.5 ? { value: share, limit: 0.5 } : undefined;
    },
  },
  {
    code: "slow-op-amp",
    severity: "caution",
    unit: "",
    shown: perCent,
    source,
    template:
      "Q·f_0/f_t is {value}, above {limit}: the op amp lowers the pitch by about this share. The figures here include it; another op amp will differ.",
    check: ({ conditions, results: { centreFrequency, qualityFactor } }) => {
      if (conditions.gainBandwidth === null || centreFrequency === undefined) return undefined;
      const share = (qualityFactor! * centreFrequency) / conditions.gainBandwidth;
      return share > 0.01 ? { value: share, limit: 0.01 } : undefined;
    },
  },
  {
    code: "quality-near-buzzing",
    severity: "caution",
    unit: "",
    source: "practice",
    template:
      "Q is {value}, above {limit}: one part's tolerance from feeling like a buzz, and microphonic. Ask for a shorter ring.",
    check: ({ results: { qualityFactor } }) =>
      qualityFactor !== undefined && qualityFactor > 30 ? { value: qualityFactor, limit: 30 } : undefined,
  },
  sourceLimit("rin", "R_in", source),
  ...capacitorLimits,
  retuneLimit,
  ...outputLimits,
];
