import { voices } from "#lib/db/index.ts";
import { eq } from "drizzle-orm";
import { recordDeed } from "../audit.ts";
import { memberOf, type Context } from "../context.ts";
import { lockVoice } from "./load.ts";

export async function removeVoice({ ctx, input: { id } }: { ctx: Context; input: { id: string } }): Promise<void> {
  const { userId } = memberOf(ctx);
  await ctx.db.transaction(async (tx) => {
    const { teamId, name } = await lockVoice(tx, ctx, id, "voice.remove");
    await tx.delete(voices).where(eq(voices.id, id));
    const deed = { teamId, actorId: userId, subjectId: id, detail: { name }, at: ctx.now() };
    await recordDeed(tx, { ...deed, action: "voice.remove" });
  });
}
