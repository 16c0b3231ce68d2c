import { multiply } from "../../../../network/polynomial.ts";
import { noiseIntegral } from "../../../../network/noiseIntegral.ts";
import { greatestGain, readCentre } from "../../../../network/resonance.ts";
import { isStable, type Transfer } from "../../../../network/transfer.ts";
import { potFraction } from "../../../../parts/potLaw.ts";
import { formatQuantity } from "../../../../quantity/format.ts";
import type { DesignRefusal, DesignRequest } from "../../../../stage/topology.ts";
import type { ConditionValues, PartValues, ResultValues, State } from "../../../../stage/values.ts";
import { outputNoiseOf, responseOf } from "../../model.ts";
import { retuneFigures } from "../../retune.ts";
import type { conditions, parts, results, targets } from "./fields.ts";
import { idealFigures, lostDamping, outputsOf, summerNoiseGain, type NetworkValues } from "./model.ts";

export type P = typeof parts;
export type C = typeof conditions;
export type T = typeof targets;
export type R = typeof results;
export type TwoIntegratorState = State<P, C>;

/** Taken where the designer has not chosen one. */
const usualCapacitor = 10e-9;
const usualResistor = 10e3;

/** What the two gangs leave in circuit. */
function gangs({ r1Pot, r2Pot }: { r1Pot: number; r2Pot: number }, conditions: ConditionValues<C>, rotation: number) {
  const share = potFraction(conditions.potLaw, rotation);
  return [r1Pot * share, r2Pot * share * 10 ** (conditions.gangMismatch / 20)] as const;
}

/** The network as the source sees it: its resistance in Ri, the pot's gangs in R1 and R2. */
export function networkAt({ parts, conditions }: TwoIntegratorState, rotation = conditions.rotation): NetworkValues {
  const [first, second] = gangs(parts, conditions, rotation);
  return {
    ...parts,
    ri: parts.ri + conditions.sourceResistance,
    r1: parts.r1 + first,
    r2: parts.r2 + second,
  };
}

export function outputsAt(state: TwoIntegratorState, rotation = state.conditions.rotation) {
  return outputsOf(networkAt(state, rotation), state.conditions);
}

/** The exact centre at a rotation; NaN where there is no peak. */
export function centreAt(state: TwoIntegratorState, rotation = state.conditions.rotation): number {
  const { bandPass } = outputsAt(state, rotation);
  return isStable(bandPass) ? (readCentre(bandPass) ?? Number.NaN) : Number.NaN;
}

export function analyse(state: TwoIntegratorState): ResultValues<R> {
  const { parts, conditions } = state;
  const network = networkAt(state);
  const { highPass, bandPass, lowPass } = outputsAt(state);
  const response = responseOf(bandPass, false);
  const ideal = idealFigures(network);
  const lost = conditions.gainBandwidth === null ? 0 : lostDamping(network, conditions.gainBandwidth);
  return {
    ...response,
    idealQuality: ideal.quality,
    noiseGain: summerNoiseGain(network),
    stabilityMargin: 1 - ideal.quality * lost,
    ...(lost > 0 && { qualityLimit: 1 / lost }),
    ...(isStable(bandPass) && {
      highPassPeak: greatestGain(highPass),
      lowPassPeak: greatestGain(lowPass),
      ...innerNoise(highPass, lowPass, conditions),
    }),
    ...(parts.r1Pot + parts.r2Pot > 0 && retuneFigures((rotation) => centreAt(state, rotation), conditions.rotation)),
    ...outputNoiseOf(response, conditions),
  };
}

/** RMS at the outer nodes. They pass noise up to the source's own band limit, which is therefore part of the integral. */
function innerNoise(highPass: Transfer, lowPass: Transfer, conditions: ConditionValues<C>): ResultValues<R> {
  const { sourceRms, sourceBandwidth } = conditions;
  if (sourceRms === null) return {};
  const pole = [1, 1 / (2 * Math.PI * sourceBandwidth)];
  const rms = ({ numerator, denominator }: Transfer) =>
    sourceRms *
    Math.sqrt(
      noiseIntegral({ numerator, denominator: multiply(denominator, pole) }) / ((Math.PI / 2) * sourceBandwidth),
    );
  return { highPassRms: rms(highPass), lowPassRms: rms(lowPass) };
}

/** Equal resistors around the summer unless given, and parts for ideal op amps; `designExactly` corrects for real ones. */
export function design({ targets, conditions, given }: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal {
  const { ri = usualResistor, ra = usualResistor, rb = usualResistor, rq2 = usualResistor } = given;
  const { c1 = usualCapacitor, r1Pot = 0, r2Pot = 0 } = given;
  const c2 = given.c2 ?? c1;
  const omega = 2 * Math.PI * targets.centreFrequency;
  const resistance = Math.sqrt(rb / (ra * c1 * c2)) / omega;
  const gain = summerNoiseGain({ ri: ri + conditions.sourceResistance, ra, rb });
  const undamped = Math.sqrt((rb * c1) / (ra * c2)) / gain;
  const beta = undamped / targets.qualityFactor;
  if (!(beta < 1)) {
    return {
      refused: true,
      field: "qualityFactor",
      message: `This loop has a quality factor of at least ${formatQuantity(undamped, "")}. Ask for a higher one, or raise R_b over the other resistors of the summer.`,
    };
  }
  const [first, second] = gangs({ r1Pot, r2Pot }, conditions, conditions.rotation);
  const [r1, r2] = [resistance - first, resistance - second];
  if (r1 <= 0 || r2 <= 0) {
    return {
      refused: true,
      field: "centreFrequency",
      message: `The pot alone is more than the ${formatQuantity(resistance, "Ω")} that the integrators need. Take a smaller pot, turn it down, or take a smaller capacitor.`,
    };
  }
  return { r1, r2, r1Pot, r2Pot, rq1: rq2 * (1 / beta - 1), rq2, ri, ra, rb, c1, c2 };
}
