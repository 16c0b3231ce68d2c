import type { AnyTopology } from "./topology.ts";
import type { PlainValues } from "./defaults.ts";

export type TargetState = "within" | "close" | "outside";
export type Windows = Record<string, { least: number; most: number; target: number }>;

/** Past this share of the window a result is called close to the edge. */
const closeShare = 0.8;

/** Least and most of each given target: the target by (1 ± window). */
export function targetWindows(topology: AnyTopology, targets: PlainValues, widths: PlainValues = {}): Windows {
  const windows: Windows = {};
  for (const key in targets) {
    const target = targets[key]!;
    const width = widths[key] ?? topology.targets[key]!.window;
    windows[key] = { least: target * (1 - width), most: target * (1 + width), target };
  }
  return windows;
}

/** Whether each result lies within its window, close to its edge, or outside. A missing result is outside. */
export function targetStates(
  topology: AnyTopology,
  results: Record<string, number | readonly number[]>,
  windows: Windows,
): Record<string, TargetState> {
  const states: Record<string, TargetState> = {};
  for (const key in windows) states[key] = stateOf(results[topology.targets[key]!.result], windows[key]!);
  return states;
}

function stateOf(value: number | readonly number[] | undefined, { least, most, target }: Windows[string]): TargetState {
  if (typeof value !== "number") return "outside";
  const share = value >= target ? (value - target) / (most - target) : (target - value) / (target - least);
  // A window without width that is met exactly.
  if (Number.isNaN(share) || share <= closeShare) return "within";
  return share <= 1 ? "close" : "outside";
}
