import { electricalAngle } from "../../parts/electricalAngle.ts";
import { swingOn } from "../../device/opAmp.ts";
import { crestOf } from "../../stage/signal.ts";
import type { Limit } from "../../stage/topology.ts";
import type { Conditions, Parts } from "../../stage/values.ts";
import type { outputNoise, potConditions, responseResults, retuneResults, surroundings } from "./fields.ts";
import { perCent } from "../../stage/shown.ts";

type SharedConditions = typeof surroundings;
type SharedResults = typeof responseResults & typeof outputNoise & typeof retuneResults;
type SharedLimit<P extends Parts = Parts, C extends Conditions = Pick<SharedConditions, "dielectric">> = Limit<
  P,
  C,
  SharedResults
>;

/** Capacitors as they are bought and fitted; the source ids are those of `sources.ts`. */
export const capacitorLimits: readonly SharedLimit[] = [
  {
    code: "capacitor-near-stray",
    severity: "caution",
    unit: "F",
    source: "practice",
    template:
      "The smaller capacitor is {value}, below {limit}: stray capacitance moves the centre. Take larger capacitors and smaller resistors.",
    check: ({ parts }) => {
      const least = Math.min(parts["c1"]!, parts["c2"]!);
      return least < 220e-12 ? { value: least, limit: 220e-12 } : undefined;
    },
  },
  {
    code: "class-2-ceramic",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "dielectrics",
    template:
      "Class 2 ceramic in a filter: its capacitance falls with voltage by {value} and more (at most {limit} is sound here), ages and is microphonic. Take film or class 1.",
    check: ({ conditions }) => (conditions.dielectric === "class-2" ? { value: 0.2, limit: 0.05 } : undefined),
  },
];

/** An op amp at the output. */
export const outputLimits: readonly SharedLimit<Parts, SharedConditions>[] = [
  {
    code: "output-clips",
    severity: "caution",
    unit: "V",
    source: "memory",
    template:
      "Noise peaks of {value} (four times RMS) pass the {limit} that the op amp can swing. Lower the gain or the noise.",
    check: ({ conditions, results }) => {
      if (results.outputRms === undefined) return undefined;
      const [peak, swing] = [crestOf.noise * results.outputRms, swingOn(conditions)];
      return peak > swing ? { value: peak, limit: swing } : undefined;
    },
  },
  {
    code: "heavy-load",
    severity: "caution",
    unit: "Ω",
    source: "jfet-op-amp",
    template:
      "The load is {value}; output swing is guaranteed into {limit} and more. Expect less swing, and buffer a load of a few kilohms.",
    check: ({ conditions }) =>
      conditions.loadResistance !== null && conditions.loadResistance < 10e3
        ? { value: conditions.loadResistance, limit: 10e3 }
        : undefined,
  },
];

/** A source in front of an input resistor: it adds to it, and changes with the wiper of a pot in front. */
export function sourceLimit(
  inputPart: string,
  name: string,
  source: string,
): SharedLimit<Parts, Pick<SharedConditions, "sourceResistance">> {
  return {
    code: "source-loads-input",
    severity: "caution",
    unit: "",
    shown: perCent,
    source,
    template: `The source resistance is {value} of ${name}, above {limit}: it changes the response. The figures here include it; a pot in front changes it as it turns.`,
    check: ({ parts, conditions }) => {
      const share = conditions.sourceResistance / parts[inputPart]!;
      return share > 0.02 ? { value: share, limit: 0.02 } : undefined;
    },
  };
}

/** No figure could be read off the response: why, at the op amp's speed where it has one. */
export function oscillationLimit(
  source: string,
  template: string,
): Limit<Parts, Pick<SharedConditions, "gainBandwidth">, SharedResults> {
  return {
    code: "oscillates",
    severity: "fault",
    unit: "Hz",
    source,
    template,
    check: ({ conditions, results }) =>
      results.centreFrequency === undefined ? { value: conditions.gainBandwidth ?? 0, limit: 0 } : undefined,
  };
}

/** At an end of the pot's travel the network has no centre, though it has one as it stands: that end's figures are left out. */
export function retuneEndLimit(
  pots: readonly string[],
): Limit<Parts, Pick<typeof potConditions, "rotation">, SharedResults> {
  return {
    code: "no-centre-at-pot-end",
    severity: "fault",
    unit: "°",
    source: "practice",
    template:
      "With the pot at {value} there is no centre, though there is one at the {limit} where it stands: the circuit oscillates there, or its op amp is too slow. Put a fixed resistor in series with the pot, or take a smaller pot.",
    check({ parts, conditions, results: { centreFrequency, retuneLow, retuneHigh } }) {
      const fitted = pots.some((pot) => parts[pot]! > 0);
      if (!fitted || centreFrequency === undefined) return undefined;
      if (retuneLow !== undefined && retuneHigh !== undefined) return undefined;
      return {
        value: retuneHigh === undefined ? 0 : electricalAngle,
        limit: conditions.rotation * electricalAngle,
      };
    },
  };
}

/** The target's centre lies outside what the pot reaches. */
export const retuneLimit: Limit<Parts, typeof potConditions, SharedResults> = {
  code: "retune-misses-target",
  severity: "caution",
  unit: "Hz",
  source: "practice",
  template: "The centre of {value} that is asked for lies outside the pot's range: the nearest it reaches is {limit}.",
  check: ({ results, windows }) => {
    const wanted = windows["centreFrequency"]?.target;
    const { retuneLow: low, retuneHigh: high } = results;
    if (wanted === undefined || low === undefined || high === undefined) return undefined;
    // A pot that may be left out, and is, has both ends in one place.
    if (low === high || (wanted >= low && wanted <= high)) return undefined;
    return { value: wanted, limit: wanted < low ? low : high };
  },
};
