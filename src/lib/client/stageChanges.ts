import type { WorkingCopyDocument } from "./workingCopy.ts";

/** The document with the stage one place earlier (−1) or later (1); where there is no such place, as it is. */
export function withStageMoved(document: WorkingCopyDocument, stageId: string, by: -1 | 1): WorkingCopyDocument {
  const from = document.stages.findIndex(({ id }) => id === stageId);
  const to = from + by;
  if (from === -1 || to < 0 || to >= document.stages.length) return document;
  const stages = [...document.stages];
  stages.splice(to, 0, ...stages.splice(from, 1));
  return { ...document, stages };
}

export function withStageRenamed(document: WorkingCopyDocument, stageId: string, name: string): WorkingCopyDocument {
  return { ...document, stages: document.stages.map((stage) => (stage.id === stageId ? { ...stage, name } : stage)) };
}

/** Whether both hold the same stages with the same values, whatever their names and order. */
export function sameStages(one: WorkingCopyDocument, other: WorkingCopyDocument): boolean {
  const values = ({ stages }: WorkingCopyDocument) =>
    new Map(stages.map(({ id, name: _, ...rest }): [string, string] => [id, JSON.stringify(rest)]));
  const [left, right] = [values(one), values(other)];
  return left.size === right.size && [...left].every(([id, text]) => right.get(id) === text);
}
