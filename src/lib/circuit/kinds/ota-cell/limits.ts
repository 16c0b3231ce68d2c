import type { Limit } from "../../stage/topology.ts";
import type { Parts, ResultValues } from "../../stage/values.ts";
import type { C, R } from "./figures.ts";
import { swingOn } from "../../device/opAmp.ts";
import type { resistorLoadResults } from "./results.ts";
import { perCent } from "../../stage/shown.ts";

const mostSineDistortion = 5e-3;
const mostNoiseDistortion = 10 ** (-31 / 20);
const plannedBias = 1e-3;
const ratedCurrent = 2e-3;
const ratedInput = 5;
const loudestThumpDb = -30;
const trimMargin = 1.2;
const mostMismatch = 5e-3;
const mostSourceShare = 0.02;

/** Two inputs, bias pin and diode pin. */
const openPins = 4;

type OtaLimit = Limit<Parts, C, R>;

/** What the trade warns of in an amplifier cell (trade brief 2.6). */
export const limits: readonly OtaLimit[] = [
  {
    code: "sine-distorts",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "pair-derivation",
    template: "The sine is distorted by {value}, more than {limit}. Divide it down further, or use the diodes.",
    check: ({ conditions, results: { distortion } }) =>
      conditions.signal === "sine" && distortion !== undefined && distortion > mostSineDistortion
        ? { value: distortion, limit: mostSineDistortion }
        : undefined,
  },
  {
    code: "noise-distorts",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "pair-derivation",
    template:
      "What is not the noise scaled is {value} of it, more than {limit} (−31 dB). Divide it down further, or use the diodes.",
    check: ({ conditions, results: { distortion } }) =>
      conditions.signal === "noise" && distortion !== undefined && distortion > mostNoiseDistortion
        ? { value: distortion, limit: mostNoiseDistortion }
        : undefined,
  },
  {
    code: "bias-over-rating",
    severity: "fault",
    unit: "A",
    source: "dual-ota",
    template: "The bias current is {value}; the pin stands {limit} and is destroyed beyond it.",
    check: ({ conditions: { biasCurrent } }) =>
      biasCurrent > ratedCurrent ? { value: biasCurrent, limit: ratedCurrent } : undefined,
  },
  {
    code: "bias-over-plan",
    severity: "caution",
    unit: "A",
    source: "practice",
    template: "The bias current is {value}; plan for {limit} at most.",
    check: ({ conditions: { biasCurrent } }) =>
      biasCurrent > plannedBias && biasCurrent <= ratedCurrent ? { value: biasCurrent, limit: plannedBias } : undefined,
  },
  {
    code: "diodes-over-rating",
    severity: "fault",
    unit: "A",
    source: "dual-ota",
    template: "The diode current is {value}; the diodes stand {limit}.",
    check: ({ conditions: { diodeCurrent } }) =>
      diodeCurrent > ratedCurrent ? { value: diodeCurrent, limit: ratedCurrent } : undefined,
  },
  {
    code: "input-over-rating",
    severity: "fault",
    unit: "V",
    source: "dual-ota",
    template: "Behind the divider stand {value} at the peak; the inputs stand {limit} between them.",
    check: ({ results: { inputPeak } }) =>
      inputPeak !== undefined && inputPeak > ratedInput ? { value: inputPeak, limit: ratedInput } : undefined,
  },
  {
    code: "ota-clips",
    severity: "caution",
    unit: "V",
    source: "pair-derivation",
    template:
      "The peak would be {value} but the bias current ends it at {limit}: the amplifier cell is the clipper. Divide the signal down, or raise the current.",
    check: ({ results: { inputPeak, effectiveTransconductance, ceiling, gain, attenuation } }) => {
      if (inputPeak === undefined || effectiveTransconductance === undefined) return undefined;
      const wanted = (inputPeak * gain!) / attenuation!;
      return wanted > ceiling! ? { value: wanted, limit: ceiling! } : undefined;
    },
  },
  {
    code: "op-amp-clips",
    severity: "caution",
    unit: "V",
    source: "memory",
    template:
      "The ceiling of {value} lies above the {limit} that the op amp behind can swing: the op amp is the clipper. Lower the resistor that sets the gain.",
    check: ({ conditions, results: { ceiling } }) => {
      const swing = swingOn(conditions);
      return ceiling! > swing ? { value: ceiling!, limit: swing } : undefined;
    },
  },
  {
    code: "thump",
    severity: "caution",
    unit: "dB",
    source: "practice",
    template:
      "The envelope alone puts out a thump at {value} against the peak signal, louder than {limit}, and no trim is fitted.",
    check: ({ conditions, results: { thumpDb } }) =>
      conditions.trimResistance === null && thumpDb !== undefined && thumpDb > loudestThumpDb
        ? { value: thumpDb, limit: loudestThumpDb }
        : undefined,
  },
  {
    code: "trim-too-small",
    severity: "caution",
    unit: "V",
    source: "practice",
    template: "The trim reaches {value} either way; the worst sum of offsets needs {limit}, margin included.",
    check: ({ results: { trimRange, offsetSum } }) =>
      trimRange !== undefined && trimRange < trimMargin * offsetSum!
        ? { value: trimRange, limit: trimMargin * offsetSum! }
        : undefined,
  },
  {
    code: "unequal-inputs-with-diodes",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "pair-derivation",
    template:
      "With the diodes in use the two inputs see resistances that differ by {value}, more than {limit}: half the diode current through the difference outweighs the amplifier's own offset.",
    check: ({ parts, conditions }) => {
      if (conditions.diodeCurrent === 0) return undefined;
      const series = parts["rin"]! + conditions.sourceResistance;
      const seen = (series * parts["rsh"]!) / (series + parts["rsh"]!);
      const value = Math.abs(1 - (conditions.balanceResistance ?? seen) / seen) + conditions.resistanceMismatch;
      return value > mostMismatch ? { value, limit: mostMismatch } : undefined;
    },
  },
  {
    code: "source-in-divider",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "practice",
    template:
      "The source resistance is {value} of the divider, above {limit}: a pot in front changes the gain as it turns. Buffer it.",
    check: ({ parts, conditions: { sourceResistance } }) => {
      const value = sourceResistance / (parts["rin"]! + parts["rsh"]!);
      return value > mostSourceShare ? { value, limit: mostSourceShare } : undefined;
    },
  },
  {
    code: "stiff-bias-drive",
    severity: "caution",
    unit: "A",
    source: "dual-ota",
    template:
      "Nothing limits the current into the bias pin: it may pass {limit} and the part with it, though {value} is meant. Put a resistor in series.",
    check: ({ conditions: { biasDrive, biasCurrent } }) =>
      biasDrive === "voltage" ? { value: biasCurrent, limit: ratedCurrent } : undefined,
  },
  {
    code: "open-half",
    severity: "caution",
    unit: "",
    source: "memory",
    template:
      "Open pins of the unused half: {value}, and {limit} is allowed. Leakage into its bias pin turns it on. Ground its inputs, and keep its bias and diode pins without current.",
    check: ({ conditions: { otherHalf } }) => (otherHalf === "open" ? { value: openPins, limit: 0 } : undefined),
  },
];

export const resistorLoadLimits: readonly OtaLimit[] = [
  ...limits.filter(({ code }) => code !== "op-amp-clips"),
  {
    code: "load-too-large",
    severity: "caution",
    unit: "Ω",
    source: "pair-derivation",
    template:
      "The load is larger than {limit}: the bias current through {value} would pass the swing, and the amplifier saturates.",
    check: ({ parts, results }) => {
      const { largestLoad } = results as ResultValues<typeof resistorLoadResults>;
      return parts["rl"]! > largestLoad! * (1 + 1e-12) ? { value: parts["rl"]!, limit: largestLoad! } : undefined;
    },
  },
];
