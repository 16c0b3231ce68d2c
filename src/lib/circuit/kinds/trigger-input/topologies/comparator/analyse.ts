import { formatQuantity } from "../../../../quantity/format.ts";
import type { DesignRefusal, DesignRequest } from "../../../../stage/topology.ts";
import type { PartValues, ResultValues, State } from "../../../../stage/values.ts";
import { buttonLatency, edgeShare, slowestEdge, velocityFigures } from "../../model.ts";
import type { conditions, parts, results, targets } from "./fields.ts";
import { gateWidth, spikeWidth, thresholdsOf } from "./model.ts";

export type P = typeof parts;
export type C = typeof conditions;
export type T = typeof targets;
export type R = typeof results;
export type ComparatorState = State<P, C>;

export function thresholdsAt({ parts, conditions }: ComparatorState) {
  return thresholdsOf(parts, conditions.railPositive, conditions.outputHigh, conditions.outputLow);
}

export function analyse(state: ComparatorState): ResultValues<R> {
  const { parts, conditions } = state;
  const { pulseHeight, differentiator, riseTime, buttonTimeConstant } = conditions;
  const { reference, rising, falling } = thresholdsAt(state);
  const width =
    differentiator === null
      ? gateWidth(pulseHeight, conditions.gateLength, riseTime ?? 0, rising, falling)
      : spikeWidth(
          pulseHeight * (riseTime === null ? 1 : edgeShare(riseTime, differentiator)),
          differentiator,
          rising,
          falling,
        );
  const slowest = differentiator === null ? undefined : slowestEdge(rising / pulseHeight, differentiator);
  const latency =
    buttonTimeConstant === null ? undefined : buttonLatency(buttonTimeConstant, conditions.railPositive, rising);
  const lowestJack = Math.min(conditions.lowestInput, differentiator === null ? 0 : -pulseHeight);
  return {
    threshold: rising,
    fallingThreshold: falling,
    hysteresis: rising - falling,
    reference,
    inputResistance: parts.rin + parts.rh,
    lowestPin: (lowestJack * parts.rh + conditions.outputLow * parts.rin) / (parts.rin + parts.rh),
    ...(width !== undefined && { pulseWidth: width }),
    ...(slowest !== undefined && { slowestEdge: slowest }),
    ...(latency !== undefined && { buttonLatency: latency }),
    ...velocityFigures(conditions, width),
  };
}

/** Exact hysteresis resistor and reference divider. */
export function design({ targets, conditions, given }: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal {
  const rin = given.rin ?? 100e3;
  const swing = conditions.outputHigh - conditions.outputLow;
  const ratio = targets.hysteresis / swing;
  const reference = (targets.threshold + conditions.outputLow * ratio) / (1 + ratio);
  if (!(reference > 0 && reference < conditions.railPositive)) {
    return {
      refused: true,
      field: reference > 0 ? "threshold" : "hysteresis",
      message: `These thresholds need a reference of ${formatQuantity(reference, "V")}, outside 0 to ${formatQuantity(conditions.railPositive, "V")} that a divider from the rail gives. ${reference > 0 ? "Lower the threshold." : "Ask for less hysteresis, or a higher threshold."}`,
    };
  }
  const rr1 = given.rr1 ?? 100e3;
  return { rin, rh: rin / ratio, rr1, rr2: rr1 / (conditions.railPositive / reference - 1) };
}
