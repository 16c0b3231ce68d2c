import { revisions, users, type Queryable } from "#lib/db/index.ts";
import { mayFollow } from "#lib/policy/index.ts";
import type { reviewDecision, RevisionAnswer } from "#lib/wire/revision.ts";
import { and, eq, inArray, lt, sql } from "drizzle-orm";
import type { z } from "zod";
import { recordDeed } from "../audit.ts";
import { authorize, memberOf, type Context } from "../context.ts";
import { Refusal } from "../errors.ts";
import { post } from "../mail/post.ts";
import { reviewDecidedLetter } from "../mail/reviewLetters.ts";
import { lockVoice } from "../voices/load.ts";
import { findRevision, type RevisionRow } from "./load.ts";
import { presentRevision } from "./present.ts";

interface Decide {
  ctx: Context;
  input: z.output<typeof reviewDecision> & { id: string; number: number };
}

/** Releases or returns a revision under review. Of two who decide at once the first has decided. */
export async function decideReview({ ctx, input }: Decide): Promise<RevisionAnswer> {
  const { id: voiceId, number, decision, note } = input;
  const { userId, name } = memberOf(ctx);
  const status = decision === "release" ? "released" : "returned";
  const done = await ctx.db.transaction(async (tx) => {
    // The lock on the voice puts decisions in a row: the second finds the status that the first has left.
    const voice = await lockVoice(tx, ctx, voiceId, "voice.read");
    const before = await findRevision(tx, voiceId, number);
    authorize(ctx, "revision.review", { teamId: voice.teamId, madeBy: before.authorId });
    if (!mayFollow(before.status, status)) throw notUnderReview(before);
    const at = ctx.now();
    if (decision === "release") await supersedeEarlier(tx, voiceId, number, at);
    await tx
      .update(revisions)
      .set({
        ...{ status, decision, decisionNote: note, updatedAt: at },
        ...{ decidedAt: at, decidedById: userId, decidedByName: name },
      })
      .where(eq(revisions.id, before.id));
    const deed = { teamId: voice.teamId, actorId: userId, subjectId: voiceId, detail: { number, decision, note }, at };
    await recordDeed(tx, { ...deed, action: "revision.review" });
    const people = await peopleToTell(tx, [before.authorId, before.askedById], userId);
    return { revision: presentRevision(await findRevision(tx, voiceId, number), voice, ctx.actor), people, voice };
  });

  const url = `${ctx.site}/voices/${voiceId}/revisions/${number}`;
  const about = { voice: done.voice.name, number, url, reviewer: name, decision, note };
  await post(
    done.people.map((person) => ({ to: person.email, letter: reviewDecidedLetter({ ...about, name: person.name }) })),
  );
  return done.revision;
}

function notUnderReview({ number, status, decidedByName }: RevisionRow): Refusal {
  const why = decidedByName === null ? `is ${status}` : `was decided by ${decidedByName}: it is ${status}`;
  return new Refusal(
    "conflict",
    `Revision ${number} ${why}. Your decision was not recorded; your note is yours to keep.`,
  );
}

/** What came before a release is behind it: the release it takes the place of, and what was still on its way. */
async function supersedeEarlier(tx: Queryable, voiceId: string, number: number, at: Date): Promise<void> {
  await tx
    .update(revisions)
    .set({ status: "superseded", updatedAt: at })
    .where(
      and(
        eq(revisions.voiceId, voiceId),
        lt(revisions.number, number),
        inArray(revisions.status, ["in preparation", "under review", "released"]),
      ),
    );
  // A later number that was released before this one would leave two.
  const [later] = await tx
    .select({ number: revisions.number })
    .from(revisions)
    .where(and(eq(revisions.voiceId, voiceId), eq(revisions.status, "released"), sql`${revisions.number} > ${number}`));
  if (later) {
    throw new Refusal("conflict", `Revision ${later.number} is released already, so ${number} cannot follow it.`);
  }
}

async function peopleToTell(tx: Queryable, ids: readonly (string | null)[], doer: string) {
  const wanted = [...new Set(ids)].filter((id): id is string => id !== null && id !== doer);
  if (wanted.length === 0) return [];
  return tx.select({ name: users.name, email: users.email }).from(users).where(inArray(users.id, wanted));
}
