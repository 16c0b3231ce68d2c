import { auditEvents, comments, openDatabase } from "#lib/db/index.ts";
import { roles } from "#lib/policy/index.ts";
import { changeComment, deleteComment } from "#lib/server/comments/change.ts";
import { countOpenThreads, listComments } from "#lib/server/comments/list.ts";
import { mentionedIn } from "#lib/server/comments/mentions.ts";
import { writeComment } from "#lib/server/comments/write.ts";
import { compareRevisions } from "#lib/server/compare/compare.ts";
import { chooseMentions, unsubscribe } from "#lib/server/mail/choices.ts";
import { mailbox } from "#lib/server/mail/index.ts";
import { commentChange, commentListQuery, newComment } from "#lib/wire/comment.ts";
import { compareQuery } from "#lib/wire/compare.ts";
import { eq } from "drizzle-orm";
import { afterAll, describe, expect, test } from "vitest";
import { makeTeam } from "../support/people.ts";
import { makeVoice } from "../support/revisions.ts";

const db = openDatabase(process.env.DATABASE_URL ?? "");
afterAll(() => db.close());

async function begin() {
  const voice = await makeVoice(db);
  await voice.save(2200);
  await voice.make();
  const write = async (role: "owner" | "designer" | "reviewer" | "builder" | "viewer", text: string, more = {}) =>
    writeComment({
      ctx: await voice.team.as(role),
      input: { id: voice.id, ...newComment.parse({ revision: 1, text, ...more }) },
    });
  return { ...voice, write };
}

const rowOf = async (id: string) => (await db.select().from(comments).where(eq(comments.id, id)))[0];
const mailsTo = async (email: string) => (await mailbox())!.list().filter(({ to }) => to.includes(email));

describe("writing", () => {
  test.each(["owner", "designer", "reviewer", "builder"] as const)("is open to a %s", async (role) => {
    const { team, write } = await begin();
    const written = await write(role, "Was 1k8 for the brighter end?", { at: { stage: "band", part: "rb" } });
    expect(written).toMatchObject({
      ...{ revision: 1, thread: null, at: { stage: "band", part: "rb" }, can: { change: true, resolve: true } },
      author: { name: (await team.as(role)).actor.name },
    });
  });

  test("is closed to a viewer", async () => {
    await expect((await begin()).write("viewer", "Hello")).rejects.toMatchObject({ code: "not-allowed" });
  });

  test.each(roles)("does not exist for the %s of another team, nor does changing", async (role) => {
    const { id, write } = await begin();
    const { id: commentId } = await write("builder", "Ours");
    const before = await rowOf(commentId);
    const ctx = await (await makeTeam(db)).as(role);
    const asked = [
      () => writeComment({ ctx, input: { id, revision: 1, text: "Theirs" } }),
      () => changeComment({ ctx, input: { id, commentId, text: "Theirs" } }),
      () => changeComment({ ctx, input: { id, commentId, resolved: true } }),
      () => deleteComment({ ctx, input: { id, commentId } }),
      () => listComments({ ctx, input: { id, ...commentListQuery.parse({}) } }),
    ];
    for (const deed of asked) await expect(deed()).rejects.toMatchObject({ code: "not-found" });
    expect(await rowOf(commentId)).toEqual(before);
  });

  test("under a remark of another voice of one's own team is not found", async () => {
    const { team, write } = await begin();
    const { id: thread } = await write("builder", "Here");
    const other = await makeVoice(db, team);
    await other.make();
    const input = { id: other.id, revision: 1, text: "There", thread };
    await expect(writeComment({ ctx: await team.as("builder"), input })).rejects.toMatchObject({ code: "not-found" });
  });

  test("an answer is about what its thread is about, and answers no answer", async () => {
    const { write } = await begin();
    const first = await write("reviewer", "Why?", { at: { stage: "band" } });
    const answer = await write("designer", "Because.", { thread: first.id });
    expect(answer).toMatchObject({ thread: first.id, at: { stage: "band" }, can: { resolve: false } });
    await expect(write("builder", "So?", { thread: answer.id })).rejects.toMatchObject({
      errors: [{ path: "thread" }],
    });
  });

  test("on a stage the revision does not have is refused", async () => {
    await expect((await begin()).write("builder", "x", { at: { stage: "none" } })).rejects.toMatchObject({
      errors: [{ path: "at.stage" }],
    });
  });

  test("fifty at once lose nothing", async () => {
    const { team, id, write } = await begin();
    await team.as("builder");
    await team.as("reviewer");
    await Promise.all(Array.from({ length: 50 }, (_, i) => write(i % 2 ? "builder" : "reviewer", `Remark ${i}`)));
    const ctx = await team.as("owner");
    const page = await listComments({ ctx, input: { id, ...commentListQuery.parse({ limit: 200 }) } });
    expect(new Set(page.comments.map(({ text }) => text)).size).toBe(50);
  });
});

