import type { AnyTopology } from "../stage/topology.ts";
import {
  runRevalue,
  trimCoverage,
  trimFigures,
  type Revaluation,
  type RevalueWish,
  type TrimCoverage,
  type TrimFigures,
  type TrimRequest,
} from "./trim/index.ts";
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

export interface TrimTask extends TrimRequest {
  /** Asks for new values. */
  revalue?: RevalueWish;
}

export type TrimAnswer = TrimFigures & { coverage: TrimCoverage; revalue?: Revaluation };

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
  *trimming(topology: AnyTopology, { revalue, ...request }: TrimTask): Generator<unknown, TrimAnswer> {
    const figures = yield* trimFigures(topology, request);
    const coverage = yield* trimCoverage(topology, request);
    if (revalue === undefined) return { ...figures, coverage };
    return { ...figures, coverage, revalue: yield* runRevalue(topology, request, revalue) };
  },
} as const;

export type Calculation = keyof typeof calculations;
export type CalculationRequest<C extends Calculation> = Parameters<(typeof calculations)[C]>[1];
export type CalculationAnswer<C extends Calculation> =
  ReturnType<(typeof calculations)[C]> extends Generator<unknown, infer A> ? A : never;
