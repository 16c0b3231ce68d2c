import { completeConditions, type PlainConditions, type PlainValues } from "../../stage/defaults.ts";
import type { AnyTopology } from "../../stage/topology.ts";
import type { BoardsRequest } from "./request.ts";

type RawResults = Readonly<Record<string, number | readonly number[] | undefined>>;

/** A board laid out for measuring: parts that may be changed in place, and what they give at a temperature. */
export interface Bench {
  parts: PlainValues;
  conditions: PlainConditions;
  /** Back to the nominal board. */
  clear(): void;
  /** @param temperature K; sets the devices' own where boards differ in it */
  measure(temperature: number): RawResults;
}

export function benchOf(topology: AnyTopology, request: BoardsRequest): Bench {
  const parts = { ...request.parts };
  const conditions = completeConditions(topology, request.conditions);
  const warms = request.temperature !== undefined && topology.conditions["temperature"]?.type === "number";
  return {
    parts,
    conditions,
    clear: () => void Object.assign(parts, request.parts),
    measure(temperature) {
      if (warms) conditions["temperature"] = temperature;
      return topology.analyse({ parts, conditions: conditions as never });
    },
  };
}

/** The results that are plain numbers, by name; NaN where one is missing. */
export const figureOf = (results: RawResults, name: string): number => {
  const value = results[name];
  return typeof value === "number" && Number.isFinite(value) ? value : Number.NaN;
};

/** Names of the results that are one number each. */
export const plainResults = (topology: AnyTopology): string[] =>
  Object.entries(topology.results)
    .filter(([, field]) => field.list !== true)
    .map(([name]) => name);
