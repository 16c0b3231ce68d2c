import type { VoiceDocument } from "#lib/circuit/index.ts";
import type { Context } from "../context.ts";
import { loadRevision } from "../revisions/load.ts";
import { keptInputsOf } from "../revisions/present.ts";
import { loadWorkingCopy } from "../workingCopies/read.ts";
import { loadVoice, type VoiceRow } from "./load.ts";

export interface ReadDocument {
  voice: VoiceRow;
  document: VoiceDocument;
  /** When it was last saved, or kept. */
  at: Date;
}

/** The working copy of a voice, or what one of its revisions keeps, if this person may read it. */
export async function readDocument(ctx: Context, id: string, revision: number | undefined): Promise<ReadDocument> {
  if (revision !== undefined) {
    const { voice, revision: row } = await loadRevision(ctx.db, ctx, { voiceId: id, number: revision });
    return { voice, document: keptInputsOf(row), at: row.createdAt };
  }
  const voice = await loadVoice(ctx.db, ctx, id, "workingCopy.read");
  const copy = await loadWorkingCopy(ctx.db, id);
  // Only what passed the schema is ever stored.
  return { voice, document: copy.document as VoiceDocument, at: copy.updatedAt };
}
