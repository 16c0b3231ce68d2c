import type { DocumentStage, VoiceDocument } from "../voice/document.ts";

export interface StagePairs {
  added: DocumentStage[];
  removed: DocumentStage[];
  /** In the order of the newer side. */
  kept: { from: DocumentStage; to: DocumentStage }[];
}

/** Tells which stage of one side became which of the other. */
export type SameStage = (from: DocumentStage, to: DocumentStage) => boolean;

/** Inside one voice a stage keeps its id for life. */
const byId: SameStage = (from, to) => from.id === to.id && from.kind === to.kind;

/** Two voices share no ids but those of templates, so likeness decides: first the name, then the kind alone. */
const byLikeness: readonly SameStage[] = [
  byId,
  (from, to) => from.kind === to.kind && from.name === to.name,
  (from, to) => from.kind === to.kind && from.topology === to.topology,
  (from, to) => from.kind === to.kind,
];

/** Pairs the stages of two documents; each stage is in one pair at most. */
export function pairStages(from: VoiceDocument, to: VoiceDocument, ofOneVoice: boolean): StagePairs {
  const left = new Set(from.stages);
  const partner = new Map<DocumentStage, DocumentStage>();
  for (const same of ofOneVoice ? [byId] : byLikeness) {
    for (const stage of to.stages) {
      if (partner.has(stage)) continue;
      const found = [...left].find((candidate) => same(candidate, stage));
      if (!found) continue;
      left.delete(found);
      partner.set(stage, found);
    }
  }
  return {
    added: to.stages.filter((stage) => !partner.has(stage)),
    removed: from.stages.filter((stage) => left.has(stage)),
    kept: to.stages.flatMap((stage) => {
      const before = partner.get(stage);
      return before ? [{ from: before, to: stage }] : [];
    }),
  };
}
