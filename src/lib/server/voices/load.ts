import { users, voices, workingCopies, type Queryable } from "#lib/db/index.ts";
import type { Action } from "#lib/policy/index.ts";
import { eq, sql } from "drizzle-orm";
import { authorize, memberOf, type Context } from "../context.ts";
import { notFound } from "../errors.ts";

/** What a voice is shown by; the stages are counted in the database so that a list need not carry the documents. */
export const voiceColumns = {
  id: voices.id,
  teamId: voices.teamId,
  name: voices.name,
  createdAt: voices.createdAt,
  updatedAt: voices.updatedAt,
  authorId: users.id,
  authorName: users.name,
  stageCount: sql<number>`coalesce(jsonb_array_length(${workingCopies.document} -> 'stages'), 0)`.mapWith(Number),
};

export function selectVoices(db: Queryable) {
  return db
    .select(voiceColumns)
    .from(voices)
    .leftJoin(users, eq(users.id, voices.createdBy))
    .leftJoin(workingCopies, eq(workingCopies.voiceId, voices.id));
}

export type VoiceRow = Awaited<ReturnType<typeof selectVoices>>[number];

/** Finds a voice and makes sure that the person who asks may do this to it. */
export async function loadVoice(
  db: Queryable,
  ctx: Pick<Context, "actor">,
  id: string,
  action: Action,
): Promise<VoiceRow> {
  memberOf(ctx);
  const [voice] = await selectVoices(db).where(eq(voices.id, id));
  if (!voice) throw notFound();
  authorize(ctx, action, voice);
  return voice;
}

/** Holds the row until the transaction ends. Whoever changes a voice or its working copy takes this lock first. */
export async function lockVoice(tx: Queryable, ctx: Pick<Context, "actor">, id: string, action: Action) {
  memberOf(ctx);
  const [voice] = await tx.select().from(voices).where(eq(voices.id, id)).for("update");
  if (!voice) throw notFound();
  authorize(ctx, action, voice);
  return voice;
}
