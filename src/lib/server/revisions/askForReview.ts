import { revisions } from "#lib/db/index.ts";
import type { reviewRequest, RevisionAnswer } from "#lib/wire/revision.ts";
import { eq } from "drizzle-orm";
import type { z } from "zod";
import { recordDeed } from "../audit.ts";
import { memberOf, type Context } from "../context.ts";
import { Refusal } from "../errors.ts";
import { post } from "../mail/post.ts";
import { reviewAskedLetter } from "../mail/reviewLetters.ts";
import { peopleWhoMay, type TeamPerson } from "../teams/people.ts";
import { lockVoice } from "../voices/load.ts";
import { findRevision, rightsOf } from "./load.ts";
import { presentRevision } from "./present.ts";

interface Ask {
  ctx: Context;
  input: z.output<typeof reviewRequest> & { id: string; number: number };
}

const wrongReviewer = (message: string) =>
  new Refusal("invalid-input", "This person cannot be asked. Nothing was changed.", {
    errors: [{ path: "reviewer", message }],
  });

function asked(candidates: readonly TeamPerson[], reviewer: string | null, authorId: string | null): TeamPerson[] {
  if (reviewer === null) return candidates.filter(({ userId }) => userId !== authorId);
  if (reviewer === authorId) throw wrongReviewer("Nobody reviews their own work. Choose somebody else.");
  const one = candidates.find(({ userId }) => userId === reviewer);
  if (!one) throw wrongReviewer("Choose a reviewer or an owner of the team.");
  return [one];
}

/** Puts a revision under review and tells whoever is asked. Asked again, it goes to somebody else. */
export async function askForReview({ ctx, input }: Ask): Promise<RevisionAnswer> {
  const { userId, name, team } = memberOf(ctx);
  const { id: voiceId, number, reviewer = null } = input;
  const done = await ctx.db.transaction(async (tx) => {
    const voice = await lockVoice(tx, ctx, voiceId, "revision.askForReview");
    const before = await findRevision(tx, voiceId, number);
    if (!rightsOf(ctx.actor, voice, before).askForReview) {
      throw new Refusal(
        "conflict",
        `Revision ${number} is ${before.status}, so it cannot be put under review. Make a new revision of the working copy instead.`,
      );
    }
    const people = asked(await peopleWhoMay(tx, voice.teamId, "revision.review"), reviewer, before.authorId);
    const at = ctx.now();
    await tx
      .update(revisions)
      .set({ status: "under review", askedAt: at, askedById: userId, reviewerId: reviewer, updatedAt: at })
      .where(eq(revisions.id, before.id));
    const detail = { number, reviewer: reviewer === null ? null : (people[0]?.name ?? null) };
    const deed = { teamId: team.id, actorId: userId, subjectId: voiceId, detail, at };
    await recordDeed(tx, { ...deed, action: "revision.askForReview" });
    const revision = presentRevision(await findRevision(tx, voiceId, number), voice, ctx.actor);
    return { revision, people, voice };
  });

  const url = `${ctx.site}/voices/${voiceId}/revisions/${number}`;
  const about = { voice: done.voice.name, number, url, asker: name, reason: done.revision.reason };
  await post(
    done.people
      .filter((person) => person.userId !== userId)
      .map((person) => ({ to: person.email, letter: reviewAskedLetter({ ...about, name: person.name }) })),
  );
  return done.revision;
}
