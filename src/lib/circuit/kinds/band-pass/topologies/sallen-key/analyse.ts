import { readCentre } from "../../../../network/resonance.ts";
import { isStable, type Transfer } from "../../../../network/transfer.ts";
import { potFraction } from "../../../../parts/potLaw.ts";
import { formatQuantity } from "../../../../quantity/format.ts";
import type { DesignRefusal, DesignRequest } from "../../../../stage/topology.ts";
import type { PartValues, ResultValues, State } from "../../../../stage/values.ts";
import { outputNoiseOf, responseOf, withRheostat } from "../../model.ts";
import { retuneFigures } from "../../retune.ts";
import type { conditions, parts, results, targets } from "./fields.ts";
import { amplifierGain, idealDesign, leastQuality, oscillationGain, transferOf, type NetworkValues } from "./model.ts";

export type P = typeof parts;
export type C = typeof conditions;
export type T = typeof targets;
export type R = typeof results;
export type SallenKeyState = State<P, C>;

/** Taken where the designer has not chosen one. */
const usualCapacitor = 10e-9;
const usualToGround = 10e3;

/** The network as the source sees it: its resistance in R1, the pot's share in R2. */
export function networkAt({ parts, conditions }: SallenKeyState, rotation = conditions.rotation): NetworkValues {
  return {
    ...parts,
    r1: parts.r1 + conditions.sourceResistance,
    r2: withRheostat(parts.r2, parts.r2Pot, conditions.potLaw, rotation),
  };
}

export function transferAt(state: SallenKeyState, rotation = state.conditions.rotation): Transfer {
  return transferOf(networkAt(state, rotation), state.conditions);
}

/** The exact centre at a rotation; NaN where there is no peak. */
export function centreAt(state: SallenKeyState, rotation = state.conditions.rotation): number {
  const transfer = transferAt(state, rotation);
  return isStable(transfer) ? (readCentre(transfer) ?? Number.NaN) : Number.NaN;
}

export function analyse(state: SallenKeyState): ResultValues<R> {
  const { parts, conditions } = state;
  const network = networkAt(state);
  const response = responseOf(transferAt(state), false);
  const [gain, mostGain] = [amplifierGain(network), oscillationGain(network)];
  const t = conditions.resistorTolerance;
  return {
    ...response,
    amplifierGain: gain,
    oscillationGain: mostGain,
    // d ln Q/d ln K = K/(Kosc − K).
    ...(gain < mostGain && { qualitySensitivity: gain / (mostGain - gain) }),
    ...named("qualityLow", qualityWith(state, parts.rf * (1 - t), parts.rg * (1 + t))),
    ...named("qualityHigh", qualityWith(state, parts.rf * (1 + t), parts.rg * (1 - t))),
    ...(parts.r2Pot > 0 && {
      ...retuneFigures((rotation) => centreAt(state, rotation), conditions.rotation),
      ...named("retuneQualityLow", responseOf(transferAt(state, 1), false).qualityFactor),
      ...named("retuneQualityHigh", responseOf(transferAt(state, 0), false).qualityFactor),
    }),
    ...outputNoiseOf(response, conditions),
  };
}

const qualityWith = (state: SallenKeyState, rf: number, rg: number) =>
  responseOf(transferOf({ ...networkAt(state), rf, rg }, state.conditions), false).qualityFactor;

const named = (name: keyof R, value: number | undefined) => (value === undefined ? {} : { [name]: value });

/** Equal resistors and the gain for an ideal op amp; `designExactly` corrects for a real one. */
export function design({ targets, conditions, given }: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal {
  const c1 = given.c1 ?? usualCapacitor;
  const c2 = given.c2 ?? c1;
  const r2Pot = given.r2Pot ?? 0;
  const rg = given.rg ?? usualToGround;
  const { resistance, gain } = idealDesign(targets.centreFrequency, targets.qualityFactor, c1, c2);
  if (!(gain > 1)) {
    return {
      refused: true,
      field: "qualityFactor",
      message: `This network has a quality factor of at least ${formatQuantity(leastQuality(c1, c2), "")}. Ask for a higher one, or take the passive network.`,
    };
  }
  const r1 = resistance - conditions.sourceResistance;
  if (r1 <= 0) {
    return {
      refused: true,
      field: "centreFrequency",
      message: `The source resistance alone is more than the ${formatQuantity(resistance, "Ω")} needed at the input. Take a smaller capacitor, or buffer the source.`,
    };
  }
  const r2 = resistance - r2Pot * potFraction(conditions.potLaw, conditions.rotation);
  if (r2 <= 0) {
    return {
      refused: true,
      field: "centreFrequency",
      message: `The pot alone is more than the ${formatQuantity(resistance, "Ω")} needed to ground. Take a smaller pot, turn it down, or take a smaller capacitor.`,
    };
  }
  return { r1, r2, r2Pot, r3: resistance, rf: (gain - 1) * rg, rg, c1, c2 };
}
