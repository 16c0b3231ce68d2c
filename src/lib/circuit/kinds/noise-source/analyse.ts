import { crestOf } from "../../stage/signal.ts";
import { swingOn } from "../../device/opAmp.ts";
import { boltzmann, elementaryCharge } from "../../device/constants.ts";
import { noiseIntegral } from "../../network/noiseIntegral.ts";
import { cascade, type Transfer } from "../../network/transfer.ts";
import { deviationsFor, shareBeyond } from "../../numeric/gaussianTail.ts";
import { solveBracketed } from "../../numeric/solveBracketed.ts";
import { formatQuantity } from "../../quantity/format.ts";
import type { DesignRefusal, DesignRequest } from "../../stage/topology.ts";
import type { ConditionValues, PartValues, ResultValues, State } from "../../stage/values.ts";
import type { conditions, parts, results, targets } from "./fields.ts";
import {
  amplifier,
  averagingMeter,
  bandPassTransfer,
  coupledAmplifier,
  densityOf,
  onePole,
  powerVariance,
  spreadRule,
} from "./model.ts";

export type P = typeof parts;
export type C = typeof conditions;
export type T = typeof targets;
export type R = typeof results;
export type SourceState = State<P, C>;

/** Gain-bandwidth over gain times band limit that the trade asks for. */
export const speedMargin = 1.5;
/** To either side, of noise seen on a scope: outside for a thousandth of the time. */
const scopeDeviations = deviationsFor(1e-3);

/** From the junction's own voltage, its band limit included, to the board's output. */
export function boardTransfer({ parts, conditions }: SourceState): Transfer {
  const { gainBandwidth, sourceResistance, bandLimit } = conditions;
  return cascade(
    onePole(bandLimit),
    coupledAmplifier(parts.r1 + sourceResistance, parts.rf1, parts.cn, gainBandwidth),
    amplifier(parts.r2, parts.rf2, gainBandwidth),
  );
}

/** Of the junction, V/√Hz. */
export const sourceDensity = ({ sourceRms, bandLimit }: ConditionValues<C>): number => densityOf(sourceRms, bandLimit);

export const bandTransferOf = ({ centreFrequency, qualityFactor, peakGain }: ConditionValues<C>): Transfer =>
  bandPassTransfer(centreFrequency, qualityFactor, peakGain);

export const gainOf = ({ parts, conditions }: SourceState): number =>
  (parts.rf1 / (parts.r1 + conditions.sourceResistance)) * (parts.rf2 / parts.r2);

/** RMS at the board's output, exact for the linear network. */
export const levelOf = (state: SourceState): number =>
  sourceDensity(state.conditions) * Math.sqrt(noiseIntegral(boardTransfer(state)));

/** RMS behind the band-pass. */
export const bandLevelOf = (state: SourceState, band = bandTransferOf(state.conditions)): number =>
  sourceDensity(state.conditions) * Math.sqrt(noiseIntegral(cascade(boardTransfer(state), band)));

/** Standard deviation of one hit's level over its mean. */
export const hitSpreadOf = ({ centreFrequency, qualityFactor }: ConditionValues<C>, window: number): number =>
  Math.sqrt(powerVariance(centreFrequency, qualityFactor, window)) / 2;

const decibels = (ratio: number) => 20 * Math.log10(ratio);

export function analyse(state: SourceState): ResultValues<R> {
  const { conditions } = state;
  const gain = gainOf(state);
  const density = sourceDensity(conditions) * gain;
  const rms = levelOf(state);
  const spread = 10 ** (conditions.deviceSpread / 20);
  const swing = swingOn(conditions);
  return {
    density,
    rms,
    peak4Sigma: crestOf.noise * rms,
    peakToPeak: 2 * scopeDeviations * rms,
    meterReading: averagingMeter * rms,
    rmsLeast: rms / spread,
    rmsMost: rms * spread,
    gain,
    gainDb: decibels(gain),
    inverting: 0,
    swing,
    ...(swing > 0 && {
      headroomDb: decibels(swing / (crestOf.noise * rms)),
      clipProbability: shareBeyond(swing / rms),
    }),
    noiseBandwidth: (rms / density) ** 2,
    ...board(state),
    ...band(state, density),
    ...(conditions.clockFrequency !== null && {
      repeatPeriod: (2 ** Math.round(conditions.registerLength) - 1) / conditions.clockFrequency,
    }),
  };
}

