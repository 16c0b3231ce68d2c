import { revisions, users, type Queryable } from "#lib/db/index.ts";
import { can, revisionRights, type Action } from "#lib/policy/index.ts";
import { aliasedTable, and, eq, sql } from "drizzle-orm";
import { authorize, type Context } from "../context.ts";
import { notFound } from "../errors.ts";
import { loadVoice, type VoiceRow } from "../voices/load.ts";

const askers = aliasedTable(users, "askers");
const reviewers = aliasedTable(users, "reviewers");

/** What a revision is shown by in a list: all but the documents, which are counted where they lie. */
export const summaryColumns = {
  id: revisions.id,
  voiceId: revisions.voiceId,
  number: revisions.number,
  reason: revisions.reason,
  status: revisions.status,
  libraryVersion: revisions.libraryVersion,
  createdAt: revisions.createdAt,
  updatedAt: revisions.updatedAt,
  authorId: revisions.authorId,
  authorName: revisions.authorName,
  askedAt: revisions.askedAt,
  askedById: revisions.askedById,
  askedByName: askers.name,
  reviewerId: revisions.reviewerId,
  reviewerName: reviewers.name,
  decision: revisions.decision,
  decidedAt: revisions.decidedAt,
  decidedById: revisions.decidedById,
  decidedByName: revisions.decidedByName,
  decisionNote: revisions.decisionNote,
  stageCount: sql<number>`jsonb_array_length(${revisions.inputs} -> 'stages')`.mapWith(Number),
  warningCount: sql<number>`jsonb_array_length(${revisions.analysis} -> 'warnings')`.mapWith(Number),
};

const wholeColumns = {
  ...summaryColumns,
  inputs: revisions.inputs,
  analysis: revisions.analysis,
  acceptedWarnings: revisions.acceptedWarnings,
};

export function selectSummaries(db: Queryable) {
  return db
    .select(summaryColumns)
    .from(revisions)
    .leftJoin(askers, eq(askers.id, revisions.askedById))
    .leftJoin(reviewers, eq(reviewers.id, revisions.reviewerId));
}

export type SummaryRow = Awaited<ReturnType<typeof selectSummaries>>[number];

function selectWhole(db: Queryable) {
  return db
    .select(wholeColumns)
    .from(revisions)
    .leftJoin(askers, eq(askers.id, revisions.askedById))
    .leftJoin(reviewers, eq(reviewers.id, revisions.reviewerId));
}

export type RevisionRow = Awaited<ReturnType<typeof selectWhole>>[number];

export const rightsOf = (actor: Context["actor"], voice: { teamId: string }, row: SummaryRow) =>
  revisionRights(actor, { teamId: voice.teamId, madeBy: row.authorId, status: row.status, decision: row.decision });

/** Finds a revision without asking who may see it. */
export async function findRevision(db: Queryable, voiceId: string, number: number): Promise<RevisionRow> {
  const [row] = await selectWhole(db).where(and(eq(revisions.voiceId, voiceId), eq(revisions.number, number)));
  if (!row) throw notFound();
  return row;
}

/** Finds a revision that this person may read; a role that may not see it yet is told so. */
export async function loadRevision(
  db: Queryable,
  ctx: Pick<Context, "actor">,
  { voiceId, number }: { voiceId: string; number: number },
): Promise<{ voice: VoiceRow; revision: RevisionRow }> {
  const voice = await loadVoice(db, ctx, voiceId, "voice.read");
  const revision = await findRevision(db, voiceId, number);
  if (!rightsOf(ctx.actor, voice, revision).read) authorize(ctx, "revision.read", voice);
  return { voice, revision };
}

/** The action under which a person sees revisions at all: every one of them, or the released. */
export function readingOf(ctx: Pick<Context, "actor">, voice: { teamId: string }): Action {
  return can(ctx.actor, "revision.read", voice) ? "revision.read" : "revision.readReleased";
}
