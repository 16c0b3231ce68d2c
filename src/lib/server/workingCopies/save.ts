import { voices, workingCopies, type Queryable } from "#lib/db/index.ts";
import type { WorkingCopyDocument } from "#lib/wire/workingCopy.ts";
import { eq } from "drizzle-orm";
import { recordDeed } from "../audit.ts";
import { memberOf, type Context } from "../context.ts";
import { lockVoice } from "../voices/load.ts";
import { presentWorkingCopy, type PresentedCopy } from "./present.ts";
import { loadWorkingCopy } from "./read.ts";
import { staleCopy } from "./stale.ts";

interface Save {
  ctx: Context;
  input: { id: string; document: WorkingCopyDocument; expected: readonly number[] };
}

/** Saves the whole working copy, provided that nobody else saved since it was read. */
export async function saveWorkingCopy({ ctx, input: { id, document, expected } }: Save): Promise<PresentedCopy> {
  memberOf(ctx);
  return ctx.db.transaction(async (tx) => {
    const voice = await lockVoice(tx, ctx, id, "workingCopy.edit");
    return replaceWorkingCopy(tx, ctx, { voice, document, expected });
  });
}

interface Replacement {
  voice: { id: string; teamId: string };
  document: WorkingCopyDocument;
  expected: readonly number[];
  /** What the log says besides the version and the number of stages. */
  detail?: Record<string, unknown>;
}

/** Puts a document in place of the working copy of a voice that is locked, and writes the deed down. */
export async function replaceWorkingCopy(
  tx: Queryable,
  ctx: Context,
  { voice, document, expected, detail = {} }: Replacement,
): Promise<PresentedCopy> {
  const { userId } = memberOf(ctx);
  const current = await loadWorkingCopy(tx, voice.id);
  if (!expected.includes(current.version)) throw staleCopy(current);

  const at = ctx.now();
  const { format, stages, links, conditions, accepted } = document;
  const version = current.version + 1;
  const [saved] = await tx
    .update(workingCopies)
    .set({
      version,
      document: { format, stages, links, conditions, ...(accepted && { accepted }) },
      updatedBy: userId,
      updatedAt: at,
    })
    .where(eq(workingCopies.voiceId, voice.id))
    .returning();
  if (!saved) throw new Error(`the working copy of ${voice.id} vanished while its voice was locked`);
  await tx.update(voices).set({ updatedAt: at }).where(eq(voices.id, voice.id));
  const deed = { teamId: voice.teamId, actorId: userId, subjectId: voice.id, at };
  await recordDeed(tx, {
    ...deed,
    action: "workingCopy.edit",
    detail: { ...detail, version, stages: stages.length },
  });
  return presentWorkingCopy(saved);
}
