import { toleranceCost, toleranceSteps } from "../../parts/toleranceSteps.ts";
import type { PlainValues } from "../../stage/defaults.ts";
import type { AnyTopology } from "../../stage/topology.ts";
import { benchOf, figureOf } from "./bench.ts";
import { boardsOf } from "./boards.ts";
import { factorsOf, type Factor } from "./factors.ts";
import type { SpreadRequest } from "./request.ts";
import type { Slopes } from "./slopes.ts";
import { passesWindows, yieldOf, type Yield } from "./statistics.ts";

export interface ToleranceChange {
  part: string;
  from: number;
  to: number;
}

export interface Remedy {
  wanted: number;
  /** Whether tolerances alone get there. */
  reached: boolean;
  /** Empty where the boards are good enough as they are. */
  changes: ToleranceChange[];
  /** On the random boards with these changes; with everything at its tightest where that is not enough. */
  yield: Yield;
  /** Points of the changes, which only rank them; see {@link remedyStatement}. */
  cost: number;
  /** How far each result of the nominal board lies from the middle of its two-sided window, in half-widths. */
  offCentre: PlainValues;
}

export const remedyStatement =
  "The cheapest of the tolerances that parts are sold in: every combination was weighed by its price in points (a resistor of 1 % one point more than of 5 %, of 0.1 % eight; a capacitor of 5 % three, of 1 % sixteen; a pot of 10 % ten), tried to first order, and the choice checked on random boards.";

/** Combinations weighed at most; the parts that matter least keep their tolerance beyond that. */
const mostCombinations = 20_000;
const trialBoards = 400;
/** Boards the choice is checked on. */
const checkBoards = 2000;
const mostChecks = 60;
/** Beyond what the last check said of it, first order may be off by so much. */
const allowance = 0.005;
const linesBetweenPauses = 64;

interface Choice {
  tolerances: PlainValues;
  cost: number;
}

/** The cheapest tightening of tolerances for which the wanted share of boards keeps its windows. */
export function* runRemedy(
  topology: AnyTopology,
  request: SpreadRequest,
  wanted: number,
  nominal: PlainValues,
  slopes: Slopes,
): Generator<void, Remedy> {
  const boards = Math.min(request.boards, checkBoards);
  const factors = factorsOf(topology, request);
  const windows = request.window ?? {};
  const choices = choicesOf(topology, request, factors, slopes);
  const measured = (tolerances: PlainValues) => passedBy(topology, { ...request, tolerances, boards });
  const answer = (choice: Choice, passed: number, reached: boolean): Remedy => ({
    wanted,
    reached,
    changes: Object.entries(request.tolerances)
      .map(([part, from]) => ({ part, from, to: choice.tolerances[part]! }))
      .filter(({ from, to }) => from !== to),
    yield: yieldOf(passed, boards),
    cost: choice.cost,
    offCentre: offCentre(request, nominal),
  });

  const estimate = firstOrder(request, factors, nominal, slopes);
  let checks = 0;
  let optimism = 0;
  for (let i = 0; i < choices.length && checks < mostChecks; i++) {
    if (i % linesBetweenPauses === 0) yield;
    const choice = choices[i]!;
    const expected = estimate(choice.tolerances, windows);
    // What stands now is always measured: it may be good enough.
    if (i > 0 && expected - optimism < wanted - allowance) continue;
    checks++;
    const passed = yield* measured(choice.tolerances);
    if (passed >= wanted * boards) return answer(choice, passed, true);
    // Choices alike in price err alike: the last one measured says how far first order may be trusted.
    optimism = expected - passed / boards;
  }
  const tightest = choices.reduce((best, choice) => (choice.cost >= best.cost ? choice : best));
  const passed = yield* measured(tightest.tolerances);
  return answer(tightest, passed, passed >= wanted * boards);
}

