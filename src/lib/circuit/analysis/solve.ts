import { nearestInSeries, seriesBetween, type ValueSeries } from "../parts/series.ts";
import type { SeriesName } from "../parts/preferredSeries.ts";
import type { PlainConditions, PlainValues } from "../stage/defaults.ts";
import { completeConditions } from "../stage/defaults.ts";
import type { PartClass } from "../stage/fields.ts";
import type { AnyTopology, DesignRefusal } from "../stage/topology.ts";
import { designExactly, isRefusal } from "./design.ts";

export interface SolveRequest {
  targets: PlainValues;
  conditions?: PlainConditions;
  /** Parts the designer has already decided: a capacitor value, the pot. */
  given?: PlainValues;
  series?: Partial<Record<"resistor" | "capacitor", SeriesName>>;
  /** Relative half-widths of the target windows; errors are measured in them. */
  windows?: PlainValues;
  /** How many candidates to return. */
  count?: number;
}

export interface Candidate {
  parts: PlainValues;
  results: Record<string, number | readonly number[]>;
  /** Relative error of each target. */
  errors: PlainValues;
  /** What the ranking goes by, smaller is better; see {@link meritStatement}. */
  merit: number;
}

export interface Solution {
  exact: { parts: PlainValues; results: Record<string, number | readonly number[]> };
  candidates: Candidate[];
  /** Combinations that were analysed. */
  tried: number;
}

/** Said beside every ranking. */
export const meritStatement =
  "Ranked by the sum of squared errors, each measured in its target's window, plus a small cost for resistors whose geometric mean is far from 20 kΩ and a larger one for values outside the usual range.";

/** Low enough for noise and stray capacitance, high enough for the op amp to drive: common practice, no source. */
const comfortableResistance = 20e3;
const impedanceWeight = 0.02;
/** Neighbours of each exact value that are tried, for the first few undecided parts; the others take the nearest value. */
const neighbours = 2;
const variedParts = 5;
/** Combinations analysed at most; where more exist, those with the most comfortable resistors come first. */
const mostCombinations = 1200;

/**
 * Exact parts for the targets, and the best combinations of values that exist.
 *
 * Every anchor value of its series is tried; for each, every other part takes its nearest neighbours in its series, and
 * each combination is analysed exactly under the given conditions. A bounded search: it does not try values farther from
 * the exact ones.
 */
export function solveStage(topology: AnyTopology, request: SolveRequest): Solution | DesignRefusal {
  const conditions = completeConditions(topology, request.conditions);
  const given = request.given ?? {};
  const designs: { parts: PlainValues; decided: Set<string> }[] = [];
  let refusal: DesignRefusal | undefined;
  for (const anchored of anchorChoices(topology, given, request.series ?? {})) {
    const decided = { ...given, ...anchored };
    const parts = designExactly(topology, request.targets, conditions, decided);
    if (isRefusal(parts)) refusal ??= parts;
    else designs.push({ parts, decided: new Set(Object.keys(decided)) });
  }
  if (designs.length === 0) return refusal!;
  const cost = ({ parts }: { parts: PlainValues }) => impedanceCost(topology, parts) + unusualCost(topology, parts);
  designs.sort((a, b) => cost(a) - cost(b));
  const exactParts = designs[0]!.parts;
  const combinations = designs
    .flatMap(({ parts, decided }) => snapped(topology, parts, decided, request.series ?? {}))
    .slice(0, mostCombinations);
  const candidates = combinations.flatMap((parts) => weigh(topology, parts, conditions, request) ?? []);
  candidates.sort((a, b) => a.merit - b.merit);
  return {
    exact: {
      parts: exactParts,
      results: finite(topology.analyse({ parts: exactParts, conditions: conditions as never }, request.targets)),
    },
    candidates: candidates.slice(0, request.count ?? 12),
    tried: combinations.length,
  };
}

/**
 * The anchor values to try: those given, else steps of E12 over the anchor's range, each moved to the nearest member of
 * its part's own series, so that every value exists and a fine series does not multiply the work.
 */
