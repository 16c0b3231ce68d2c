import { seriesBetween } from "../../parts/series.ts";
import { formatQuantity } from "../../quantity/format.ts";
import type { PlainValues } from "../../stage/defaults.ts";
import { analyseStage } from "../../stage/analyse.ts";
import { acceptedRange } from "../../stage/fields.ts";
import type { AnyTopology } from "../../stage/topology.ts";
import { benchOf } from "../spread/bench.ts";
import { factorsOf } from "../spread/factors.ts";
import type { TrimRequest } from "./request.ts";
import { usefulRotation } from "./travel.ts";
import { extremesAt, marginOf, nominalTemperature, travelOn, worstReach } from "./trim.ts";
import { turn, turnedPots, type TurnedPot } from "./turning.ts";

/** What is asked of the new values. */
export interface RevalueWish {
  /** Share of the travel that must lie in the window; 0 takes any. */
  useful: number;
  /** Pots to choose from; all that are sold where left out. */
  pots?: readonly number[];
}

export interface Revalued {
  parts: PlainValues;
  usefulRotation: number;
  worstCaseMargin: number;
}

export interface Revaluation {
  /** The most useful travel first; every one covers the window at worst case and has safe ends. */
  choices: Revalued[];
  /** Whether the first gives the wanted travel. */
  reached: boolean;
  /** Combinations that were tried. */
  tried: number;
  /** Where it is not reached: the pot tolerance with which it would be, if one is sold. */
  wouldTake?: { potTolerance: number; choice: Revalued };
  /** The answer in a sentence: that there are values, or why there are none and what would make them possible. */
  says: string;
}

export const revalueStatement =
  "Every pot that is sold, padding in steps of E6 first and of E24 around the best; each kept that covers the window with every part at its worst and is safe at both ends, the most useful travel first.";

const mostChoices = 8;
/** Best of the coarse search that the fine one looks around. */
const seeds = 6;
const tighterPots = [0.1, 0.05] as const;

/** Padding and a pot that exist, cover the window on every board and make the most of the travel. */
export function* runRevalue(
  topology: AnyTopology,
  request: TrimRequest,
  wish: RevalueWish,
): Generator<void, Revaluation> {
  const found = yield* search(topology, request, wish);
  const best = found.choices[0]?.usefulRotation;
  const reached = best !== undefined && best >= wish.useful;
  const window = windowText(topology, request);
  if (reached)
    return {
      ...found,
      reached,
      says: `These cover ${window} on every board; the first uses ${percent(best)} of the travel.`,
    };
  const why =
    best === undefined
      ? `No pot that is sold, with any padding, covers ${window} on every board.`
      : `On every board ${window} can be covered with at most ${percent(best)} of the travel; ${percent(wish.useful)} was asked for.`;
  const pots = turnedPots(topology, request.parts).map(({ pot }) => pot);
  for (const potTolerance of tighterPots) {
    const tolerances = { ...request.tolerances };
    if (pots.some((pot) => (tolerances[pot] ?? 0) <= potTolerance)) continue;
    for (const pot of pots) tolerances[pot] = potTolerance;
    const choice = (yield* search(topology, { ...request, tolerances }, wish)).choices[0];
    if (choice && choice.usefulRotation >= wish.useful)
      return {
        ...found,
        reached,
        wouldTake: { potTolerance, choice },
        says: `${why} A pot of ± ${percent(potTolerance)} would make it possible.`,
      };
  }
  return {
    ...found,
    reached,
    says: `${why} No tighter pot would change that: ask for less, or change the parts that the pot does not stand beside.`,
  };
}

const percent = (share: number) => `${Number((100 * share).toPrecision(3))} %`;

function windowText(topology: AnyTopology, { window, result }: TrimRequest): string {
  const { unit } = topology.results[result]!;
  return `${formatQuantity(window.least, unit)} to ${formatQuantity(window.most, unit)}`;
}

function* search(
  topology: AnyTopology,
  request: TrimRequest,
  wish: RevalueWish,
): Generator<void, Pick<Revaluation, "choices" | "tried">> {
  const turned = turnedPots(topology, request.parts);
  const first = turned[0];
  if (!first) return { choices: [], tried: 0 };
  const judge = judgeOf(topology, request);
  const tried = new Map<string, Judged>();
  function* attempt(pot: number, padding: readonly number[]): Generator<void> {
    const key = [pot, ...padding].join();
    if (tried.has(key)) return;
    tried.set(key, judge(withValues(request.parts, turned, pot, padding)));
    yield;
  }
  const ranges = first.padding.map((part) => ({ part, around: request.parts[part]! }));
  for (const pot of wish.pots ?? potsAround(topology, request.parts, first.pot))
    for (const padding of combinations(ranges.map(({ part, around }) => coarse(topology, part, around, pot))))
      yield* attempt(pot, padding);
  const best = [...tried.values()].sort(byMerit).slice(0, seeds);
  for (const { parts } of best)
    for (const padding of combinations(first.padding.map((part) => fine(parts[part]!))))
      yield* attempt(parts[first.pot]!, padding);

  const choices: Revalued[] = [];
  const covered = [...tried.values()].filter(({ reaches }) => reaches).sort(byMerit);
  for (const { parts, usefulRotation: useful } of covered) {
    if (choices.length === mostChoices) break;
    const margin = yield* marginWith(topology, { ...request, parts });
    if (margin >= 0 && endsAreSafe(topology, request, parts))
      choices.push({ parts: changed(request.parts, parts), usefulRotation: useful, worstCaseMargin: margin });
  }
  return { choices: choices.sort(bestFirst), tried: tried.size };
}

