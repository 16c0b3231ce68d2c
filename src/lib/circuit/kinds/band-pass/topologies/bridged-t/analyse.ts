import { noiseIntegral } from "../../../../network/noiseIntegral.ts";
import { modesOf } from "../../../../network/pulse.ts";
import { isStable, magnitudeAt, type Transfer } from "../../../../network/transfer.ts";
import { potFraction } from "../../../../parts/potLaw.ts";
import { formatQuantity } from "../../../../quantity/format.ts";
import type { DesignRefusal, DesignRequest } from "../../../../stage/topology.ts";
import type { PartValues, ResultValues, State } from "../../../../stage/values.ts";
import { outputNoiseOf, withRheostat } from "../../model.ts";
import { retuneFigures } from "../../retune.ts";
import type { conditions, parts, results, targets } from "./fields.ts";
import { idealResistors, noiseGainAtCentre, polePair, transferOf, type NetworkValues } from "./model.ts";
import { ringEstimate, ringPeak } from "./strike.ts";

export type P = typeof parts;
export type C = typeof conditions;
export type T = typeof targets;
export type R = typeof results;
export type BridgedTState = State<P, C>;

/** Taken where the designer has not chosen one. */
const usualCapacitor = 22e-9;
/** Time constants to −60 dB: ln 1000. */
const to60 = Math.log(1000);

/** The network as the source sees it: its resistance in Rin, the pot's share in R1, leakage beside R2. */
export function networkAt({ parts, conditions }: BridgedTState, rotation = conditions.rotation): NetworkValues {
  const leakage = conditions.leakageResistance === null ? 0 : 1 / conditions.leakageResistance;
  return {
    ...parts,
    r1: withRheostat(parts.r1, parts.r1Pot, conditions.potLaw, rotation),
    r2: 1 / (1 / parts.r2 + leakage),
    rin: parts.rin + conditions.sourceResistance,
  };
}

export function transferAt(state: BridgedTState, rotation = state.conditions.rotation): Transfer {
  return transferOf(networkAt(state, rotation), state.conditions);
}

/** The exact centre at a rotation. */
export function centreAt(state: BridgedTState, rotation = state.conditions.rotation): number {
  return polePair(transferAt(state, rotation)).centre;
}

export const strikeOf = ({ conditions }: BridgedTState) => ({
  height: conditions.strikeVoltage,
  width: conditions.strikeWidth,
});

export function analyse(state: BridgedTState): ResultValues<R> {
  const { parts, conditions } = state;
  const network = networkAt(state);
  const transfer = transferAt(state);
  const always = {
    noiseGain: noiseGainAtCentre(network),
    dcGain: magnitudeAt(transfer, 0),
    outputOffset:
      Math.abs(conditions.offsetVoltage) * (1 + network.r2 / network.rin) + conditions.biasCurrent * network.r2,
  };
  const { centre, quality, timeConstant, rings } = polePair(transfer);
  const peakGain = magnitudeAt(transfer, centre);
  // The network is stable whatever its parts; only rounding, far outside any sane part, can hide it.
  const noise = isStable(transfer) ? { noiseBandwidth: noiseIntegral(transfer) / peakGain ** 2 } : {};
  return {
    ...always,
    centreFrequency: centre,
    qualityFactor: quality,
    bandwidth: centre / quality,
    peakGain,
    peakGainDb: 20 * Math.log10(peakGain),
    ...noise,
    inverting: 1,
    ...(rings && { timeConstant, ringTime60: to60 * timeConstant, ...struck(state, transfer, centre) }),
    ...(parts.r1Pot > 0 && retuneFigures((rotation) => centreAt(state, rotation), conditions.rotation)),
    ...outputNoiseOf({ peakGain, ...noise }, conditions),
  };
}

function struck(state: BridgedTState, transfer: Transfer, centre: number): ResultValues<R> {
  const modes = modesOf(transfer);
  if (!modes) return {};
  const estimate = ringEstimate(modes, strikeOf(state), centre);
  return {
    ringPeak: ringPeak(modes, strikeOf(state), 1 / centre),
    ...(estimate !== undefined && { ringEstimate: estimate }),
  };
}

/** Exact resistors for an ideal op amp; `designExactly` corrects for a real one. */
export function design({ targets, conditions, given }: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal {
  const c1 = given.c1 ?? usualCapacitor;
  const c2 = given.c2 ?? c1;
  const r1Pot = given.r1Pot ?? 0;
  const exact = idealResistors(targets.centreFrequency, targets.ringTime60 / to60, c1, c2);
  // Q = π·f0·τ; at ½ the poles meet and nothing rings.
  if ((Math.PI * targets.centreFrequency * targets.ringTime60) / to60 <= 0.5) {
    return {
      refused: true,
      field: "ringTime60",
      message: `A pitch of ${formatQuantity(targets.centreFrequency, "Hz")} must ring longer than ${formatQuantity(to60 / (2 * Math.PI * targets.centreFrequency), "s")}, or it is no ring at all.`,
    };
  }
  const leakage = conditions.leakageResistance === null ? 0 : 1 / conditions.leakageResistance;
  const r2 = 1 / (1 / exact.r2 - leakage);
  if (!(r2 > 0 && Number.isFinite(r2))) {
    return {
      refused: true,
      field: "ringTime60",
      message: `The ring asks for ${formatQuantity(exact.r2, "Ω")} across the op amp, more than the leakage alone. Take larger capacitors, or ask for a shorter ring.`,
    };
  }
  const r1 = exact.r1 - r1Pot * potFraction(conditions.potLaw, conditions.rotation);
  if (r1 <= 0) {
    return {
      refused: true,
      field: "centreFrequency",
      message: `The pot alone is more than the ${formatQuantity(exact.r1, "Ω")} needed in the leg. Take a smaller pot, turn it down, or take smaller capacitors.`,
    };
  }
  return { r1, r1Pot, r2, rin: given.rin ?? r2, c1, c2 };
}
