import { targetStates, targetWindows, type TargetState, type Windows } from "../stage/targets.ts";
import type { AnyTopology } from "../stage/topology.ts";
import type { Analysis } from "../stage/analyse.ts";
import type { Unit } from "../quantity/units.ts";
import type { DocumentStage } from "../voice/document.ts";
import { changeOf, isSameFigure } from "./values.ts";

/** Against the window: nearer or farther than before, still where it was, or a figure nobody set a target for. */
export type Verdict = "better" | "worse" | "held" | "no target";

export interface ResultChange {
  stage: string;
  name: string;
  label: string;
  unit: Unit;
  /** Several figures where the result is a list. Absent where the side has none. */
  from?: number | readonly number[];
  to?: number | readonly number[];
  change?: number;
  verdict: Verdict;
  /** How each side meets the window that now holds. */
  states?: { from: TargetState; to: TargetState };
}

export interface AnalysedStage {
  stage: DocumentStage;
  topology: AnyTopology | undefined;
  results: Analysis["results"];
}

const rank: Record<TargetState, number> = { within: 0, close: 1, outside: 2 };

const sameResult = (from: Analysis["results"][string] | undefined, to: Analysis["results"][string] | undefined) => {
  if (typeof from === "number" || typeof to === "number" || from === undefined || to === undefined) {
    return typeof from !== "object" && typeof to !== "object" && isSameFigure(from, to);
  }
  return from.length === to.length && from.every((value, index) => isSameFigure(value, to[index]));
};

/**
 * Results whose figure differs. Both sides are judged by the window that now holds, so that a target which was moved cannot
 * hide what became of the figure; where the newer side has none, by the older one's.
 */
export function changedResults(from: AnalysedStage, to: AnalysedStage): ResultChange[] {
  const windows: Windows = { ...windowsOf(from), ...windowsOf(to) };
  const names = [
    ...new Set([...Object.keys(to.topology?.results ?? {}), ...Object.keys(from.topology?.results ?? {})]),
  ];
  return names.flatMap((name): ResultChange[] => {
    const [before, now] = [from.results[name], to.results[name]];
    if (sameResult(before, now)) return [];
    const field = (to.topology?.results[name] ?? from.topology?.results[name])!;
    const numbers = typeof before !== "object" && typeof now !== "object";
    return [
      {
        ...{ stage: to.stage.id, name, label: field.label, unit: field.unit },
        ...(numbers
          ? changeOf(before, now)
          : { ...(before === undefined ? {} : { from: before }), ...(now === undefined ? {} : { to: now }) }),
        ...verdictOf(name, from, to, windows),
      },
    ];
  });
}

function windowsOf({ stage, topology }: AnalysedStage): Windows {
  return topology ? targetWindows(topology, stage.targets, stage.windows) : {};
}

function verdictOf(
  result: string,
  from: AnalysedStage,
  to: AnalysedStage,
  windows: Windows,
): Pick<ResultChange, "verdict" | "states"> {
  const judge = to.topology ?? from.topology;
  const target = Object.keys(windows).find((key) => judge?.targets[key]?.result === result);
  const window = target === undefined ? undefined : windows[target];
  if (!judge || target === undefined || !window) return { verdict: "no target" };
  const stateOf = (side: AnalysedStage) => targetStates(judge, side.results, { [target]: window })[target]!;
  const states = { from: stateOf(from), to: stateOf(to) };
  if (states.from !== states.to) return { verdict: rank[states.to] < rank[states.from] ? "better" : "worse", states };
  if (states.to !== "outside") return { verdict: "held", states };
  const [before, now] = [distance(from.results[result], window.target), distance(to.results[result], window.target)];
  return { verdict: now < before ? "better" : now > before ? "worse" : "held", states };
}

const distance = (value: Analysis["results"][string] | undefined, target: number) =>
  typeof value === "number" ? Math.abs(value - target) : Infinity;
