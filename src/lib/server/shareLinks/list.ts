import { revisions, shareLinks, users } from "#lib/db/index.ts";
import type { shareLinkListAnswer, shareLinkListQuery } from "#lib/wire/shareLink.ts";
import { and, desc, eq, isNull, sql } from "drizzle-orm";
import type { z } from "zod";
import { recordDeed } from "../audit.ts";
import { memberOf, type Context } from "../context.ts";
import { isMoment, readPageCursor, writePageCursor } from "../cursor.ts";
import { notFound } from "../errors.ts";
import { loadVoice, lockVoice } from "../voices/load.ts";
import { presentShareLink } from "./present.ts";

interface List {
  ctx: Context;
  input: z.output<typeof shareLinkListQuery> & { id: string };
}

/** Links to revisions of a voice that have not been revoked, newest first. */
export async function listShareLinks({ ctx, input }: List): Promise<z.output<typeof shareLinkListAnswer>> {
  const voice = await loadVoice(ctx.db, ctx, input.id, "shareLink.list");
  const after = input.cursor ? readPageCursor(input.cursor, "newest", isMoment) : undefined;
  const rows = await ctx.db
    .select({ link: shareLinks, number: revisions.number, creator: users.name })
    .from(shareLinks)
    .innerJoin(revisions, eq(revisions.id, shareLinks.revisionId))
    .leftJoin(users, eq(users.id, shareLinks.createdById))
    .where(
      and(
        eq(shareLinks.voiceId, voice.id),
        isNull(shareLinks.revokedAt),
        after && sql`(${shareLinks.createdAt}, ${shareLinks.id}) < (${after.key}::timestamptz, ${after.id})`,
      ),
    )
    .orderBy(desc(shareLinks.createdAt), desc(shareLinks.id))
    .limit(input.limit + 1);
  const page = rows.slice(0, input.limit);
  const last = page.at(-1)?.link;
  const more = rows.length > input.limit && last;
  return {
    shareLinks: page.map(presentShareLink),
    nextCursor: more ? writePageCursor({ order: "newest", key: last.createdAt.toISOString(), id: last.id }) : null,
  };
}

/** Closes a link for good, at once. */
export async function revokeShareLink({
  ctx,
  input: { id: voiceId, linkId },
}: {
  ctx: Context;
  input: { id: string; linkId: string };
}): Promise<void> {
  const { userId } = memberOf(ctx);
  const at = ctx.now();
  await ctx.db.transaction(async (tx) => {
    const voice = await lockVoice(tx, ctx, voiceId, "shareLink.revoke");
    const revoked = await tx
      .update(shareLinks)
      .set({ revokedAt: at, updatedAt: at })
      .where(and(eq(shareLinks.id, linkId), eq(shareLinks.voiceId, voiceId), isNull(shareLinks.revokedAt)))
      .returning({ id: shareLinks.id });
    if (revoked.length === 0) throw notFound();
    const deed = { teamId: voice.teamId, actorId: userId, subjectId: voiceId, detail: { link: linkId }, at };
    await recordDeed(tx, { ...deed, action: "shareLink.revoke" });
  });
}
