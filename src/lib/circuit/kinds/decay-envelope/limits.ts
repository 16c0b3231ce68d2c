import type { Limit } from "../../stage/topology.ts";
import { chargingOf, dischargeAt, type C, type P, type R } from "./analyse.ts";
import { perCent } from "../../stage/shown.ts";

/** What a usual op amp gives before its short-circuit limit takes over. From memory. */
const opAmpCurrent = 20e-3;

/** What the trade warns of in this network (trade brief 2.2). */
export const limits: readonly Limit<P, C, R>[] = [
  {
    code: "never-charges",
    severity: "fault",
    unit: "V",
    source: "derivation",
    template:
      "The pulse of {value} does not lift the capacitor above ground: it takes more than {limit} to open the diode. Raise the pulse.",
    check: ({ parts, conditions, results }) => {
      if (results.peakVoltage !== undefined) return undefined;
      const { rest } = dischargeAt({ parts, conditions });
      const { diode } = chargingOf({ parts, conditions });
      return { value: conditions.pulseHeight, limit: Math.max(0, rest) + (typeof diode === "number" ? diode : 0) };
    },
  },
  {
    code: "inside-dead-band",
    severity: "fault",
    unit: "V",
    source: "derivation",
    template:
      "The peak of {value} stays within the dead band of {limit}: the stage that follows does nothing. Raise the pulse or take away the dead band.",
    check: ({ conditions, results: { peakVoltage } }) =>
      peakVoltage !== undefined && peakVoltage <= conditions.deadBand
        ? { value: peakVoltage, limit: conditions.deadBand }
        : undefined,
  },
  {
    code: "never-closes",
    severity: "fault",
    unit: "V",
    source: "derivation",
    template:
      "The capacitor comes to rest at {value}, above the {limit} that is 60 dB under the peak as the next stage hears it: the voice never closes. Take a buffer of less bias current, or less resistance.",
    check: ({ parts, conditions, results: { peakVoltage, audibleDecayTime60 } }) => {
      if (peakVoltage === undefined || peakVoltage <= conditions.deadBand || audibleDecayTime60 !== undefined)
        return undefined;
      const limit = conditions.deadBand + 1e-3 * (peakVoltage - conditions.deadBand);
      return { value: dischargeAt({ parts, conditions }).rest, limit };
    },
  },
  {
    code: "charge-current",
    severity: "caution",
    unit: "A",
    source: "memory",
    template:
      "The charge asks for {value} at first; an op amp stops at about {limit}, and then the peak follows the current and the pulse width, not this figure. Raise R_S or charge through an emitter follower.",
    check: ({ results: { peakChargeCurrent } }) =>
      peakChargeCurrent !== undefined && peakChargeCurrent > opAmpCurrent
        ? { value: peakChargeCurrent, limit: opAmpCurrent }
        : undefined,
  },
  {
    code: "knob-changes-level",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "practice",
    template:
      "R_S is {value} of R_min, above {limit}: the decay knob changes the loudness too. Lower R_S or raise R_min.",
    check: ({ parts }) => (parts.rs / parts.rMin > 0.02 ? { value: parts.rs / parts.rMin, limit: 0.02 } : undefined),
  },
  {
    code: "short-pulse",
    severity: "caution",
    unit: "",
    source: "practice",
    template:
      "The pulse lasts {value} charging time constants, fewer than {limit}: the level depends on its width. Lengthen the pulse or lower R_S.",
    check: ({ conditions, results }) => {
      if (conditions.pulseWidth === null) return undefined;
      const ratio = conditions.pulseWidth / results.chargeTimeConstant!;
      return ratio < 3 ? { value: ratio, limit: 3 } : undefined;
    },
  },
  {
    code: "load-shortens-decay",
    severity: "caution",
    unit: "",
    source: "derivation",
    template:
      "The load is {value} times the longest discharge resistance, under {limit}: the long end is more than 9 % shorter than without it. The figures include it; a load that draws more while it sounds, such as a transistor cell, does not stay put. Buffer the envelope.",
    check: ({ parts, conditions }) => {
      if (conditions.loadResistance === null) return undefined;
      const ratio = conditions.loadResistance / (parts.rMin + parts.rPot);
      return ratio < 10 ? { value: ratio, limit: 10 } : undefined;
    },
  },
  {
    code: "pedestal",
    severity: "caution",
    unit: "dB",
    source: "derivation",
    template:
      "The bias leaves {value} of the peak on the capacitor, above {limit}: the voice does not fall silent. Take a buffer with JFET inputs, or less resistance.",
    check: ({ results: { pedestalDb } }) =>
      pedestalDb !== undefined && pedestalDb > -60 ? { value: pedestalDb, limit: -60 } : undefined,
  },
  {
    code: "dead-band-shortens",
    severity: "note",
    unit: "",
    shown: perCent,
    source: "derivation",
    template:
      "The dead band is {value} of the peak, above {limit}: read the decay as heard, not the −60 dB time of the capacitor.",
    check: ({ conditions, results: { peakVoltage } }) => deadBandShare(conditions.deadBand, peakVoltage, 0.01, 0.05),
  },
  {
    code: "tail-chopped",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "practice",
    template:
      "The dead band is {value} of the peak, above {limit}: the tail is cut off audibly. Return the decay to a small voltage of its own, or drive a stage without a dead band.",
    check: ({ conditions, results: { peakVoltage } }) =>
      deadBandShare(conditions.deadBand, peakVoltage, 0.05, Infinity),
  },
  {
    code: "class-2-ceramic",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "dielectrics",
    template:
      "Class 2 ceramic loses {value} and more of its capacitance to the voltage on it (at most {limit} is sound here): the early decay is faster than the late one. It ages and is microphonic. Take film.",
    check: ({ conditions }) => (conditions.dielectric === "class-2" ? { value: 0.2, limit: 0.05 } : undefined),
  },
  {
    code: "electrolytic",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "memory",
    template:
      "An electrolytic strays by {value} and more (at most {limit} is sound here) and leaks: every board decays differently. Take film.",
    check: ({ conditions }) => (conditions.dielectric === "electrolytic" ? { value: 0.2, limit: 0.1 } : undefined),
  },
];

function deadBandShare(deadBand: number, peak: number | undefined, least: number, most: number) {
  if (peak === undefined || peak <= deadBand) return undefined;
  const share = deadBand / peak;
  return share > least && share <= most ? { value: share, limit: least } : undefined;
}
