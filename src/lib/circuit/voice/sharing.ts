import { analyseStage } from "../stage/analyse.ts";
import type { TargetState } from "../stage/targets.ts";
import type { ComputedChain, ComputedStage } from "./compute.ts";
import { byValue, type ListedPart, type PartsList } from "./partsList.ts";

export interface ShareHint {
  /** The part that alone has its value. */
  part: ListedPart;
  /** A value that other parts have, near enough that every target of the stage stays as well met; absent where there is none. */
  instead?: { value: number; designators: string[] };
}

/** How far, as a ratio, a value may move to one that others have. */
const farthest = 1.12;
const severity: Record<TargetState, number> = { within: 0, close: 1, outside: 2 };

/** Values used only once on a board cost a reel each: which, and which of them could be one that other parts have. */
export function shareHints(list: PartsList, computed: ComputedChain): ShareHint[] {
  const groups = byValue(list.parts);
  const single = groups.filter(({ designators }) => designators.length === 1);
  return single.flatMap((group): ShareHint[] => {
    const part = list.parts.find(
      (one) => one.quantity > 0 && one.partClass === group.partClass && one.value === group.value,
    )!;
    if (part.partClass === "pot") return [];
    const stage = computed.stages.get(part.stage);
    const near = groups
      .filter((other) => other !== group && other.partClass === group.partClass && other.type === group.type)
      .map((other) => ({ other, distance: Math.abs(Math.log(other.value / part.value)) }))
      .filter(({ distance }) => distance <= Math.log(farthest))
      .sort((a, b) => a.distance - b.distance);
    const fit = stage && near.find(({ other }) => keepsTargets(stage, part.part, other.value));
    return [{ part, ...(fit && { instead: { value: fit.other.value, designators: fit.other.designators } }) }];
  });
}

/** Whether no target is met less well and nothing new is warned of. */
function keepsTargets({ stage, found, conditions, analysis }: ComputedStage, part: string, value: number): boolean {
  const parts = { ...stage.parts, [part]: value };
  const next = analyseStage(found.topology, {
    ...{ parts, conditions, targets: stage.targets },
    ...(stage.windows && { windows: stage.windows }),
  });
  const known = new Set(analysis.warnings.map(({ code }) => code));
  return (
    next.warnings.every(({ code, severity: how }) => how === "note" || known.has(code)) &&
    Object.entries(next.state).every(([key, state]) => severity[state] <= severity[analysis.state[key]!])
  );
}
