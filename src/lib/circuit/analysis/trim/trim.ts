import { analyseStage } from "../../stage/analyse.ts";
import type { AnyTopology } from "../../stage/topology.ts";
import type { Warning } from "../../stage/warning.ts";
import { benchOf, figureOf, type Bench } from "../spread/bench.ts";
import { boardsOf } from "../spread/boards.ts";
import { factorsOf, type Factor } from "../spread/factors.ts";
import { referenceTemperature, type Range } from "../spread/request.ts";
import { yieldOf, type Yield } from "../spread/statistics.ts";
import { worstCaseOf } from "../spread/worstCase.ts";
import type { TrimRequest } from "./request.ts";
import { rotationFor, slopeAt, usefulRotation, type Travel } from "./travel.ts";
import { turn } from "./turning.ts";

export interface TrimEnd {
  rotation: 0 | 1;
  value: number;
  /** Of any board. */
  extreme: Range;
  /** What the stage has to say there: a current that is too large. */
  warnings: Warning[];
}

export interface TrimFigures {
  /** The nominal board at even steps of rotation. */
  travel: [rotation: number, value: number][];
  /** Share of the travel inside the window, and the same in degrees. */
  usefulRotation: number;
  usefulDegrees: number;
  /** Where the middle of the window lies; absent where no rotation reaches it. */
  centre?: number;
  /** At that rotation: d result per degree, and as a share of the result. */
  slopePerDegree?: number;
  sensitivityPerDegree?: number;
  ends: TrimEnd[];
  /** What every board reaches; absent where the tolerances eat the whole travel. */
  reach?: Range;
  /** By which the worst board reaches past the window, as a share; below zero it does not reach. */
  worstCaseMargin: number;
}

export interface TrimCoverage {
  boards: number;
  target: number;
  /** Boards on which the target lies within reach. */
  ofTarget: Yield;
  /** Boards that reach the whole window. */
  ofWindow: Yield;
  /** Boards over the rotation at which they meet the target, in even steps of the travel. */
  rotations: number[];
}

const travelPoints = 91;
/** Steps of ten degrees on a usual pot. */
const rotationSteps = 27;
/** A knob is set by hand to no better than this share of its travel. */
const handTolerance = 1e-4;

export const middleOf = ({ least, most }: Range) => (least + most) / 2;

/** A board's result over the rotation; turns the bench's own conditions. */
export function travelOn(
  topology: AnyTopology,
  bench: Bench,
  { knob, result }: TrimRequest,
  temperature: number,
): Travel {
  return (rotation) => {
    turn(topology, bench.conditions, knob, rotation);
    return figureOf(bench.measure(temperature), result);
  };
}

/** The middle of the boards' temperatures. */
export const nominalTemperature = ({ temperature }: TrimRequest) =>
  temperature ? (temperature.least + temperature.most) / 2 : referenceTemperature;

/** What a knob does on the nominal board and at worst case. Gives way as it goes. */
export function* trimFigures(topology: AnyTopology, request: TrimRequest): Generator<void, TrimFigures> {
  const { window, knob } = request;
  const bench = benchOf(topology, request);
  const travel = travelOn(topology, bench, request, nominalTemperature(request));
  const points: TrimFigures["travel"] = [];
  for (let i = 0; i < travelPoints; i++) {
    const rotation = i / (travelPoints - 1);
    const value = travel(rotation);
    if (!Number.isNaN(value)) points.push([rotation, value]);
    yield;
  }
  const useful = usefulRotation(travel, window);
  const centre = rotationFor(travel, middleOf(window));
  const ends: TrimEnd[] = [];
  for (const rotation of [0, 1] as const) {
    const extreme = yield* extremesAt(topology, request, factorsOf(topology, request), rotation);
    const value = travel(rotation);
    if (extreme && !Number.isNaN(value)) ends.push({ rotation, value, extreme, warnings: warningsAt(topology, bench) });
  }
  const worst = worstReach(ends);
  const slope = centre === undefined ? undefined : slopeAt(travel, centre) / knob.electricalAngle;
  return {
    travel: points,
    usefulRotation: useful,
    usefulDegrees: useful * knob.electricalAngle,
    ...(centre !== undefined && { centre }),
    ...(slope !== undefined && { slopePerDegree: slope, sensitivityPerDegree: Math.abs(slope / middleOf(window)) }),
    ends,
    ...(worst.least < worst.most && { reach: worst }),
    worstCaseMargin: marginOf(worst, window),
  };
}

/** The extremes of the result over every corner of tolerance, at one rotation. */
export function* extremesAt(
  topology: AnyTopology,
  request: TrimRequest,
  factors: readonly Factor[],
  rotation: 0 | 1,
): Generator<void, Range | undefined> {
  const bench = benchOf(topology, request);
  turn(topology, bench.conditions, request.knob, rotation);
  return (yield* worstCaseOf(bench, factors, request, [request.result])).results[request.result];
}

/** From the highest that the low end may lie to the lowest that the high end may lie. */
export function worstReach(ends: readonly Pick<TrimEnd, "value" | "extreme">[]): Range {
  if (ends.length < 2) return { least: Infinity, most: -Infinity };
  const [low, high] = [...ends].sort((a, b) => a.value - b.value);
  return { least: low!.extreme.most, most: high!.extreme.least };
}

/** The tighter of both sides: as a ratio of what is wanted to what is reached, or in window widths where that has no sign. */
export function marginOf(reach: Range, window: Range): number {
  if (reach.least === Infinity) return -1;
  if (window.least > 0 && reach.least > 0)
    return Math.min(reach.most / window.most - 1, window.least / reach.least - 1);
  return Math.min(reach.most - window.most, window.least - reach.least) / (window.most - window.least);
}

function warningsAt(topology: AnyTopology, { parts, conditions }: Bench): Warning[] {
  return analyseStage(topology, { parts: { ...parts }, conditions: { ...conditions } }).warnings.filter(
    ({ severity }) => severity !== "note",
  );
}

/**
 * The share of random boards whose target lies within reach, and where their knobs end up. Yields the coverage so far
 * after each board.
 */
export function* trimCoverage(topology: AnyTopology, request: TrimRequest): Generator<TrimCoverage, TrimCoverage> {
  const { window, target = middleOf(window) } = request;
  const bench = benchOf(topology, request);
  const draw = boardsOf(request, factorsOf(topology, request));
  let [targets, windows] = [0, 0];
  const rotations = new Array<number>(rotationSteps).fill(0);
  const seen = (boards: number): TrimCoverage => ({
    boards,
    target,
    ofTarget: yieldOf(targets, boards),
    ofWindow: yieldOf(windows, boards),
    rotations: [...rotations],
  });
  for (let board = 0; board < request.boards; board++) {
    const travel = travelOn(topology, bench, request, draw(board, bench.parts));
    const [a, b] = [travel(0), travel(1)];
    if (Math.min(a, b) <= window.least && Math.max(a, b) >= window.most) windows++;
    const rotation = rotationFor(travel, target, handTolerance);
    if (rotation !== undefined) {
      targets++;
      rotations[Math.min(rotationSteps - 1, Math.floor(rotation * rotationSteps))]!++;
    }
    if (board + 1 < request.boards) yield seen(board + 1);
  }
  return seen(request.boards);
}
