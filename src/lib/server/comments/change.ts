import { comments } from "#lib/db/index.ts";
import type { commentChange, CommentAnswer } from "#lib/wire/comment.ts";
import { eq } from "drizzle-orm";
import type { z } from "zod";
import { recordDeed } from "../audit.ts";
import { authorize, memberOf, type Context } from "../context.ts";
import { Refusal } from "../errors.ts";
import { loadVoice } from "../voices/load.ts";
import { findComment, presentComment } from "./load.ts";

interface Change {
  ctx: Context;
  input: z.output<typeof commentChange> & { id: string; commentId: string };
}

/** Rewrites one's own remark, which then says that it was; or closes or opens a thread. */
export async function changeComment({ ctx, input }: Change): Promise<CommentAnswer> {
  const { id: voiceId, commentId, text, resolved } = input;
  const { userId } = memberOf(ctx);
  return ctx.db.transaction(async (tx) => {
    const voice = await loadVoice(tx, ctx, voiceId, "comment.read");
    const { comment, number } = await findComment(tx, voiceId, commentId);
    const at = ctx.now();
    const deed = { teamId: voice.teamId, actorId: userId, subjectId: voiceId, at };
    const detail = { number, comment: commentId };
    if (text !== undefined) {
      authorize(ctx, "comment.change", { teamId: voice.teamId, madeBy: comment.authorId });
      if (comment.deletedAt) throw new Refusal("conflict", "This remark was deleted. Write a new one.");
      await tx.update(comments).set({ text, editedAt: at, updatedAt: at }).where(eq(comments.id, commentId));
      await recordDeed(tx, { ...deed, action: "comment.change", detail: { ...detail, before: comment.text } });
    }
    if (resolved !== undefined) {
      authorize(ctx, "comment.resolve", voice);
      if (comment.threadId !== null) throw new Refusal("conflict", "Resolve the first remark of the thread.");
      const state = resolved ? { resolvedAt: at, resolvedById: userId } : { resolvedAt: null, resolvedById: null };
      await tx
        .update(comments)
        .set({ ...state, updatedAt: at })
        .where(eq(comments.id, commentId));
      await recordDeed(tx, { ...deed, action: "comment.resolve", detail: { ...detail, resolved } });
    }
    return presentComment(await findComment(tx, voiceId, commentId), voice, ctx.actor);
  });
}

/** Takes back what one wrote oneself; that something was written stays, and the log keeps the words. */
export async function deleteComment({
  ctx,
  input: { id: voiceId, commentId },
}: {
  ctx: Context;
  input: { id: string; commentId: string };
}): Promise<void> {
  const { userId } = memberOf(ctx);
  await ctx.db.transaction(async (tx) => {
    const voice = await loadVoice(tx, ctx, voiceId, "comment.read");
    const { comment, number } = await findComment(tx, voiceId, commentId);
    authorize(ctx, "comment.change", { teamId: voice.teamId, madeBy: comment.authorId });
    if (comment.deletedAt) return;
    const at = ctx.now();
    await tx.update(comments).set({ text: "", deletedAt: at, updatedAt: at }).where(eq(comments.id, commentId));
    const detail = { number, comment: commentId, before: comment.text, deleted: true };
    const deed = { teamId: voice.teamId, actorId: userId, subjectId: voiceId, detail, at };
    await recordDeed(tx, { ...deed, action: "comment.change" });
  });
}
