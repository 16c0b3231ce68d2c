import type { StageWarning, VoiceAnalysis } from "#lib/circuit/index.ts";
import type { Actor } from "#lib/policy/index.ts";
import type { Person } from "#lib/wire/page.ts";
import type { RevisionAnswer, RevisionSummary } from "#lib/wire/revision.ts";
import { rightsOf, type RevisionRow, type SummaryRow } from "./load.ts";

export interface AcceptedWarning {
  stage: string;
  code: string;
}

const personOr = (id: string | null, name: string | null): Person | null => (name === null ? null : { id, name });

export function presentSummary(row: SummaryRow, voice: { teamId: string }, actor: Actor | null): RevisionSummary {
  return {
    id: row.id,
    number: row.number,
    reason: row.reason,
    status: row.status,
    createdAt: row.createdAt.toISOString(),
    updatedAt: row.updatedAt.toISOString(),
    createdBy: { id: row.authorId, name: row.authorName },
    libraryVersion: row.libraryVersion,
    stageCount: row.stageCount,
    warningCount: row.warningCount,
    review: {
      askedAt: row.askedAt?.toISOString() ?? null,
      askedBy: personOr(row.askedById, row.askedByName),
      reviewer: personOr(row.reviewerId, row.reviewerName),
      decision: row.decision,
      decidedAt: row.decidedAt?.toISOString() ?? null,
      decidedBy: personOr(row.decidedById, row.decidedByName),
      note: row.decisionNote,
    },
    can: rightsOf(actor, voice, row),
  };
}

// Only what this server computed or checked is ever kept, and the database refuses every change of it.
export const keptInputsOf = (row: RevisionRow) => row.inputs as RevisionAnswer["inputs"];
export function keptAnalysisOf(row: RevisionRow): VoiceAnalysis {
  // Early revisions were kept without what the chain decides.
  return { conditions: {}, levels: [], ...(row.analysis as Omit<VoiceAnalysis, "conditions" | "levels">) };
}
const acceptedOf = (row: RevisionRow) => row.acceptedWarnings as AcceptedWarning[];

/** Its warnings, and which of them the author meant to stay. */
export function keptWarningsOf(row: RevisionRow): (StageWarning & { accepted: boolean })[] {
  const accepted = [...acceptedOf(row), ...(keptInputsOf(row).accepted ?? [])];
  return keptAnalysisOf(row).warnings.map((warning) => ({
    ...warning,
    accepted: accepted.some(({ stage, code }) => stage === warning.stage && code === warning.code),
  }));
}

export function presentRevision(row: RevisionRow, voice: { teamId: string }, actor: Actor | null): RevisionAnswer {
  const { results, states } = keptAnalysisOf(row);
  return {
    ...presentSummary(row, voice, actor),
    inputs: keptInputsOf(row),
    results: results as RevisionAnswer["results"],
    states,
    warnings: keptWarningsOf(row),
  };
}