describe("a remark of one's own", () => {
  test("is rewritten with trace, the old words in the log", async () => {
    const { team, id, write } = await begin();
    const { id: commentId } = await write("builder", "R2 is fine");
    const ctx = await team.as("builder");
    const changed = await changeComment({ ctx, input: { id, commentId, text: "R2 is too low" } });
    expect(changed).toMatchObject({ text: "R2 is too low", editedAt: expect.stringMatching(/Z$/) });
    const deeds = await db.select().from(auditEvents).where(eq(auditEvents.subjectId, id));
    expect(deeds).toContainEqual(
      expect.objectContaining({ action: "comment.change", detail: expect.objectContaining({ before: "R2 is fine" }) }),
    );
  });

  test("is taken back, and that there was one stays", async () => {
    const { team, id, write } = await begin();
    const { id: commentId } = await write("builder", "Oops");
    const ctx = await team.as("builder");
    await deleteComment({ ctx, input: { id, commentId } });
    expect(await rowOf(commentId)).toMatchObject({ text: "", deletedAt: expect.any(Date), authorName: ctx.actor.name });
    const rewriting = changeComment({ ctx, input: { id, commentId, text: "Again" } });
    await expect(rewriting).rejects.toMatchObject({ code: "conflict" });
  });

  test.each(["owner", "designer", "reviewer", "viewer"] as const)("is left alone by a %s", async (role) => {
    const { team, id, write } = await begin();
    const { id: commentId } = await write("builder", "Mine");
    const before = await rowOf(commentId);
    const ctx = await team.as(role);
    await expect(changeComment({ ctx, input: { id, commentId, text: "Yours" } })).rejects.toMatchObject({
      code: "not-allowed",
    });
    await expect(deleteComment({ ctx, input: { id, commentId } })).rejects.toMatchObject({ code: "not-allowed" });
    expect(await rowOf(commentId)).toEqual(before);
  });
});

describe("a thread", () => {
  test("counts as open until somebody resolves it, and the checklist says so", async () => {
    const { team, id, write } = await begin();
    const { id: commentId } = await write("reviewer", "Why?");
    await write("designer", "Because.", { thread: commentId });
    const ctx = await team.as("builder");
    const state = async () => {
      const found = await compareRevisions({ ctx, input: { id, ...compareQuery.parse({ to: 1 }) } });
      return found.checklist.find((item) => item.id === "discussion")?.state;
    };
    expect([await countOpenThreads(db, id, 1), await state()]).toEqual([1, "open"]);
    const resolved = await changeComment({ ctx, input: { id, commentId, resolved: true } });
    expect(resolved.resolvedBy?.name).toBe(ctx.actor.name);
    expect([await countOpenThreads(db, id, 1), await state()]).toEqual([0, "checked"]);
  });

  test("is found among the open ones, page by page", async () => {
    const { team, id, write } = await begin();
    for (const text of ["a", "b", "c"]) await write("builder", text);
    const ctx = await team.as("owner");
    const page = (query: Record<string, unknown>) =>
      listComments({ ctx, input: { id, ...commentListQuery.parse(query) } });
    const first = await page({ limit: 2, revision: 1, open: "true" });
    const rest = await page({ limit: 2, revision: 1, open: "true", cursor: first.nextCursor });
    expect([...first.comments, ...rest.comments].map(({ text }) => text)).toEqual(["a", "b", "c"]);
    expect((await page({ sort: "newest" })).comments.map(({ text }) => text)).toEqual(["c", "b", "a"]);
    expect((await page({ open: "false" })).comments).toEqual([]);
  });

  test("takes either other words or a resolution, not both", () => {
    expect(commentChange.safeParse({ text: "x", resolved: true }).success).toBe(false);
    expect(commentChange.safeParse({}).success).toBe(false);
  });
});

describe("a mention", () => {
  const named = (name: string) => ({ userId: name, name, email: "", role: "builder" as const });

  test.each([
    ["@Ana Bell, look", ["Ana Bell"]],
    ["@ana bell", ["Ana Bell"]],
    ["@Ana", ["Ana"]],
    ["ask @Anabel", []],
    ["Ana Bell, look", []],
    ["@Ana and @Ana Bell", ["Ana", "Ana Bell"]],
  ])("in “%s” is of %j", (text, names) => {
    const found = mentionedIn(text, [named("Ana"), named("Ana Bell"), named("Bo")]);
    expect(found.map(({ name }) => name).sort()).toEqual(names);
  });

  test("comes by mail, which can be stopped from the mail itself and had again", async () => {
    const { team, id, write } = await begin();
    const reviewer = await team.as("reviewer");
    const remark = await write("designer", "@The reviewer, is 2k2 right?");
    const [mail] = await mailsTo(reviewer.actor.email);
    expect(mail?.subject).toBe("The designer mentioned you on revision 1 of Rattle");
    expect(mail?.text).toContain(`http://clatterbench.test/voices/${id}/revisions/1#${remark.id}`);
    const [, token] = /unsubscribe\?token=(\S+)/.exec(mail?.text ?? "") ?? [];
    const nobody = { db, actor: null, now: () => new Date(), site: "" };
    await unsubscribe({ ctx: nobody, input: { token: token! } });
    await write("designer", "@The reviewer, and 2k4?");
    expect(await mailsTo(reviewer.actor.email)).toHaveLength(1);
    await chooseMentions({ ctx: reviewer, input: { mentions: true } });
    await write("designer", "@The reviewer, once more?");
    expect(await mailsTo(reviewer.actor.email)).toHaveLength(2);
  });

  test("of oneself or of a viewer, who cannot read it, sends nothing", async () => {
    const { team, write } = await begin();
    const [viewer, builder] = [await team.as("viewer"), await team.as("builder")];
    await write("builder", "@The viewer and @The builder");
    expect(await mailsTo(viewer.actor.email)).toEqual([]);
    expect(await mailsTo(builder.actor.email)).toEqual([]);
  });

  test.each(["", "usr_x", "usr_x.forged", "usr_x."])("is not stopped by the token “%s”", async (token) => {
    const nobody = { db, actor: null, now: () => new Date(), site: "" };
    await expect(unsubscribe({ ctx: nobody, input: { token } })).rejects.toMatchObject({ code: "not-found" });
  });
});
