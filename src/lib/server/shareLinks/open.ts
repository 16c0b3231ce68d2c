import { revisions, shareLinks, voices } from "#lib/db/index.ts";
import type { SharedRevision } from "#lib/wire/shareLink.ts";
import { and, eq, gt, isNull, or, sql } from "drizzle-orm";
import { recordDeed } from "../audit.ts";
import type { Context } from "../context.ts";
import { notFound } from "../errors.ts";
import { findRevision } from "../revisions/load.ts";
import { presentRevision } from "../revisions/present.ts";
import { hashOfSecret } from "../secretToken.ts";

interface Open {
  ctx: Context;
  input: { token: string; /** Taken away as a file, rather than looked at. */ download: boolean };
}

/** What a guest link opens. An unknown, expired or revoked one is not told apart from none at all. */
export async function openShareLink({ ctx, input: { token, download } }: Open): Promise<SharedRevision> {
  if (!/^[\w-]{43}$/.test(token)) throw notFound();
  const at = ctx.now();
  return ctx.db.transaction(async (tx) => {
    const [opened] = await tx
      .update(shareLinks)
      .set({ openings: sql`${shareLinks.openings} + 1`, lastOpenedAt: at })
      .where(
        and(
          eq(shareLinks.tokenHash, hashOfSecret(token)),
          isNull(shareLinks.revokedAt),
          or(isNull(shareLinks.expiresAt), gt(shareLinks.expiresAt, at)),
        ),
      )
      .returning();
    if (!opened) throw notFound();
    const [found] = await tx
      .select({ number: revisions.number, name: voices.name, teamId: voices.teamId })
      .from(revisions)
      .innerJoin(voices, eq(voices.id, revisions.voiceId))
      .where(eq(revisions.id, opened.revisionId));
    if (!found) throw notFound();
    const { number, name, teamId } = found;
    const revision = presentRevision(await findRevision(tx, opened.voiceId, number), found, null);
    const deed = { teamId, actorId: ctx.actor?.userId ?? null, subjectId: opened.voiceId, at };
    const action = download ? "shareLink.download" : "shareLink.open";
    await recordDeed(tx, { ...deed, action, detail: { number, link: opened.id } });
    const { status, reason, createdBy, createdAt, review, libraryVersion, inputs, results, states, warnings } =
      revision;
    return {
      ...{ voice: name, revision: number, status, reason, createdAt, libraryVersion },
      preparedBy: createdBy.name,
      checkedBy: review.decidedBy?.name ?? null,
      decidedAt: review.decidedAt,
      ...{ inputs, results, states, warnings },
    };
  });
}