function* anchorChoices(
  topology: AnyTopology,
  given: PlainValues,
  series: NonNullable<SolveRequest["series"]>,
): Generator<PlainValues> {
  const choices = topology.anchors.map(({ part, least, most, follows = [] }) => {
    const fixed = given[part];
    const own = seriesOf(topology.parts[part]!.partClass, series);
    const steps = seriesBetween("E12", least, most).map((value) => nearestInSeries(value, own)[0]!);
    const values = fixed === undefined ? [...new Set(steps)] : [fixed];
    return values.map((value) => Object.fromEntries([part, ...follows].map((key) => [key, given[key] ?? value])));
  });
  yield* product(choices).map((chosen) => Object.assign({}, ...chosen) as PlainValues);
}

/** The exact parts with every undecided one moved to a neighbour in its series. */
function snapped(
  topology: AnyTopology,
  exact: PlainValues,
  decided: Set<string>,
  series: NonNullable<SolveRequest["series"]>,
): PlainValues[] {
  let varied = 0;
  const choices = Object.entries(topology.parts).map(([key, field]) => {
    const value = exact[key]!;
    if (decided.has(key) || value === 0) return [[key, value] as const];
    const count = varied++ < variedParts ? neighbours : 1;
    return nearestInSeries(value, seriesOf(field.partClass, series), count).map((near) => [key, near] as const);
  });
  return product(choices).map((entries) => Object.fromEntries(entries));
}

function seriesOf(partClass: PartClass, series: NonNullable<SolveRequest["series"]>): ValueSeries {
  if (partClass === "pot") return "pots";
  return partClass === "resistor" ? (series.resistor ?? "E24") : (series.capacitor ?? "E12");
}

function weigh(
  topology: AnyTopology,
  parts: PlainValues,
  conditions: PlainConditions,
  request: SolveRequest,
): Candidate | undefined {
  const results = finite(topology.analyse({ parts, conditions: conditions as never }, request.targets));
  const errors: PlainValues = {};
  let merit = impedanceWeight * impedanceCost(topology, parts) + unusualCost(topology, parts);
  for (const [key, wanted] of Object.entries(request.targets)) {
    const field = topology.targets[key]!;
    const got = results[field.result];
    if (typeof got !== "number") return undefined;
    errors[key] = got / wanted - 1;
    merit += (errors[key] / (request.windows?.[key] ?? field.window)) ** 2;
  }
  return { parts, results, errors, merit };
}

/** Squared log distance of the resistors' geometric mean from the comfortable level, and of each from 1 kΩ to 1 MΩ. */
function impedanceCost(topology: AnyTopology, parts: PlainValues): number {
  const logs = Object.entries(topology.parts).flatMap(([key, field]) =>
    // A resistor of zero is one that is not fitted.
    field.partClass === "resistor" && parts[key]! > 0 ? [Math.log(parts[key]! / comfortableResistance)] : [],
  );
  if (logs.length === 0) return 0;
  const mean = logs.reduce((sum, x) => sum + x, 0) / logs.length;
  const beyond = logs.map((x) =>
    Math.max(0, Math.log(1e3 / comfortableResistance) - x, x - Math.log(1e6 / comfortableResistance)),
  );
  return mean ** 2 + 4 * beyond.reduce((sum, x) => sum + x ** 2, 0);
}

/** Squared log distance of each fitted part from what the trade uses of it. */
function unusualCost(topology: AnyTopology, parts: PlainValues): number {
  let cost = 0;
  for (const [key, { least, most }] of Object.entries(topology.parts)) {
    const value = parts[key]!;
    if (value <= 0 || (value >= least && value <= most)) continue;
    cost += Math.log(value / (value < least ? least : most)) ** 2;
  }
  return cost;
}

function finite(
  results: Readonly<Record<string, number | readonly number[] | undefined>>,
): Record<string, number | readonly number[]> {
  return Object.fromEntries(
    Object.entries(results).filter(
      (entry): entry is [string, number | readonly number[]] =>
        entry[1] !== undefined && (typeof entry[1] !== "number" || Number.isFinite(entry[1])),
    ),
  );
}

function product<T>(choices: readonly (readonly T[])[]): T[][] {
  return choices.reduce<T[][]>(
    (rows, options) => rows.flatMap((row) => options.map((option) => [...row, option])),
    [[]],
  );
}
