import type { RevisionAnswer } from "#lib/wire/revision.ts";
import type { Context } from "../context.ts";
import { loadRevision } from "./load.ts";
import { presentRevision } from "./present.ts";

export interface RevisionInput {
  ctx: Context;
  input: { id: string; number: number };
}

export async function readRevision({ ctx, input: { id, number } }: RevisionInput): Promise<RevisionAnswer> {
  const { voice, revision } = await loadRevision(ctx.db, ctx, { voiceId: id, number });
  return presentRevision(revision, voice, ctx.actor);
}
