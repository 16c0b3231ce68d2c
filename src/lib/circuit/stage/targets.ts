import type { AnyTopology } from "./topology.ts";
import type { PlainValues } from "./defaults.ts";

export type TargetState = "within" | "close" | "outside";
export type Windows = Record<string, { least: number; most: number; target: number }>;

/** Past this share of the window a result is called close to the edge. */
const closeShare = 0.8;

/** Least and most of each given target: the target by (1 ± window). */
export function targetWindows(topology: AnyTopology, targets: PlainValues, widths: PlainValues = {}): Windows {
  return Object.fromEntries(
    Object.entries(targets).map(([key, target]) => {
      const width = widths[key] ?? topology.targets[key]!.window;
      return [key, { least: target * (1 - width), most: target * (1 + width), target }];
    }),
  );
}

/** Whether each result lies within its window, close to its edge, or outside. A missing result is outside. */
export function targetStates(
  topology: AnyTopology,
  results: Record<string, number | readonly number[]>,
  windows: Windows,
): Record<string, TargetState> {
  return Object.fromEntries(
    Object.entries(windows).map(([key, { least, most, target }]) => {
      const value = results[topology.targets[key]!.result];
      if (typeof value !== "number") return [key, "outside"];
      const share = value >= target ? (value - target) / (most - target) : (target - value) / (target - least);
      const state: TargetState = share <= closeShare ? "within" : share <= 1 ? "close" : "outside";
      return [key, Number.isNaN(share) ? "within" : state];
    }),
  );
}
