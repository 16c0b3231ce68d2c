import { voices } from "#lib/db/index.ts";
import type { VoiceAnswer } from "#lib/wire/voice.ts";
import { eq } from "drizzle-orm";
import { recordDeed } from "../audit.ts";
import { memberOf, type Context } from "../context.ts";
import { loadVoice, lockVoice } from "./load.ts";
import { presentVoice } from "./present.ts";

interface Rename {
  ctx: Context;
  input: { id: string; name: string };
}

export async function renameVoice({ ctx, input: { id, name } }: Rename): Promise<VoiceAnswer> {
  const { userId } = memberOf(ctx);
  return ctx.db.transaction(async (tx) => {
    const before = await lockVoice(tx, ctx, id, "voice.rename");
    if (before.name !== name) {
      const at = ctx.now();
      await tx.update(voices).set({ name, updatedAt: at }).where(eq(voices.id, id));
      const detail = { from: before.name, to: name };
      await recordDeed(tx, {
        teamId: before.teamId,
        actorId: userId,
        action: "voice.rename",
        subjectId: id,
        detail,
        at,
      });
    }
    return presentVoice(await loadVoice(tx, ctx, id, "voice.read"), ctx.actor);
  });
}
