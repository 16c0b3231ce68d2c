import { existing } from "../../retune.ts";
import { readCentre } from "../../../../network/resonance.ts";
import { isStable } from "../../../../network/transfer.ts";
import { electricalAngle } from "../../../../parts/electricalAngle.ts";
import { potFraction } from "../../../../parts/potLaw.ts";
import type { ConditionValues, PartValues, ResultValues, State } from "../../../../stage/values.ts";
import { outputNoiseOf, responseOf, withRheostat } from "../../model.ts";
import type { conditions, parts, results, targets } from "./fields.ts";
import {
  idealCentre,
  idealResistors,
  largestGain,
  noiseGainAtCentre,
  semitonesBetween,
  transferOf,
  type NetworkValues,
} from "./model.ts";
import type { DesignRefusal, DesignRequest } from "../../../../stage/topology.ts";
import { formatQuantity } from "../../../../quantity/format.ts";

export type P = typeof parts;
export type C = typeof conditions;
export type T = typeof targets;
export type R = typeof results;
export type MultipleFeedbackState = State<P, C>;

/** Taken where the designer has not chosen one. */
const usualCapacitor = 10e-9;

/** The five network values at a rotation. */
export function networkAt(
  values: PartValues<P>,
  surroundings: ConditionValues<C>,
  rotation = surroundings.rotation,
): NetworkValues {
  return { ...values, rb: withRheostat(values.rb, values.rbPot, surroundings.potLaw, rotation) };
}

/** The transfer function of a state, at its own rotation or at another. */
export function transferAt({ parts, conditions }: MultipleFeedbackState, rotation = conditions.rotation) {
  return transferOf(networkAt(parts, conditions, rotation), conditions);
}

/** The exact centre at a rotation; NaN where there is no peak. */
export function centreAt(state: MultipleFeedbackState, rotation = state.conditions.rotation): number {
  const transfer = transferAt(state, rotation);
  return isStable(transfer) ? (readCentre(transfer) ?? Number.NaN) : Number.NaN;
}

export function analyse(state: MultipleFeedbackState): ResultValues<R> {
  const { parts, conditions } = state;
  const network = networkAt(parts, conditions);
  const seen = { ...network, ra: network.ra + conditions.sourceResistance };
  const response = responseOf(transferAt(state), true);
  const noiseGain = noiseGainAtCentre(seen);
  return {
    ...response,
    ...(parts.rbPot > 0 && retune(state)),
    noiseGain,
    ...(conditions.gainBandwidth !== null && { loopGain: conditions.gainBandwidth / (idealCentre(seen) * noiseGain) }),
    ...outputNoiseOf(response, conditions),
  };
}

function retune(state: MultipleFeedbackState): ResultValues<R> {
  const { parts, conditions } = state;
  const [retuneHigh, retuneLow] = [centreAt(state, 0), centreAt(state, 1)];
  const network = networkAt(parts, conditions);
  const ra = network.ra + conditions.sourceResistance;
  // ∂ln f0/∂ln RB = −½·RA/(RA + RB), and dRB/dx = Rpot·da/dx: the slope of the law is taken over a millionth of the travel.
  const x = Math.min(Math.max(conditions.rotation, 1e-6), 1 - 1e-6);
  const slope = (potFraction(conditions.potLaw, x + 1e-6) - potFraction(conditions.potLaw, x - 1e-6)) / 2e-6;
  const perTurn = (-0.5 * (ra / (ra + network.rb)) * parts.rbPot * slope) / network.rb;
  return existing({
    retuneHigh,
    retuneLow,
    retuneSpan: semitonesBetween(retuneLow, retuneHigh),
    retunePerDegree: (1200 * perTurn) / Math.LN2 / electricalAngle,
    ...reach(
      state,
      retuneLow / idealCentre({ ...networkAt(parts, conditions, 1), ra }),
      retuneHigh / idealCentre({ ...networkAt(parts, conditions, 0), ra }),
    ),
  });
}

/**
 * The centres that every board reaches at some rotation: from the highest low end to the lowest high end over all
 * corners of tolerance. f0 falls with every part, so the corners are those with all parts low and all high; the op amp's
 * small shift is carried over from the nominal board.
 */
function reach({ parts, conditions }: MultipleFeedbackState, lowShift: number, highShift: number) {
  const { resistorTolerance: tR, capacitorTolerance: tC, potTolerance: tV } = conditions;
  const corner = (sign: 1 | -1, pot: number) =>
    idealCentre({
      ra: parts.ra * (1 + sign * tR) + conditions.sourceResistance,
      rb: parts.rb * (1 + sign * tR) + pot * (1 + sign * tV),
      rf: parts.rf * (1 + sign * tR),
      c1: parts.c1 * (1 + sign * tC),
      c2: parts.c2 * (1 + sign * tC),
    });
  const [reachLow, reachHigh] = [corner(-1, parts.rbPot) * lowShift, corner(1, 0) * highShift];
  // Where the tolerances eat the whole range, no centre is reached by every board.
  return reachLow < reachHigh ? { reachLow, reachHigh } : {};
}

/** Exact resistors for an ideal op amp; `designExactly` corrects for a real one. */
export function design({ targets, conditions, given }: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal {
  const { centreFrequency, qualityFactor, peakGain } = targets;
  const c1 = given.c1 ?? usualCapacitor;
  const c2 = given.c2 ?? c1;
  const rbPot = given.rbPot ?? 0;
  const most = largestGain(qualityFactor, c1, c2);
  if (peakGain >= most) return tooMuchGain(targets, most, c1, c2);
  const exact = idealResistors(centreFrequency, qualityFactor, peakGain, c1, c2);
  const ra = exact.ra - conditions.sourceResistance;
  if (ra <= 0) {
    return {
      refused: true,
      field: "peakGain",
      message: `The source resistance alone is more than the ${formatQuantity(exact.ra, "Ω")} that this gain leaves at the input. Ask for less gain, or take a smaller capacitor.`,
    };
  }
  const rb = exact.rb - rbPot * potFraction(conditions.potLaw, conditions.rotation);
  if (rb <= 0) {
    return {
      refused: true,
      field: "centreFrequency",
      message: `The pot alone is more than the ${formatQuantity(exact.rb, "Ω")} needed to ground. Take a smaller pot, turn it down, or take a smaller capacitor.`,
    };
  }
  return { ra, rb, rbPot, rf: exact.rf, c1, c2 };
}

function tooMuchGain(
  { qualityFactor, peakGain }: { qualityFactor: number; peakGain: number },
  most: number,
  c1: number,
  c2: number,
): DesignRefusal {
  const leastQuality = Math.sqrt((peakGain * c1) / (c1 + c2));
  return {
    refused: true,
    field: "peakGain",
    message:
      `A quality factor of ${formatQuantity(qualityFactor, "")} leaves room for a peak gain below ${formatQuantity(most, "")} (2Q² for equal capacitors); ${formatQuantity(peakGain, "")} was asked for. ` +
      `Lower the peak gain to under ${formatQuantity(0.9 * most, "", 3)}, or raise the quality factor above ${formatQuantity(1.05 * leastQuality, "", 3)}.`,
  };
}
