import { comments, revisions, users, type Queryable } from "#lib/db/index.ts";
import { can, type Actor } from "#lib/policy/index.ts";
import type { CommentAnswer } from "#lib/wire/comment.ts";
import { aliasedTable, eq } from "drizzle-orm";
import { notFound } from "../errors.ts";

const resolvers = aliasedTable(users, "resolvers");

export function selectComments(db: Queryable) {
  return db
    .select({ comment: comments, number: revisions.number, resolverName: resolvers.name })
    .from(comments)
    .innerJoin(revisions, eq(revisions.id, comments.revisionId))
    .leftJoin(resolvers, eq(resolvers.id, comments.resolvedById));
}

export type CommentRow = Awaited<ReturnType<typeof selectComments>>[number];

/** A remark of this voice. One of another voice does not exist here. */
export async function findComment(db: Queryable, voiceId: string, id: string): Promise<CommentRow> {
  const [row] = await selectComments(db).where(eq(comments.id, id));
  if (!row || row.comment.voiceId !== voiceId) throw notFound();
  return row;
}

const moment = (at: Date | null) => at?.toISOString() ?? null;

export function presentComment(
  { comment, number, resolverName }: CommentRow,
  { teamId }: { teamId: string },
  actor: Actor | null,
): CommentAnswer {
  const { id, threadId, place, text, authorId, authorName, createdAt, updatedAt } = comment;
  const gone = comment.deletedAt !== null;
  return {
    ...{ id, revision: number, thread: threadId, at: place, text },
    author: { id: authorId, name: authorName },
    createdAt: createdAt.toISOString(),
    updatedAt: updatedAt.toISOString(),
    editedAt: moment(comment.editedAt),
    deletedAt: moment(comment.deletedAt),
    resolvedAt: moment(comment.resolvedAt),
    resolvedBy: comment.resolvedAt ? { id: comment.resolvedById, name: resolverName ?? "somebody who left" } : null,
    can: {
      change: !gone && can(actor, "comment.change", { teamId, madeBy: authorId }),
      resolve: threadId === null && can(actor, "comment.resolve", { teamId }),
    },
  };
}
