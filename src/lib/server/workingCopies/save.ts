import { voices, workingCopies } from "#lib/db/index.ts";
import type { WorkingCopyDocument } from "#lib/wire/workingCopy.ts";
import { eq } from "drizzle-orm";
import { recordDeed } from "../audit.ts";
import { memberOf, type Context } from "../context.ts";
import { Refusal } from "../errors.ts";
import { lockVoice } from "../voices/load.ts";
import { presentWorkingCopy, type PresentedCopy, type WorkingCopyRow } from "./present.ts";
import { loadWorkingCopy } from "./read.ts";

interface Save {
  ctx: Context;
  input: { id: string; document: WorkingCopyDocument; expected: readonly number[] };
}

function stale(current: WorkingCopyRow): Refusal {
  const { etag, copy } = presentWorkingCopy(current);
  return new Refusal(
    "stale-copy",
    "Someone saved a newer copy since you read it, so yours was not saved. The newer one is in `current`: put your changes into it and send it with its ETag.",
    { headers: { etag }, members: { current: copy } },
  );
}

/** Saves the whole working copy, provided that nobody else saved since it was read. */
export async function saveWorkingCopy({ ctx, input: { id, document, expected } }: Save): Promise<PresentedCopy> {
  const { userId } = memberOf(ctx);
  return ctx.db.transaction(async (tx) => {
    const voice = await lockVoice(tx, ctx, id, "workingCopy.edit");
    const current = await loadWorkingCopy(tx, id);
    if (!expected.includes(current.version)) throw stale(current);

    const at = ctx.now();
    const { format, stages, links, conditions } = document;
    const version = current.version + 1;
    const [saved] = await tx
      .update(workingCopies)
      .set({ version, document: { format, stages, links, conditions }, updatedBy: userId, updatedAt: at })
      .where(eq(workingCopies.voiceId, id))
      .returning();
    if (!saved) throw new Error(`the working copy of ${id} vanished while its voice was locked`);
    await tx.update(voices).set({ updatedAt: at }).where(eq(voices.id, id));
    const deed = {
      teamId: voice.teamId,
      actorId: userId,
      subjectId: id,
      detail: { version, stages: stages.length },
      at,
    };
    await recordDeed(tx, { ...deed, action: "workingCopy.edit" });
    return presentWorkingCopy(saved);
  });
}
