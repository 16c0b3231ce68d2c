import type { Limit } from "../../stage/topology.ts";
import type { Parts } from "../../stage/values.ts";
import { peakOf, type C, type R } from "./figures.ts";

/** What the trade warns of in an output driver (trade brief 2.17). */
export const limits: readonly Limit<Parts, C, R>[] = [
  {
    code: "no-swing",
    severity: "fault",
    unit: "V",
    source: "memory",
    template: "The rails leave {value} of swing, not above {limit}: there is no headroom to speak of. Raise the rails.",
    check: ({ results }) => (results.swing === 0 ? { value: 0, limit: 0 } : undefined),
  },
  {
    code: "output-clips",
    severity: "caution",
    unit: "V",
    source: "memory",
    template: "Peaks of {value} pass the {limit} that the op amp can swing. Lower the gain or the level.",
    check: ({ conditions, results }) => {
      const peak = peakOf(results.gain ?? 0, conditions);
      return results.swing! > 0 && peak > results.swing! ? { value: peak, limit: results.swing! } : undefined;
    },
  },
  {
    code: "unprotected-output",
    severity: "caution",
    unit: "Ω",
    source: "practice",
    template:
      "R_o is {value}, below {limit}, and nothing else limits the current: a plug half in, or two outputs joined, may end the op amp.",
    check: ({ parts, conditions }) =>
      parts["ro"]! < 470 && conditions.currentLimiting === "unlimited"
        ? { value: parts["ro"]!, limit: 470 }
        : undefined,
  },
  {
    code: "large-output-resistor",
    severity: "caution",
    unit: "Ω",
    source: "practice",
    template: "R_o is {value}, above {limit}: the level depends on how many inputs the jack drives.",
    check: ({ parts }) => (parts["ro"]! > 2.2e3 ? { value: parts["ro"]!, limit: 2.2e3 } : undefined),
  },
  {
    code: "slow-slewing",
    severity: "caution",
    unit: "Hz",
    source: "inverting-note",
    template: "At full swing the op amp follows up to {value} only, below {limit}: loud highs turn into triangles.",
    check: ({ results: { slewLimit } }) =>
      slewLimit !== undefined && slewLimit < 20e3 ? { value: slewLimit, limit: 20e3 } : undefined,
  },
  {
    code: "dc-at-jack",
    severity: "caution",
    unit: "V",
    source: "practice",
    template:
      "{value} of DC at the jack, above {limit}, with no capacitor behind R_o: the next stage clicks and shifts.",
    check: ({ results: { outputOffset } }) =>
      outputOffset !== undefined && outputOffset > 20e-3 ? { value: outputOffset, limit: 20e-3 } : undefined,
  },
  {
    code: "coupling-cuts-bass",
    severity: "caution",
    unit: "Hz",
    source: "practice",
    template:
      "The coupling corner is {value}, above {limit}: it takes the bottom of the voice. Take a larger capacitor.",
    check: ({ results: { couplingCorner = 0, outputCorner = 0 } }) => {
      const corner = Math.max(couplingCorner, outputCorner);
      return corner > 20 ? { value: corner, limit: 20 } : undefined;
    },
  },
  {
    code: "thump-passes",
    severity: "caution",
    unit: "Hz",
    source: "practice",
    template:
      "The coupling corner is {value}, below the {limit} (five times that of the envelope's decay) that would hold its thump back. Take a smaller capacitor, or couple earlier.",
    check: ({ conditions: { thumpTimeConstant }, results: { couplingCorner = 0, outputCorner = 0 } }) => {
      if (thumpTimeConstant === null) return undefined;
      const [corner, wanted] = [Math.max(couplingCorner, outputCorner), 5 / (2 * Math.PI * thumpTimeConstant)];
      return corner < wanted ? { value: corner, limit: wanted } : undefined;
    },
  },
];
