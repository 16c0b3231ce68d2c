import type { Limit } from "../../stage/topology.ts";
import { crestOf } from "../../stage/signal.ts";
import type { C, P, R } from "./analyse.ts";
import { perCent } from "../../stage/shown.ts";

/** Reverse voltage that a base-emitter junction stands. */
const reverseLimit = 5;

/** What the trade warns of in this network (trade brief 2.13). */
export const limits: readonly Limit<P, C, R>[] = [
  {
    code: "law-off",
    severity: "caution",
    unit: "",
    shown: perCent,
    source: "derivation",
    template:
      "The simple law is {value} off here, more than {limit}: plan with the averaged figure, and measure a real part before trusting either.",
    check: ({ results: { lawError } }) =>
      lawError !== undefined && Math.abs(lawError) > 0.1 ? { value: Math.abs(lawError), limit: 0.1 } : undefined,
  },
  {
    code: "silent",
    severity: "caution",
    unit: "V",
    source: "derivation",
    template:
      "Noise peaks of {value} (four times RMS) stay under the {limit} that turns the transistor on: the cell is all but silent. Raise the drive.",
    check: ({ conditions, results: { onVoltage } }) => {
      const peak = crestOf.noise * conditions.sourceRms;
      return peak < onVoltage! ? { value: peak, limit: onVoltage! } : undefined;
    },
  },
  {
    code: "base-reversed",
    severity: "caution",
    unit: "V",
    source: "breakdown",
    template:
      "Noise peaks and the self-bias take the base {value} below ground, past {limit}: the junction breaks down and becomes noisy. Lower the drive, or clamp the base.",
    check: ({ results: { baseLowest } }) =>
      -baseLowest! > reverseLimit ? { value: -baseLowest!, limit: reverseLimit } : undefined,
  },
  {
    code: "thump-passes",
    severity: "caution",
    unit: "Hz",
    source: "practice",
    template:
      "The output's corner is {value}, below {limit} (five times that of the envelope): the thump, larger than the noise, comes through. Take a smaller C_o.",
    check: ({ conditions: { decayTimeConstant }, results: { outputCorner } }) => {
      if (decayTimeConstant === null) return undefined;
      const limit = 5 / (2 * Math.PI * decayTimeConstant);
      return outputCorner! < limit ? { value: outputCorner!, limit } : undefined;
    },
  },
  {
    code: "envelope-loaded",
    severity: "caution",
    unit: "",
    source: "practice",
    template:
      "The cell loads the envelope with {value} times its discharge resistance, under {limit}: the decay depends on the noise. Buffer the envelope.",
    check: ({ conditions: { dischargeResistance }, results: { envelopeLoad } }) => {
      if (dischargeResistance === null || envelopeLoad === undefined) return undefined;
      const ratio = envelopeLoad / dischargeResistance;
      return ratio < 10 ? { value: ratio, limit: 10 } : undefined;
    },
  },
  {
    code: "approximate",
    severity: "note",
    unit: "V",
    source: "derivation",
    template:
      "An approximation: a static transistor under {value} of Gaussian noise, checked against no hardware (from {limit} up the drive is usual). Charge storage and the spread of β and V_BE are left out.",
    check: ({ conditions: { sourceRms } }) => (sourceRms >= 0.1 ? { value: sourceRms, limit: 0.1 } : undefined),
  },
];
