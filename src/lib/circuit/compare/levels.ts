import type { Level } from "../voice/levels.ts";
import { isSameFigure } from "./values.ts";

/** A level at one point of the chain: V RMS, V peak, and dB to where it clips. */
export type LevelSide = Pick<Level, "rms" | "peak" | "headroomDb">;

export interface LevelChange {
  node: string;
  stage: string;
  label: string;
  from?: LevelSide;
  to?: LevelSide;
}

const sideOf = ({ rms, peak, headroomDb }: Level): LevelSide => ({
  rms,
  peak,
  ...(headroomDb === undefined ? {} : { headroomDb }),
});

/** Points of the chain whose level differs, in the order of the newer side; those that are gone at the end. */
export function changedLevels(
  from: readonly Level[],
  to: readonly Level[],
  renamed: ReadonlyMap<string, string>,
): LevelChange[] {
  const nodeOf = ({ node, stage }: Level) => {
    const now = renamed.get(stage) ?? stage;
    return node.startsWith(`${stage}.`) ? `${now}${node.slice(stage.length)}` : node;
  };
  const before = new Map(from.map((level) => [nodeOf(level), level]));
  const changed = to.flatMap((level): LevelChange[] => {
    const old = before.get(level.node);
    before.delete(level.node);
    const same =
      old !== undefined &&
      isSameFigure(old.rms, level.rms) &&
      isSameFigure(old.peak, level.peak) &&
      isSameFigure(old.headroomDb, level.headroomDb);
    if (same) return [];
    const { node, stage, label } = level;
    return [{ node, stage, label, ...(old && { from: sideOf(old) }), to: sideOf(level) }];
  });
  const gone = [...before].map(([node, level]): LevelChange => ({
    ...{ node, stage: renamed.get(level.stage) ?? level.stage, label: level.label },
    from: sideOf(level),
  }));
  return [...changed, ...gone];
}
