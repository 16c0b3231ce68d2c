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
