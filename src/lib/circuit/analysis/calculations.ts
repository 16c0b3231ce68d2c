import type { AnyTopology } from "../stage/topology.ts";
import {
  runRemedy,
  runSpread,
  spreadOutcome,
  type Remedy,
  type SpreadOutcome,
  type SpreadRequest,
} from "./spread/index.ts";

export interface SpreadTask extends SpreadRequest {
  /** Asks for the cheapest tolerances that give this share of good boards. */
  wantedYield?: number;
}

export type SpreadAnswer = SpreadOutcome & { remedy?: Remedy };

/**
 * Calculations that take longer than a request should hold up a server, or a page. Each gives way as it goes; whoever
 * runs it decides where and for how long.
 */
export const calculations = {
  *spread(topology: AnyTopology, { wantedYield, ...request }: SpreadTask): Generator<unknown, SpreadAnswer> {
    const run = yield* runSpread(topology, request);
    const outcome = spreadOutcome(run);
    if (wantedYield === undefined) return outcome;
    return { ...outcome, remedy: yield* runRemedy(topology, request, wantedYield, run.nominal, run.slopes) };
  },
} as const;

export type Calculation = keyof typeof calculations;
export type CalculationRequest<C extends Calculation> = Parameters<(typeof calculations)[C]>[1];
export type CalculationAnswer<C extends Calculation> =
  ReturnType<(typeof calculations)[C]> extends Generator<unknown, infer A> ? A : never;