/** Every combination of the steps that are tighter than what stands, cheapest first. */
function choicesOf(
  topology: AnyTopology,
  request: SpreadRequest,
  factors: readonly Factor[],
  slopes: Slopes,
): Choice[] {
  const names = Object.keys(request.window ?? {});
  const weight = ({ parts }: Factor) =>
    Math.max(
      0,
      ...names.map((name) =>
        Math.abs(parts.reduce((sum, { part, tolerance }) => sum + (slopes.parts[part]?.[name] ?? 0) * tolerance, 0)),
      ),
    );
  let choices: Choice[] = [{ tolerances: request.tolerances, cost: 0 }];
  for (const factor of [...factors].sort((a, b) => weight(b) - weight(a))) {
    const options = stepsFor(topology, factor);
    if (weight(factor) === 0 || choices.length * options.length > mostCombinations) continue;
    choices = choices.flatMap(({ tolerances, cost }) =>
      options.map((option) => ({
        tolerances: { ...tolerances, ...option.tolerances },
        cost: cost + option.cost,
      })),
    );
  }
  return choices.sort((a, b) => a.cost - b.cost);
}

/** A lot is bought as one: its parts step together, none to a coarser tolerance than it has. */
function stepsFor(topology: AnyTopology, { parts }: Factor): Choice[] {
  const keep: Choice = { tolerances: {}, cost: 0 };
  const coarsest = Math.max(...parts.map(({ tolerance }) => tolerance));
  const classes = topology.parts[parts[0]!.part]!.partClass;
  const tighter = toleranceSteps[classes].filter(({ tolerance }) => tolerance < coarsest * (1 - 1e-9));
  return [
    keep,
    ...tighter.map((step): Choice => {
      const changed = parts.filter(({ tolerance }) => tolerance > step.tolerance);
      return {
        tolerances: Object.fromEntries(changed.map(({ part }) => [part, step.tolerance])),
        cost: changed.reduce((sum, { tolerance }) => sum + step.cost - toleranceCost(classes, tolerance), 0),
      };
    }),
  ];
}

/** Yield by slopes alone, on the same boards each time. */
function firstOrder(
  request: SpreadRequest,
  factors: readonly Factor[],
  nominal: PlainValues,
  slopes: Slopes,
): (tolerances: PlainValues, windows: NonNullable<SpreadRequest["window"]>) => number {
  // Drawn with a tolerance of one hundredth, so that any other is a multiple.
  const small = 0.01;
  const units = factors.map((factor) => ({
    ...factor,
    parts: factor.parts.map((varied) => ({ ...varied, tolerance: small, drift: { least: 0, most: 0 } })),
  }));
  const draw = boardsOf(request, units);
  const values: PlainValues = {};
  const offs = Array.from({ length: Math.min(trialBoards, request.boards) }, (_, board) => {
    draw(board, values);
    return Object.fromEntries(
      units.flatMap(({ parts }) =>
        parts.map(({ part, nominal: value }) => [part, (values[part]! / value - 1) / small]),
      ),
    );
  });
  return (tolerances, windows) => {
    let passed = 0;
    for (const off of offs) {
      const figure = (name: string) => {
        let value = nominal[name] ?? Number.NaN;
        for (const part in off)
          value += (slopes.parts[part]?.[name] ?? 0) * Math.log1p(off[part]! * (tolerances[part] ?? 0));
        return value;
      };
      if (passesWindows(windows, figure)) passed++;
    }
    return passed / offs.length;
  };
}

/** How many boards keep the windows. */
function* passedBy(topology: AnyTopology, request: SpreadRequest): Generator<void, number> {
  const bench = benchOf(topology, request);
  const draw = boardsOf(request, factorsOf(topology, request));
  let passed = 0;
  for (let board = 0; board < request.boards; board++) {
    const figures = bench.measure(draw(board, bench.parts));
    if (passesWindows(request.window ?? {}, (name) => figureOf(figures, name))) passed++;
    yield;
  }
  return passed;
}

function offCentre({ window = {} }: SpreadRequest, nominal: PlainValues): PlainValues {
  return Object.fromEntries(
    Object.entries(window).flatMap(([name, { least, most }]) =>
      least === undefined || most === undefined || nominal[name] === undefined
        ? []
        : [[name, (2 * nominal[name] - least - most) / (most - least)]],
    ),
  );
}
