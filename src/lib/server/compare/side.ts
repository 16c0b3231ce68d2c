import {
  analyseStages,
  libraryVersion,
  type StageWarning,
  type VoiceAnalysis,
  type VoiceDocument,
} from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { revisions, type Queryable } from "#lib/db/index.ts";
import type { CompareAnswer, SideRef } from "#lib/wire/compare.ts";
import { and, desc, eq, lt } from "drizzle-orm";
import { authorize, type Context } from "../context.ts";
import { loadRevision } from "../revisions/load.ts";
import { keptAnalysisOf, keptInputsOf, keptWarningsOf, presentSummary } from "../revisions/present.ts";
import type { VoiceRow } from "../voices/load.ts";
import { loadWorkingCopy } from "../workingCopies/read.ts";

export interface Side {
  about: CompareAnswer["from"];
  document: VoiceDocument;
  analysis: VoiceAnalysis;
  warnings: (StageWarning & { accepted: boolean })[];
}

/** One side of a comparison, if this person may read it. A revision brings the figures it was kept with. */
export async function readSide(db: Queryable, ctx: Context, voice: VoiceRow, ref: SideRef): Promise<Side> {
  const common = { voice: { id: voice.id, name: voice.name }, revision: ref, libraryVersion };
  if (ref === "nothing") {
    return {
      about: common,
      document: { stages: [], links: [], conditions: {} },
      analysis: { results: {}, states: {}, conditions: {}, warnings: [], levels: [] },
      warnings: [],
    };
  }
  if (ref === "working") {
    authorize(ctx, "workingCopy.read", voice);
    const copy = await loadWorkingCopy(db, voice.id);
    // Only what passed the schema is ever stored.
    const document = copy.document as VoiceDocument;
    const analysis = analyseStages(document, stageKinds);
    return {
      about: common,
      document,
      analysis,
      warnings: analysis.warnings.map((warning) => ({ ...warning, accepted: isAccepted(document, warning) })),
    };
  }
  const { revision: row } = await loadRevision(db, ctx, { voiceId: voice.id, number: ref });
  const { status, reason, createdBy, createdAt } = presentSummary(row, voice, ctx.actor);
  return {
    about: { ...common, status, reason, preparedBy: createdBy, createdAt, libraryVersion: row.libraryVersion },
    document: keptInputsOf(row),
    analysis: keptAnalysisOf(row),
    warnings: keptWarningsOf(row),
  };
}

/** What a side is compared with where nobody says: the last release before it, else nothing. */
export async function releaseBefore(db: Queryable, voiceId: string, to: SideRef): Promise<SideRef> {
  const [found] = await db
    .select({ number: revisions.number })
    .from(revisions)
    .where(
      and(
        eq(revisions.voiceId, voiceId),
        eq(revisions.decision, "release"),
        typeof to === "number" ? lt(revisions.number, to) : undefined,
      ),
    )
    .orderBy(desc(revisions.number))
    .limit(1);
  return found?.number ?? "nothing";
}

const isAccepted = (document: VoiceDocument, warning: { stage: string; code: string }): boolean =>
  document.accepted?.some(({ stage, code }) => stage === warning.stage && code === warning.code) ?? false;
