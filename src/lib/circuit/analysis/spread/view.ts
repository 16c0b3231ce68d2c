import type { PlainValues } from "../../stage/defaults.ts";
import type { Band } from "./band.ts";
import { relativeSlopes } from "./slopes.ts";
import type { SpreadRun } from "./spread.ts";
import { spreadOf, yieldOf, type ResultSpread, type Yield } from "./statistics.ts";
import type { WorstCase } from "./worstCase.ts";

/** What somebody looks at while boards are being drawn. */
export interface SpreadLook {
  /** Whose histogram is drawn, and what stands on the x axis of the scatter. */
  result: string;
  /** The y axis of the scatter. */
  against?: string;
}

export interface Histogram {
  from: number;
  to: number;
  /** Boards in each of the equal steps between. */
  counts: number[];
}

export interface SpreadView {
  done: number;
  of: number;
  nominal: PlainValues;
  yield?: Yield;
  /** Share of the boards that keep each window by itself. */
  windows: PlainValues;
  result?: ResultSpread;
  rootSumSquare?: number;
  worstCase?: WorstCase;
  /** d ln result / d ln part, where the result is not zero. */
  sensitivities: PlainValues;
  histogram?: Histogram;
  /** The first boards: x, y, and whether each is good. */
  scatter?: { x: number[]; y: number[]; good: boolean[] };
  band?: Band;
}

const bins = 40;
const mostDots = 500;

/** The figures of a run as it stands, cheap enough to be taken several times a second. */
export function viewSpread(run: SpreadRun, { result, against }: SpreadLook): SpreadView {
  const { request, done } = run;
  const values = run.values(result);
  const spread = done > 0 ? spreadOf(values) : undefined;
  const histogram = spread && histogramOf(values);
  const band = run.band();
  return {
    done,
    of: request.boards,
    nominal: run.nominal,
    ...(done > 0 && Object.keys(request.window ?? {}).length > 0 && { yield: yieldOf(run.passed, done) }),
    windows: windowShares(run),
    ...(spread && { result: spread }),
    ...(run.rootSumSquare[result] !== undefined && { rootSumSquare: run.rootSumSquare[result] }),
    ...(run.worstCase && { worstCase: run.worstCase }),
    sensitivities: relativeSlopes(run.slopes, run.nominal)[result] ?? {},
    ...(histogram && { histogram }),
    ...(against !== undefined && done > 0 && { scatter: scatterOf(run, result, against) }),
    ...(band && { band }),
  };
}

function windowShares({ request, done, values }: SpreadRun): PlainValues {
  if (done === 0) return {};
  return Object.fromEntries(
    Object.entries(request.window ?? {}).map(([name, { least = -Infinity, most = Infinity }]) => {
      let kept = 0;
      for (const value of values(name)) if (value >= least && value <= most) kept++;
      return [name, kept / done];
    }),
  );
}

/** Undefined where every board gives the same, since there is nothing to divide. */
export function histogramOf(values: ArrayLike<number>): Histogram | undefined {
  let [from, to] = [Infinity, -Infinity];
  for (let i = 0; i < values.length; i++) {
    if (values[i]! < from) from = values[i]!;
    if (values[i]! > to) to = values[i]!;
  }
  if (!(to - from > 1e-12 * Math.max(Math.abs(from), Math.abs(to)))) return undefined;
  const counts = new Array<number>(bins).fill(0);
  for (let i = 0; i < values.length; i++) {
    const place = Math.floor(((values[i]! - from) / (to - from)) * bins);
    if (!Number.isNaN(place)) counts[Math.min(place, bins - 1)]!++;
  }
  return { from, to, counts };
}

function scatterOf(run: SpreadRun, result: string, against: string): NonNullable<SpreadView["scatter"]> {
  const [xs, ys] = [run.values(result), run.values(against)];
  const passes = run.passes();
  const scatter: NonNullable<SpreadView["scatter"]> = { x: [], y: [], good: [] };
  for (let board = 0; board < run.done && scatter.x.length < mostDots; board++) {
    if (Number.isNaN(xs[board]!) || Number.isNaN(ys[board]!)) continue;
    scatter.x.push(xs[board]!);
    scatter.y.push(ys[board]!);
    scatter.good.push(passes[board] === 1);
  }
  return scatter;
}
