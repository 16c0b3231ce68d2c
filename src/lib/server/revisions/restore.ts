import { workingCopyDocument } from "#lib/wire/workingCopy.ts";
import { memberOf, type Context } from "../context.ts";
import { parseInput } from "../request.ts";
import { lockVoice } from "../voices/load.ts";
import type { PresentedCopy } from "../workingCopies/present.ts";
import { replaceWorkingCopy } from "../workingCopies/save.ts";
import { loadRevision } from "./load.ts";
import { keptInputsOf } from "./present.ts";

interface Restore {
  ctx: Context;
  input: { id: string; number: number; expected: readonly number[] };
}

/** Puts what a revision holds into the working copy, provided that nobody saved since it was read. */
export async function restoreRevision({ ctx, input: { id, number, expected } }: Restore): Promise<PresentedCopy> {
  memberOf(ctx);
  return ctx.db.transaction(async (tx) => {
    const voice = await lockVoice(tx, ctx, id, "workingCopy.edit");
    const { revision } = await loadRevision(tx, ctx, { voiceId: id, number });
    // Kept under an older version it must still be a document that can be worked on.
    const document = parseInput(keptInputsOf(revision), workingCopyDocument);
    return replaceWorkingCopy(tx, ctx, { voice, document, expected, detail: { restored: number } });
  });
}
