import { newId, voices, workingCopies } from "#lib/db/index.ts";
import type { newVoice, VoiceAnswer } from "#lib/wire/voice.ts";
import type { z } from "zod";
import { recordDeed } from "../audit.ts";
import { authorize, memberOf, type Context } from "../context.ts";
import { startingDocument } from "../workingCopies/startingDocument.ts";
import { loadVoice } from "./load.ts";
import { presentVoice } from "./present.ts";

export async function createVoice({
  ctx,
  input,
}: {
  ctx: Context;
  input: z.output<typeof newVoice>;
}): Promise<VoiceAnswer> {
  const { team, userId } = memberOf(ctx);
  authorize(ctx, "voice.create", { teamId: team.id });
  const id = newId("voi");
  const at = ctx.now();
  const document = startingDocument(input.template);

  return ctx.db.transaction(async (tx) => {
    const stamps = { createdAt: at, updatedAt: at };
    await tx.insert(voices).values({ id, teamId: team.id, name: input.name, createdBy: userId, ...stamps });
    await tx.insert(workingCopies).values({ voiceId: id, document, updatedBy: userId, ...stamps });
    const detail = { name: input.name, template: input.template };
    await recordDeed(tx, { teamId: team.id, actorId: userId, action: "voice.create", subjectId: id, detail, at });
    return presentVoice(await loadVoice(tx, ctx, id, "voice.read"), ctx.actor);
  });
}
