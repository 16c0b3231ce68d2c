import { comments, revisions, type Queryable } from "#lib/db/index.ts";
import type { CommentAnswer, commentListAnswer, commentListQuery } from "#lib/wire/comment.ts";
import { and, asc, count, desc, eq, isNotNull, isNull, sql } from "drizzle-orm";
import type { z } from "zod";
import type { Context } from "../context.ts";
import { isMoment, readPageCursor, writePageCursor } from "../cursor.ts";
import { findRevision } from "../revisions/load.ts";
import { loadVoice } from "../voices/load.ts";
import { presentComment, selectComments } from "./load.ts";

interface List {
  ctx: Context;
  input: z.output<typeof commentListQuery> & { id: string };
}

/** One page of the remarks on a voice, or on one of its revisions. */
export async function listComments({ ctx, input }: List): Promise<z.output<typeof commentListAnswer>> {
  const voice = await loadVoice(ctx.db, ctx, input.id, "comment.read");
  const revisionId =
    input.revision === undefined ? undefined : (await findRevision(ctx.db, voice.id, input.revision)).id;
  const oldest = input.sort === "oldest";
  const after = input.cursor ? readPageCursor(input.cursor, input.sort, isMoment) : undefined;
  const place = sql`(${comments.createdAt}, ${comments.id})`;
  const rows = await selectComments(ctx.db)
    .where(
      and(
        revisionId === undefined ? eq(comments.voiceId, voice.id) : eq(comments.revisionId, revisionId),
        input.open === undefined
          ? undefined
          : and(
              isNull(comments.threadId),
              isNull(comments.deletedAt),
              (input.open === "true" ? isNull : isNotNull)(comments.resolvedAt),
            ),
        after && sql`${place} ${sql.raw(oldest ? ">" : "<")} (${after.key}::timestamptz, ${after.id})`,
      ),
    )
    .orderBy(...(oldest ? [asc(comments.createdAt), asc(comments.id)] : [desc(comments.createdAt), desc(comments.id)]))
    // One more than asked for tells whether there is a next page.
    .limit(input.limit + 1);
  const page = rows.slice(0, input.limit);
  const last = page.at(-1)?.comment;
  const more = rows.length > input.limit && last;
  return {
    comments: page.map((row) => presentComment(row, voice, ctx.actor)),
    nextCursor: more ? writePageCursor({ order: input.sort, key: last.createdAt.toISOString(), id: last.id }) : null,
  };
}

/** Every remark on one revision, oldest first: its page shows them all, as threads. */
export async function readAllComments({
  ctx,
  input: { id, number },
}: {
  ctx: Context;
  input: { id: string; number: number };
}): Promise<CommentAnswer[]> {
  const all: CommentAnswer[] = [];
  let cursor: string | undefined;
  do {
    const input = { id, revision: number, limit: 200, sort: "oldest" as const, cursor };
    const page = await listComments({ ctx, input });
    all.push(...page.comments);
    cursor = page.nextCursor ?? undefined;
  } while (cursor !== undefined);
  return all;
}

/** How many threads on a revision nobody has resolved. */
export async function countOpenThreads(db: Queryable, voiceId: string, number: number): Promise<number> {
  const [row] = await db
    .select({ open: count() })
    .from(comments)
    .innerJoin(revisions, eq(revisions.id, comments.revisionId))
    .where(
      and(
        eq(revisions.voiceId, voiceId),
        eq(revisions.number, number),
        isNull(comments.threadId),
        isNull(comments.resolvedAt),
        isNull(comments.deletedAt),
      ),
    );
  return row?.open ?? 0;
}
