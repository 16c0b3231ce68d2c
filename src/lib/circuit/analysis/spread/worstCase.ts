import type { Bench } from "./bench.ts";
import { figureOf } from "./bench.ts";
import { setParts, type Factor } from "./factors.ts";
import { referenceTemperature, type Range, type BoardsRequest } from "./request.ts";

/** Combinations analysed at most; where the corners are more, the sign of each slope picks them. */
const mostCombinations = 2048;
/** With middles besides: they grow as powers of three, and the corners alone are nearly always enough. */
const mostWithMiddles = 300;

export interface WorstCase {
  results: Record<string, Range>;
  method: "every corner" | "every corner and middle" | "corners by sign";
  /** Results that turn back between the ends of a part, so that their extreme may lie inside. */
  turning: string[];
}

export const worstCaseStatements: Record<WorstCase["method"], string> = {
  "every corner": "Every combination of parts at the ends of their tolerances.",
  "every corner and middle":
    "Every combination of parts at the ends of their tolerances, and at the middle of those that turn a result back.",
  "corners by sign":
    "The corners are too many to try them all: for each result, every part at the end that its own slope points to, then each part tried at its other end.",
};

type Corner = readonly number[];

/**
 * The extremes of every result over the tolerances, at either end of the temperature range. Yields as it goes, once for
 * each analysis.
 */
export function* worstCaseOf(
  bench: Bench,
  factors: readonly Factor[],
  request: BoardsRequest,
  names: readonly string[],
): Generator<void, WorstCase> {
  const temperatures = endsOf(request.temperature);
  const results: Record<string, Range> = {};
  const note = (name: string, value: number) => {
    if (Number.isNaN(value)) return;
    const range = (results[name] ??= { least: value, most: value });
    range.least = Math.min(range.least, value);
    range.most = Math.max(range.most, value);
  };
  const at = (corner: Corner, temperature: number) => {
    corner.forEach((level, i) => setLevel(bench, factors[i]!, level, temperature));
    const measured = bench.measure(temperature);
    for (const name of names) note(name, figureOf(measured, name));
    return measured;
  };

  const centre = factors.map(() => 0);
  const middle = at(centre, temperatures[0]!);
  const signs = new Map(names.map((name) => [name, factors.map(() => 1)]));
  const turning = new Set<string>();
  const bent = factors.map(() => false);
  for (let i = 0; i < factors.length; i++) {
    const [low, high] = [-1, 1].map((level) => at(centre.with(i, level), temperatures[0]!));
    yield;
    for (const name of names) {
      const rise = figureOf(high!, name) - figureOf(middle, name);
      const before = figureOf(middle, name) - figureOf(low!, name);
      signs.get(name)![i] = rise + before < 0 ? -1 : 1;
      if (!turnsBack(before, rise, figureOf(middle, name))) continue;
      turning.add(name);
      bent[i] = true;
    }
  }

  const levels = bent.map((turns) => (turns ? [-1, 0, 1] : [-1, 1]));
  const plain = levels.map(() => [-1, 1]);
  const fits = (choices: typeof levels, most: number) => sizeOf(choices) * temperatures.length <= most;
  const withMiddles = bent.some(Boolean) && fits(levels, mostWithMiddles);
  const every = withMiddles ? levels : fits(plain, mostCombinations) ? plain : undefined;
  for (const temperature of temperatures) {
    if (every) {
      for (const corner of corners(every)) {
        at(corner, temperature);
        yield;
      }
    } else {
      for (const name of names) yield* climb(name, signs.get(name)!, (corner) => at(corner, temperature));
    }
  }
  bench.clear();
  const method = !every ? "corners by sign" : withMiddles ? "every corner and middle" : "every corner";
  return { results, method, turning: [...turning] };
}

/** From the corner that the signs point to, for the most and for the least, one flip of each part. */
function* climb(name: string, signs: Corner, at: (corner: Corner) => Parameters<typeof figureOf>[0]): Generator<void> {
  for (const direction of [1, -1]) {
    let best = signs.map((sign) => sign * direction);
    let reached = figureOf(at(best), name) * direction;
    for (let i = 0; i < best.length; i++) {
      const flipped = best.with(i, -best[i]!);
      const value = figureOf(at(flipped), name) * direction;
      yield;
      if (value > reached) [best, reached] = [flipped, value];
    }
  }
}

function setLevel(bench: Bench, factor: Factor, level: number, temperature: number): void {
  // More drift means a smaller value on the cold side.
  const lean = temperature < referenceTemperature ? -level : level;
  setParts(bench.parts, factor, level, lean, temperature);
}

/** The rounding of a result that a part does not move is no turn. */
const turnsBack = (before: number, after: number, value: number) =>
  before * after < 0 && Math.min(Math.abs(before), Math.abs(after)) > 1e-9 * Math.abs(value);

const endsOf = (range: Range | undefined) =>
  range === undefined ? [referenceTemperature] : range.least === range.most ? [range.least] : [range.least, range.most];

const sizeOf = (choices: readonly (readonly number[])[]) => choices.reduce((size, { length }) => size * length, 1);

function* corners(choices: readonly (readonly number[])[]): Generator<Corner> {
  for (let n = 0, size = sizeOf(choices); n < size; n++) {
    let rest = n;
    yield choices.map((levels) => {
      const level = levels[rest % levels.length]!;
      rest = Math.floor(rest / levels.length);
      return level;
    });
  }
}
