import type { Limit } from "../../../../stage/topology.ts";
import { capacitorLimits, oscillationLimit, outputLimits, retuneEndLimit } from "../../limits.ts";
import { networkAt, type C, type P, type R } from "./analyse.ts";
import { perCent } from "../../../../stage/shown.ts";

/** What the trade warns of in this network (trade brief 2.7). */
export const limits: readonly Limit<P, C, R>[] = [
  oscillationLimit(
    "mfb-derivation",
    "No peak with two −3 dB points can be read off this response: the network oscillates, or an op amp of {value} is far too slow for it.",
  ),
  {
    code: "gain-near-limit",
    severity: "caution",
    unit: "",
    source: "mfb-derivation",
    template:
      "R_B is less than a part of the network and more of a trim: 2Q²/|H_0| is {value}, and below {limit} small errors of R_A move the centre. Ask for less gain or a higher Q.",
    check: ({ parts, conditions }) => {
      // For any capacitors Q²(C1 + C2)/C1 over |H0| equals 1 + RA/RB.
      const { ra, rb } = networkAt(parts, conditions);
      const ratio = 1 + (ra + conditions.sourceResistance) / rb;
      return ratio <= 1.1 ? { value: ratio, limit: 1.1 } : undefined;
    },
  },
  {
    code: "slow-op-amp",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "mfb-derivation",
    template:
      "Q·f_0/f_t is {value}, above {limit}: the op amp lowers the centre and raises the Q by about this share. The figures here include it, but op amps of one type differ: take a faster one, or trim the centre.",
    check: ({ conditions, results }) => {
      if (conditions.gainBandwidth === null || results.centreFrequency === undefined) return undefined;
      const share = (results.qualityFactor! * results.centreFrequency) / conditions.gainBandwidth;
      return share > 0.01 ? { value: share, limit: 0.01 } : undefined;
    },
  },
  {
    code: "little-loop-gain",
    severity: "caution",
    unit: "",
    source: "practice",
    template:
      "The loop gain at the centre is {value}, below {limit} (26 dB): the response depends on the op amp's own gain-bandwidth. Take a faster op amp, or ask for less Q or gain.",
    check: ({ results }) =>
      results.loopGain !== undefined && results.loopGain < 20 ? { value: results.loopGain, limit: 20 } : undefined,
  },
  {
    code: "small-resistor-to-ground",
    severity: "caution",
    unit: "Ω",
    source: "practice",
    template:
      "R_B in circuit is {value}, below {limit}: track and wiper resistance become part of it. Ask for less Q, or take smaller capacitors.",
    check: ({ parts, conditions }) => {
      const { rb } = networkAt(parts, conditions);
      return rb < 100 ? { value: rb, limit: 100 } : undefined;
    },
  },
  {
    code: "large-feedback-resistor",
    severity: "caution",
    unit: "Ω",
    source: "practice",
    template:
      "R_F is {value}, above {limit}: board leakage and bias current become part of it. Take larger capacitors.",
    check: ({ parts }) => (parts.rf > 1e6 ? { value: parts.rf, limit: 1e6 } : undefined),
  },
  {
    code: "source-loads-input",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "mfb-derivation",
    template:
      "The source resistance is {value} of R_A, above {limit}: it lowers the gain and moves the centre. The figures here include it; a pot in front changes it as it turns. Buffer the source.",
    check: ({ parts, conditions }) => {
      const share = conditions.sourceResistance / parts.ra;
      return share > 0.02 ? { value: share, limit: 0.02 } : undefined;
    },
  },
  {
    code: "retune-misses-target",
    severity: "caution",
    unit: "Hz",
    source: "mfb-derivation",
    template:
      "Not every board can be tuned to the centre of {value}: {detail}. The nearest centre that all reach is {limit}.",
    check: ({ parts, results, windows }) => {
      const wanted = windows["centreFrequency"]?.target;
      if (parts.rbPot === 0 || wanted === undefined) return undefined;
      const { reachLow, reachHigh, centreFrequency } = results;
      if (reachLow === undefined || reachHigh === undefined) {
        // Without a centre at either end there is nothing to reach, which is said by itself.
        const ends = results.retuneLow !== undefined && results.retuneHigh !== undefined;
        return centreFrequency === undefined || !ends
          ? undefined
          : { value: wanted, limit: centreFrequency, detail: "the tolerances are wider than the pot's range" };
      }
      if (wanted < reachLow)
        return { value: wanted, limit: reachLow, detail: "at worst case the low end stays above it" };
      return wanted > reachHigh
        ? { value: wanted, limit: reachHigh, detail: "at worst case the high end stays below it" }
        : undefined;
    },
  },
  retuneEndLimit(["rbPot"]),
  ...capacitorLimits,
  ...outputLimits,
];
