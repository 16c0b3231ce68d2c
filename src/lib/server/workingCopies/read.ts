import { workingCopies, type Queryable } from "#lib/db/index.ts";
import { eq } from "drizzle-orm";
import type { Context } from "../context.ts";
import { notFound } from "../errors.ts";
import { loadVoice } from "../voices/load.ts";
import { presentWorkingCopy, type PresentedCopy, type WorkingCopyRow } from "./present.ts";

export async function loadWorkingCopy(db: Queryable, voiceId: string): Promise<WorkingCopyRow> {
  const [row] = await db.select().from(workingCopies).where(eq(workingCopies.voiceId, voiceId));
  if (!row) throw notFound();
  return row;
}

export async function readWorkingCopy({ ctx, input }: { ctx: Context; input: { id: string } }): Promise<PresentedCopy> {
  await loadVoice(ctx.db, ctx, input.id, "workingCopy.read");
  return presentWorkingCopy(await loadWorkingCopy(ctx.db, input.id));
}
