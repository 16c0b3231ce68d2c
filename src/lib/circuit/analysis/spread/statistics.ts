import { binomialBounds } from "../../numeric/binomialBounds.ts";
import { quantile } from "../../numeric/quantile.ts";
import type { ResultWindows } from "./request.ts";

export const bandShares = [0.05, 0.5, 0.95] as const;

export interface ResultSpread {
  mean: number;
  /** Of the sample: the sum of squares is divided by one less than the boards. */
  standardDeviation: number;
  quantiles: Record<"0.05" | "0.5" | "0.95", number>;
  /** Boards on which the result has no meaning; they count as failed where a window asks for it. */
  missing?: number;
}

/** Undefined where no board gives a figure. */
export function spreadOf(values: Float64Array): ResultSpread | undefined {
  const sorted = values.filter((value) => !Number.isNaN(value)).sort();
  if (sorted.length === 0) return undefined;
  const mean = sum(sorted) / sorted.length;
  const squares = sorted.reduce((total, value) => total + (value - mean) ** 2, 0);
  const missing = values.length - sorted.length;
  const [low, half, high] = bandShares.map((share) => quantile(sorted, share));
  return {
    mean,
    standardDeviation: sorted.length === 1 ? 0 : Math.sqrt(squares / (sorted.length - 1)),
    quantiles: { "0.05": low!, "0.5": half!, "0.95": high! },
    ...(missing > 0 && { missing }),
  };
}

const sum = (values: Float64Array) => values.reduce((total, value) => total + value, 0);

export interface Yield {
  /** Share of the boards. */
  value: number;
  low: number;
  high: number;
  passed: number;
}

/** The share that passes, with the exact 95 % bounds on what it stands for. */
export function yieldOf(passed: number, boards: number): Yield {
  return { value: passed / boards, ...binomialBounds(passed, boards), passed };
}

/** Whether a board keeps every window. */
export function passesWindows(windows: ResultWindows, figure: (name: string) => number): boolean {
  for (const name in windows) {
    const { least = -Infinity, most = Infinity } = windows[name]!;
    const value = figure(name);
    // Written so that a missing figure, NaN, fails.
    if (!(value >= least && value <= most)) return false;
  }
  return true;
}