function board({ parts, conditions }: SourceState): ResultValues<R> {
  const { temperature, inputNoise, railPositive, breakdownVoltage, bandLimit, sourceResistance } = conditions;
  const input = parts.r1 + sourceResistance;
  const current = (railPositive - breakdownVoltage) / parts.rn;
  const thermal = (resistance: number) => 4 * boltzmann * temperature * resistance;
  // R_F1's noise and the op amp's, both as if in series with the junction.
  const amplifierDensity = Math.sqrt(
    thermal(input) + thermal(parts.rf1) * (input / parts.rf1) ** 2 + (inputNoise * (1 + input / parts.rf1)) ** 2,
  );
  const [first, second] = [parts.rf1 / input, parts.rf2 / parts.r2];
  return {
    couplingCorner: 1 / (2 * Math.PI * parts.cn * input),
    ...(current > 0 && { junctionCurrent: current, shotDensity: Math.sqrt(2 * elementaryCharge * current) }),
    thermalDensity: Math.sqrt(thermal(input)),
    amplifierDensity,
    overAmplifierDb: decibels(sourceDensity(conditions) / amplifierDensity),
    gainBandwidthNeeded: speedMargin * Math.max(first, second) * bandLimit,
    gainBandwidthSingle: first * second * bandLimit,
  };
}

function band(state: SourceState, density: number): ResultValues<R> {
  const { centreFrequency, qualityFactor, peakGain, window } = state.conditions;
  const bandRms = bandLevelOf(state);
  const bandNoiseBandwidth = ((Math.PI / 2) * centreFrequency) / qualityFactor;
  const statisticalBandwidth = 2 * bandNoiseBandwidth;
  const hitSpread = hitSpreadOf(state.conditions, window);
  return {
    bandRms,
    bandRmsRule: density * peakGain * Math.sqrt(bandNoiseBandwidth),
    bandPeak4Sigma: crestOf.noise * bandRms,
    bandNoiseBandwidth,
    statisticalBandwidth,
    hitSpread,
    hitSpreadDb: decibels(1 + hitSpread),
    hitSpreadRule: spreadRule(statisticalBandwidth, window),
  };
}

/** Gains of one stage that are looked at, far beyond what is built. */
const [leastGain, mostGain] = [1e-4, 1e6];

/** Both stages with one gain, which is raised until the level is there: a slow op amp is counted in. */
export function design({ targets, conditions, given }: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal {
  const fixed = { rn: given.rn ?? 220e3, cn: given.cn ?? 10e-6, r1: given.r1 ?? 10e3, r2: given.r2 ?? 10e3 };
  const partsAt = (gain: number): PartValues<P> => ({
    ...fixed,
    rf1: gain * (fixed.r1 + conditions.sourceResistance),
    rf2: gain * fixed.r2,
  });
  const excess = (x: number) => Math.log(levelOf({ parts: partsAt(Math.exp(x)), conditions }) / targets.level);
  const [low, high] = [Math.log(leastGain), Math.log(mostGain)];
  if (excess(low) < 0 && excess(high) > 0) return partsAt(Math.exp(solveBracketed(excess, low, high, 1e-15)));
  const most = targets.level * Math.exp(excess(high));
  return {
    refused: true,
    field: "level",
    message: `Two stages make ${formatQuantity(most, "V", 3)} of this junction at most. Ask for less, or take a faster op amp.`,
  };
}
