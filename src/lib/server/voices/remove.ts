import { revisions, voices, type Queryable } from "#lib/db/index.ts";
import { can } from "#lib/policy/index.ts";
import { and, eq } from "drizzle-orm";
import { recordDeed } from "../audit.ts";
import { memberOf, type Context } from "../context.ts";
import { Refusal } from "../errors.ts";
import { lockVoice } from "./load.ts";

export async function removeVoice({ ctx, input: { id } }: { ctx: Context; input: { id: string } }): Promise<void> {
  const { userId } = memberOf(ctx);
  await ctx.db.transaction(async (tx) => {
    const { teamId, name } = await lockVoice(tx, ctx, id, "voice.remove");
    if (!can(ctx.actor, "voice.removeReleased", { teamId }) && (await hasReleased(tx, id))) {
      throw new Refusal(
        "conflict",
        "This voice has released revisions, which others may be building from. An owner of the team can remove it. Nothing was changed.",
      );
    }
    await tx.delete(voices).where(eq(voices.id, id));
    const deed = { teamId, actorId: userId, subjectId: id, detail: { name }, at: ctx.now() };
    await recordDeed(tx, { ...deed, action: "voice.remove" });
  });
}

async function hasReleased(tx: Queryable, voiceId: string): Promise<boolean> {
  const [found] = await tx
    .select({ id: revisions.id })
    .from(revisions)
    .where(and(eq(revisions.voiceId, voiceId), eq(revisions.decision, "release")))
    .limit(1);
  return found !== undefined;
}
