import type { PlainValues } from "../../stage/defaults.ts";
import type { AnyTopology } from "../../stage/topology.ts";
import { bandRecorder, type Band } from "./band.ts";
import { benchOf, figureOf, plainResults } from "./bench.ts";
import { boardsOf } from "./boards.ts";
import { factorsOf } from "./factors.ts";
import { referenceTemperature, type SpreadRequest } from "./request.ts";
import { relativeSlopes, rootSumSquare, slopesOf, type Slopes } from "./slopes.ts";
import { passesWindows, spreadOf, yieldOf, type ResultSpread, type Yield } from "./statistics.ts";
import { worstCaseOf, type WorstCase } from "./worstCase.ts";

/** What is known before any board is drawn, and what the boards say so far. */
export interface SpreadRun {
  request: SpreadRequest;
  nominal: PlainValues;
  slopes: Slopes;
  rootSumSquare: PlainValues;
  worstCase: WorstCase | undefined;
  /** Boards analysed. */
  done: number;
  passed: number;
  /** A result of each board so far. */
  values(name: string): Float64Array;
  /** Whether each board so far keeps every window. */
  passes(): Uint8Array;
  band(): Band | undefined;
}

export interface SpreadOutcome {
  boards: number;
  seed: number;
  nominal: PlainValues;
  yield?: Yield;
  results: Record<string, ResultSpread>;
  worstCase: WorstCase["results"];
  worstCaseMethod: WorstCase["method"];
  turning: string[];
  rootSumSquare: Record<string, { standardDeviation: number }>;
  sensitivities: Record<string, PlainValues>;
  band?: Band;
}

/** Boards drawn before the corners are looked at, so that the first figures come at once. */
const firstBoards = 100;

/**
 * Spread of every result over tolerances and temperature: first order, corners, and random boards. Gives way after every
 * analysis, so that whoever runs it may look, report or stop; the figures do not depend on how often that happens.
 */
export function* runSpread(topology: AnyTopology, request: SpreadRequest): Generator<SpreadRun, SpreadRun> {
  const names = plainResults(topology);
  const factors = factorsOf(topology, request);
  const bench = benchOf(topology, request);
  const board = boardsOf(request, factors);
  const columns = new Map(names.map((name) => [name, new Float64Array(request.boards)]));
  const passing = new Uint8Array(request.boards);
  const recorder = bandRecorder(topology, request, bench);
  const windows = request.window ?? {};

  const measured = bench.measure(nominalTemperature(request));
  const nominal = Object.fromEntries(
    names.map((name) => [name, figureOf(measured, name)]).filter(([, value]) => !Number.isNaN(value)),
  ) as PlainValues;
  const slopes = slopesOf(bench, names, request);
  const run: SpreadRun = {
    request,
    nominal,
    slopes,
    rootSumSquare: rootSumSquare(slopes, factors, request, names),
    worstCase: undefined,
    done: 0,
    passed: 0,
    values: (name) => columns.get(name)!.subarray(0, run.done),
    passes: () => passing.subarray(0, run.done),
    band: () => (run.done > 0 ? recorder?.band(run.done) : undefined),
  };
  yield run;

  for (let n = 0; n < request.boards; n++) {
    if (n === Math.min(firstBoards, request.boards - 1)) {
      const cornerBench = benchOf(topology, request);
      const search = worstCaseOf(cornerBench, factors, request, names);
      for (let step = search.next(); ; step = search.next()) {
        if (step.done) {
          run.worstCase = step.value;
          break;
        }
        yield run;
      }
    }
    const temperature = board(n, bench.parts);
    const figures = bench.measure(temperature);
    for (const name of names) columns.get(name)![n] = figureOf(figures, name);
    recorder?.record(n);
    if (passesWindows(windows, (name) => columns.get(name)![n]!)) {
      passing[n] = 1;
      run.passed++;
    }
    run.done = n + 1;
    yield run;
  }
  return run;
}

/** Boards that all stand at one temperature stand at that of the conditions; part values are said for 25 °C. */
function nominalTemperature({ temperature }: SpreadRequest): number {
  return temperature ? (temperature.least + temperature.most) / 2 : referenceTemperature;
}

/** All figures of a run that has ended. */
export function spreadOutcome(run: SpreadRun): SpreadOutcome {
  const { request, nominal, slopes } = run;
  const results: Record<string, ResultSpread> = {};
  for (const name of Object.keys(run.worstCase!.results)) {
    const spread = spreadOf(run.values(name));
    if (spread) results[name] = spread;
  }
  const worstCase = widened(run);
  const band = run.band();
  return {
    boards: run.done,
    seed: request.seed,
    nominal,
    ...(request.window && Object.keys(request.window).length > 0 && { yield: yieldOf(run.passed, run.done) }),
    results,
    worstCase: worstCase.results,
    worstCaseMethod: worstCase.method,
    turning: worstCase.turning,
    rootSumSquare: Object.fromEntries(
      Object.entries(run.rootSumSquare).map(([name, standardDeviation]) => [name, { standardDeviation }]),
    ),
    sensitivities: relativeSlopes(slopes, nominal),
    ...(band && { band }),
  };
}

/**
 * The worst case with what the boards add. A result with a fold inside (the distance to the nearest whole number) has its
 * extreme at no corner; boards within the tolerances that lie beyond the corners show it.
 */
function widened({ request, worstCase, values }: SpreadRun): WorstCase {
  if (request.distribution !== "uniform") return worstCase!;
  const results = { ...worstCase!.results };
  const turning = new Set(worstCase!.turning);
  for (const [name, range] of Object.entries(results)) {
    let { least, most } = range;
    for (const value of values(name)) {
      if (value < least) least = value;
      if (value > most) most = value;
    }
    const slack = 1e-9 * Math.max(Math.abs(range.least), Math.abs(range.most));
    if (range.least - least <= slack && most - range.most <= slack) continue;
    results[name] = { least, most };
    turning.add(name);
  }
  return { ...worstCase!, results, turning: [...turning] };
}

/** Runs to the end without giving way. */
export function spreadStage(topology: AnyTopology, request: SpreadRequest): SpreadOutcome {
  const steps = runSpread(topology, request);
  for (;;) {
    const step = steps.next();
    if (step.done) return spreadOutcome(step.value);
  }
}
