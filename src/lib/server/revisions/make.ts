import { analyseStages, libraryVersion } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { newId, revisions } from "#lib/db/index.ts";
import type { newRevision, RevisionAnswer } from "#lib/wire/revision.ts";
import type { WorkingCopyDocument } from "#lib/wire/workingCopy.ts";
import { eq, sql } from "drizzle-orm";
import type { z } from "zod";
import { recordDeed } from "../audit.ts";
import { memberOf, type Context } from "../context.ts";
import { Refusal } from "../errors.ts";
import { lockVoice } from "../voices/load.ts";
import { etagOf } from "../workingCopies/etag.ts";
import { loadWorkingCopy } from "../workingCopies/read.ts";
import { staleCopy } from "../workingCopies/stale.ts";
import { findRevision } from "./load.ts";
import { presentRevision } from "./present.ts";

interface Make {
  ctx: Context;
  input: z.output<typeof newRevision> & {
    id: string;
    /** Versions of the working copy that the author had before them; any where null. */
    expected: readonly number[] | null;
  };
}

/** Keeps the working copy as it stands now, with all that the library says of it. */
export async function makeRevision({ ctx, input }: Make): Promise<RevisionAnswer> {
  const { id: voiceId, reason, acceptedWarnings, expected } = input;
  const { userId, name } = memberOf(ctx);
  return ctx.db.transaction(async (tx) => {
    const voice = await lockVoice(tx, ctx, voiceId, "revision.make");
    const copy = await loadWorkingCopy(tx, voiceId);
    if (expected && !expected.includes(copy.version)) throw staleCopy(copy);

    // Only what passed the schema is ever stored; the figures are this server's own.
    const inputs = copy.document as WorkingCopyDocument;
    const analysis = analyseStages(inputs, stageKinds);
    const strangers = acceptedWarnings.findIndex(
      ({ stage, code }) => !analysis.warnings.some((warning) => warning.stage === stage && warning.code === code),
    );
    if (strangers !== -1) {
      throw new Refusal("invalid-input", "A warning was accepted that this working copy does not give.", {
        errors: [{ path: `acceptedWarnings.${strangers}`, message: "The working copy gives no such warning." }],
      });
    }

    const [last] = await tx
      .select({ number: sql<number>`coalesce(max(${revisions.number}), 0)`.mapWith(Number) })
      .from(revisions)
      .where(eq(revisions.voiceId, voiceId));
    const number = (last?.number ?? 0) + 1;
    const at = ctx.now();
    await tx.insert(revisions).values({
      ...{ id: newId("rev"), voiceId, number, reason, inputs, analysis, acceptedWarnings, libraryVersion },
      ...{ authorId: userId, authorName: name, createdAt: at, updatedAt: at },
    });
    const detail = { number, reason, copy: etagOf(copy.version) };
    const deed = { teamId: voice.teamId, actorId: userId, subjectId: voiceId, detail, at };
    await recordDeed(tx, { ...deed, action: "revision.make" });
    return presentRevision(await findRevision(tx, voiceId, number), voice, ctx.actor);
  });
}
