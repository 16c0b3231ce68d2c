import { formatQuantity } from "../../quantity/format.ts";
import type { DesignRefusal, DesignRequest } from "../../stage/topology.ts";
import type { ConditionValues, PartValues, ResultValues, State } from "../../stage/values.ts";
import type { conditions, parts, results, targets } from "./fields.ts";
import { countHits, decayedDb, gateLength, timesOf, timingOf, worstRatioError, type Oscillator } from "./model.ts";

export type P = typeof parts;
export type C = typeof conditions;
export type T = typeof targets;
export type R = typeof results;
export type BurstState = State<P, C>;

/** More than anyone claps; beyond it the times are not listed. */
export const mostHits = 64;

/** −60 dB in time constants. */
const k60 = 3 * Math.LN10;

function oscillatorOf(rt: number, ct: number, share: number, conditions: ConditionValues<C>): Oscillator {
  const { outputHigh: high, outputLow: low, biasCurrent } = conditions;
  return { rt, ct, share, high, low, biasShift: biasCurrent * rt };
}

export function analyse({ parts, conditions }: BurstState): ResultValues<R> {
  const thresholdShare = parts.r1 / (parts.r1 + parts.r2);
  const oscillator = oscillatorOf(parts.rt, parts.ct, thresholdShare, conditions);
  const timing = timingOf(oscillator, conditions.restVoltage);
  const gate = gateLength(parts.rg, parts.cg, conditions.gateSource, conditions.gateThreshold);
  const hitTimeConstant = parts.rBurst * parts.cBurst;
  const tailTimeConstant = parts.rTail * parts.cTail;
  const tailStart = conditions.tailFrom === "first-hit" ? 0 : gate;
  return {
    thresholdShare,
    biasShift: oscillator.biasShift,
    hitTimeConstant,
    tailTimeConstant,
    tailDecayTime60: k60 * tailTimeConstant,
    ...(gate !== undefined && { gateLength: gate }),
    ...(tailStart !== undefined && { tailStart }),
    ...(timing && spacings(timing, hitTimeConstant)),
    ...(timing && gate !== undefined && counts(timing, gate, conditions)),
  };
}

function spacings({ high, low, first }: { high: number; low: number; first: number }, hitTimeConstant: number) {
  const spacing = high + low;
  const firstInterval = first + low;
  return {
    spacing,
    firstInterval,
    firstIntervalError: firstInterval / spacing - 1,
    highTime: high,
    lowTime: low,
    buzzFrequency: 1 / spacing,
    valleyDb: decayedDb(spacing, hitTimeConstant),
    firstValleyDb: decayedDb(firstInterval, hitTimeConstant),
  };
}

function counts(
  { high, low, first }: { high: number; low: number; first: number },
  gate: number,
  { resistorTolerance, capacitorTolerance }: ConditionValues<C>,
): ResultValues<R> {
  const period = high + low;
  const opening = first + low;
  const hits = countHits(gate, opening, period);
  const ratioError = worstRatioError(resistorTolerance, capacitorTolerance);
  const fewer = hits === 1 ? 0 : opening + (hits - 2) * period;
  const more = opening + (hits - 1) * period;
  return {
    hits,
    gatedHits: Math.max((gate - opening) / period + 1.5, 1),
    hitsLeast: countHits(gate / (1 + ratioError), opening, period),
    hitsMost: countHits(gate * (1 + ratioError), opening, period),
    ratioError,
    ratioRoom: Math.min(1 - fewer / gate, more / gate - 1),
    ...(hits <= mostHits && { hitTimes: timesOf(hits, opening, period) }),
  };
}

/** Exact resistors for spacing, gate and tail, the capacitors taken as given. */
export function design({ targets, conditions, given }: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal {
  const fixed = {
    ct: given.ct ?? 100e-9,
    r1: given.r1 ?? 10e3,
    r2: given.r2 ?? 22e3,
    cg: given.cg ?? 470e-9,
    cBurst: given.cBurst ?? 100e-9,
    cTail: given.cTail ?? 1e-6,
  };
  const gate = gateLength(1, fixed.cg, conditions.gateSource, conditions.gateThreshold);
  if (gate === undefined) {
    return {
      refused: true,
      field: "gateThreshold",
      message: `The gate is charged to ${formatQuantity(conditions.gateSource, "V")}, not above its threshold of ${formatQuantity(conditions.gateThreshold, "V")}. Lower the threshold.`,
    };
  }
  // The bias current moves the timing with Rt: a resistor for no bias is corrected until the exact timing agrees.
  const share = fixed.r1 / (fixed.r1 + fixed.r2);
  const timing = timingOf(oscillatorOf(1, fixed.ct, share, { ...conditions, biasCurrent: 0 }), conditions.restVoltage);
  if (!timing) {
    return {
      refused: true,
      field: "restVoltage",
      message: `The capacitor rests at ${formatQuantity(conditions.restVoltage, "V")}, above the upper threshold of ${formatQuantity(share * conditions.outputHigh, "V")}: there is no first hit. Lower it, or raise the thresholds.`,
    };
  }
  const period = timing.high + timing.low;
  const rt = targets.spacing / period;
  const opening = (timing.first + timing.low) * rt;
  return {
    ...fixed,
    rt,
    rg: (opening + (targets.hits - 1.5) * targets.spacing) / gate,
    // Two and a half time constants between hits leave valleys of −21 dB.
    rBurst: given.rBurst ?? targets.spacing / (2.43 * fixed.cBurst),
    rTail: targets.tailDecayTime60 / (k60 * fixed.cTail),
  };
}