/** Alike in travel, the one with more to spare. */
const bestFirst = (a: Revalued, b: Revalued) =>
  Math.abs(b.usefulRotation - a.usefulRotation) > 1e-3
    ? b.usefulRotation - a.usefulRotation
    : b.worstCaseMargin - a.worstCaseMargin;

interface Judged {
  parts: PlainValues;
  /** Whether the nominal board reaches the window at all. */
  reaches: boolean;
  usefulRotation: number;
  /** By how much it misses, for those that do not reach. */
  misses: number;
}

const byMerit = (a: Judged, b: Judged) =>
  Number(b.reaches) - Number(a.reaches) || b.usefulRotation - a.usefulRotation || a.misses - b.misses;

/** Quick: the ends of the nominal board, pushed in by the pot's and padding's tolerance through their own travel. */
function judgeOf(topology: AnyTopology, request: TrimRequest): (parts: PlainValues) => Judged {
  const { window } = request;
  return (parts) => {
    const bench = benchOf(topology, { ...request, parts });
    const travel = travelOn(topology, bench, request, nominalTemperature(request));
    const ends = [travel(0), travel(1)];
    const reach = { least: Math.min(...ends), most: Math.max(...ends) };
    const margin = ends.some(Number.isNaN) ? -1 : marginOf(reach, window);
    if (margin < 0) return { parts, reaches: false, usefulRotation: 0, misses: -margin };
    return { parts, reaches: true, usefulRotation: usefulRotation(travel, window, 1e-6), misses: 0 };
  };
}

function* marginWith(topology: AnyTopology, request: TrimRequest): Generator<void, number> {
  const factors = factorsOf(topology, request);
  const bench = benchOf(topology, request);
  const travel = travelOn(topology, bench, request, nominalTemperature(request));
  const ends = [];
  for (const rotation of [0, 1] as const) {
    const extreme = yield* extremesAt(topology, request, factors, rotation);
    if (extreme) ends.push({ value: travel(rotation), extreme });
  }
  return marginOf(worstReach(ends), request.window);
}

/** A knob gets turned to the stop: neither end of it may be a fault. */
function endsAreSafe(topology: AnyTopology, request: TrimRequest, parts: PlainValues): boolean {
  const { conditions } = benchOf(topology, request);
  return [0, 1].every((rotation) => {
    turn(topology, conditions, request.knob, rotation);
    return analyseStage(topology, { parts, conditions }).warnings.every(({ severity }) => severity !== "fault");
  });
}

/** Pots that turn together take the same values, each with its own padding. */
function withValues(
  parts: PlainValues,
  turned: readonly TurnedPot[],
  pot: number,
  padding: readonly number[],
): PlainValues {
  const next = { ...parts };
  for (const one of turned) {
    next[one.pot] = pot;
    one.padding.forEach((part, i) => (next[part] = padding[i]!));
  }
  return next;
}

function changed(before: PlainValues, after: PlainValues): PlainValues {
  return Object.fromEntries(Object.entries(after).filter(([part, value]) => value !== before[part])) as PlainValues;
}

/** Sold steps from a thirtieth to thirty times what is fitted. */
function potsAround(topology: AnyTopology, parts: PlainValues, pot: string): number[] {
  const [least, most] = acceptedRange(topology.parts[pot]!);
  const from = Math.max(least, parts[pot]! / 30, 1);
  return seriesBetween("pots", from, Math.min(most, parts[pot]! * 30));
}

/** Steps of E6 that matter beside this pot or beside what is fitted; nothing, where that is allowed. */
function coarse(topology: AnyTopology, part: string, around: number, pot: number): number[] {
  const [least, most] = acceptedRange(topology.parts[part]!);
  const centre = around > 0 ? around : pot;
  const [from, to] = [Math.min(centre / 30, pot / 30), Math.max(centre * 30, pot * 3)];
  const steps = seriesBetween("E6", Math.max(from, least, 1e-3), Math.min(to, most));
  return least === 0 ? [0, ...steps] : steps;
}

/** Values of E24 from one step of E6 below to one above. */
const fine = (value: number): number[] => (value === 0 ? [0] : seriesBetween("E24", value / 1.6, value * 1.6));

function* combinations(choices: readonly (readonly number[])[]): Generator<number[]> {
  const [first = [], ...rest] = choices;
  if (choices.length === 0) return yield [];
  for (const value of first) for (const others of combinations(rest)) yield [value, ...others];
}
