import { comments, newId } from "#lib/db/index.ts";
import type { CommentAnswer, newComment } from "#lib/wire/comment.ts";
import type { z } from "zod";
import { recordDeed } from "../audit.ts";
import { memberOf, type Context } from "../context.ts";
import { Refusal } from "../errors.ts";
import { mentionLetter } from "../mail/mentionLetter.ts";
import { post } from "../mail/post.ts";
import { unsubscribeToken } from "../mail/unsubscribe.ts";
import { findRevision } from "../revisions/load.ts";
import { keptInputsOf } from "../revisions/present.ts";
import { peopleWhoMay } from "../teams/people.ts";
import { loadVoice } from "../voices/load.ts";
import { findComment, presentComment } from "./load.ts";
import { mentionedIn, wantingMail } from "./mentions.ts";

interface Write {
  ctx: Context;
  input: z.output<typeof newComment> & { id: string };
}

const wrongPlace = (path: string, message: string) =>
  new Refusal("invalid-input", "There is nothing there to write on. Your text is yours to keep.", {
    errors: [{ path, message }],
  });

/** Writes a remark on a revision, or an answer to one, and tells by mail whoever it mentions. */
export async function writeComment({ ctx, input }: Write): Promise<CommentAnswer> {
  const { id: voiceId, revision: number, at: place, thread, text } = input;
  const author = memberOf(ctx);
  const done = await ctx.db.transaction(async (tx) => {
    const voice = await loadVoice(tx, ctx, voiceId, "comment.write");
    const revision = await findRevision(tx, voiceId, number);
    const first = thread === undefined ? null : await findComment(tx, voiceId, thread);
    if (first && (first.comment.threadId !== null || first.comment.revisionId !== revision.id)) {
      throw wrongPlace("thread", "Give the first remark of a thread on this revision.");
    }
    if (place && !keptInputsOf(revision).stages.some(({ id }) => id === place.stage)) {
      throw wrongPlace("at.stage", `Revision ${number} has no such stage.`);
    }
    const id = newId("com");
    const moment = ctx.now();
    await tx.insert(comments).values({
      ...{ id, voiceId, revisionId: revision.id, threadId: first?.comment.id ?? null, text },
      // An answer is about what its thread is about.
      place: first?.comment.place ?? place ?? {},
      ...{ authorId: author.userId, authorName: author.name, createdAt: moment, updatedAt: moment },
    });
    const deed = { teamId: voice.teamId, actorId: author.userId, subjectId: voiceId, at: moment };
    await recordDeed(tx, { ...deed, action: "comment.write", detail: { number, comment: id } });
    const people = await peopleWhoMay(tx, voice.teamId, "comment.read");
    const mentioned = await wantingMail(
      tx,
      mentionedIn(text, people).filter(({ userId }) => userId !== author.userId),
    );
    return { voice, mentioned, comment: presentComment(await findComment(tx, voiceId, id), voice, ctx.actor) };
  });

  const url = `${ctx.site}/voices/${voiceId}/revisions/${number}#${done.comment.id}`;
  const about = { author: author.name, voice: done.voice.name, number, text, url };
  await post(
    done.mentioned.map(({ userId, name, email }) => {
      const unsubscribe = `${ctx.site}/unsubscribe?token=${unsubscribeToken(userId)}`;
      return { to: email, letter: mentionLetter({ ...about, name, unsubscribe }) };
    }),
  );
  return done.comment;
}
