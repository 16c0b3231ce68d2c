import type { DesignRefusal, DesignRequest } from "../../../../stage/topology.ts";
import type { PartValues, ResultValues, State } from "../../../../stage/values.ts";
import { outputNoiseOf, responseOf } from "../../model.ts";
import type { conditions, parts, results, targets } from "./fields.ts";
import { idealResistors, nothingAround, transferOf, usualRatio } from "./model.ts";

export type P = typeof parts;
export type C = typeof conditions;
export type T = typeof targets;
export type R = typeof results;
export type PassiveState = State<P, C>;

/** Taken where the designer has not chosen one. */
const usualCapacitor = 33e-9;

export function analyse({ parts, conditions }: PassiveState): ResultValues<R> {
  const response = responseOf(transferOf(parts, conditions), false);
  const alone = responseOf(transferOf(parts, nothingAround), false);
  return {
    ...response,
    ...(alone.centreFrequency !== undefined && {
      unloadedCentre: alone.centreFrequency,
      unloadedQuality: alone.qualityFactor!,
      unloadedGain: alone.peakGain!,
    }),
    ...outputNoiseOf(response, conditions),
  };
}

/** Both corners at the centre, unloaded; `designExactly` corrects for source and load. */
export function design({ targets, given }: DesignRequest<P, C, T>): PartValues<P> | DesignRefusal {
  const c1 = given.c1 ?? usualCapacitor;
  const c2 = given.c2 ?? c1 / usualRatio;
  return { ...idealResistors(targets.centreFrequency, c1, c2), c1, c2 };
}
