import { solveBracketed } from "../../numeric/solveBracketed.ts";
import type { Range } from "../spread/request.ts";

/** A result over the rotation of a board, NaN where it has none. */
export type Travel = (rotation: number) => number;

/** Fine enough that no law, curve or two segments, turns between two of them unseen. */
const steps = 48;

/** Share of the travel over which the result lies within the window. */
export function usefulRotation(travel: Travel, { least, most }: Range, relativeTolerance = 1e-9): number {
  let useful = 0;
  let [from, before] = [0, travel(0)];
  for (let i = 1; i <= steps; i++) {
    const to = i / steps;
    const after = travel(to);
    useful += shareWithin(travel, { least, most }, [from, to], [before, after], relativeTolerance);
    [from, before] = [to, after];
  }
  return useful;
}

function shareWithin(
  travel: Travel,
  { least, most }: Range,
  [from, to]: readonly [number, number],
  [before, after]: readonly [number, number],
  tolerance: number,
): number {
  const inside = (value: number) => value >= least && value <= most;
  if (inside(before) && inside(after)) return to - from;
  if ((before < least && after < least) || (before > most && after > most) || Number.isNaN(before + after)) return 0;
  const crossing = (bound: number) => solveBracketed((x) => travel(x) - bound, from, to, tolerance);
  const [low, high] = before < after ? [before, after] : [after, before];
  // Where the window's side lies within the stretch, the result crosses it once.
  const ends = [low < least ? crossing(least) : undefined, high > most ? crossing(most) : undefined];
  const rising = before < after;
  const start = (rising ? ends[0] : ends[1]) ?? from;
  const end = (rising ? ends[1] : ends[0]) ?? to;
  return Math.max(0, end - start);
}

/** Where the result is met, or undefined where no rotation gives it. Takes a result that rises or falls all the way. */
export function rotationFor(travel: Travel, value: number, tolerance = 1e-9): number | undefined {
  const [start, end] = [travel(0) - value, travel(1) - value];
  if (start === 0) return 0;
  if (end === 0) return 1;
  if (!(start * end < 0)) return undefined;
  return solveBracketed((x) => travel(x) - value, 0, 1, tolerance);
}

const smallTurn = 1e-4;

/** d result / d rotation, over a turn far smaller than any law bends over. */
export function slopeAt(travel: Travel, rotation: number): number {
  const [from, to] = [Math.max(0, rotation - smallTurn), Math.min(1, rotation + smallTurn)];
  return (travel(to) - travel(from)) / (to - from);
}
