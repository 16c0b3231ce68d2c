import { auditEvents, openDatabase, revisions } from "#lib/db/index.ts";
import { roles } from "#lib/policy/index.ts";
import { mailbox } from "#lib/server/mail/index.ts";
import { askForReview } from "#lib/server/revisions/askForReview.ts";
import { decideReview } from "#lib/server/revisions/decide.ts";
import { makeRevision } from "#lib/server/revisions/make.ts";
import { readRevision } from "#lib/server/revisions/read.ts";
import { reviewDecision } from "#lib/wire/revision.ts";
import { eq } from "drizzle-orm";
import { afterAll, describe, expect, test } from "vitest";
import { makeTeam } from "../support/people.ts";
import { makeVoice } from "../support/revisions.ts";

const db = openDatabase(process.env.DATABASE_URL ?? "");
afterAll(() => db.close());

const mailsTo = async (email: string) => (await mailbox())!.list().filter(({ to }) => to.includes(email));
const rowsOf = (voiceId: string) => db.select().from(revisions).where(eq(revisions.voiceId, voiceId));
const release = { decision: "release", note: "" } as const;
const back = { decision: "return", note: "R2 is too low" } as const;

async function underReview() {
  const voice = await makeVoice(db);
  await voice.save(2200);
  const number = await voice.make("darker band");
  for (const role of ["reviewer", "owner"] as const) await voice.team.as(role);
  await voice.ask(number);
  return { ...voice, number };
}

describe("asking for review", () => {
  test("tells every reviewer and owner but the author, with a link", async () => {
    const { team, id } = await underReview();
    for (const role of ["reviewer", "owner"] as const) {
      const { actor } = await team.as(role);
      const mails = await mailsTo(actor.email);
      expect(mails.map(({ subject }) => subject)).toEqual(["Review revision 1 of Rattle"]);
      expect(mails[0]?.text).toContain(`http://clatterbench.test/voices/${id}/revisions/1`);
      expect(mails[0]?.text).toContain("The designer asks you to review revision 1 of Rattle: “darker band”");
      expect(mails[0]?.html).toContain("See what changed");
    }
    expect(await mailsTo((await team.as("designer")).actor.email)).toEqual([]);
  });

  test("of one person tells that person alone", async () => {
    const { team, id, make } = await makeVoice(db);
    await make();
    const reviewer = (await team.as("reviewer")).actor;
    const owner = (await team.as("owner")).actor;
    const asked = await askForReview({
      ctx: await team.as("designer"),
      input: { id, number: 1, reviewer: reviewer.userId },
    });
    expect(asked).toMatchObject({ status: "under review", review: { reviewer: { id: reviewer.userId } } });
    expect(await mailsTo(reviewer.email)).toHaveLength(1);
    expect(await mailsTo(owner.email)).toEqual([]);
  });

  test.each(["builder", "viewer", "designer"] as const)("of a %s is refused", async (role) => {
    const { team, id, make } = await makeVoice(db);
    await make();
    const { actor } = await team.as(role);
    const asking = askForReview({ ctx: await team.as("designer"), input: { id, number: 1, reviewer: actor.userId } });
    await expect(asking).rejects.toMatchObject({ errors: [{ path: "reviewer" }] });
    expect(await rowsOf(id)).toMatchObject([{ status: "in preparation" }]);
  });

  test("of somebody in another team is refused", async () => {
    const { team, id, make } = await makeVoice(db);
    await make();
    const { actor } = await (await makeTeam(db)).as("reviewer");
    const asking = askForReview({ ctx: await team.as("designer"), input: { id, number: 1, reviewer: actor.userId } });
    await expect(asking).rejects.toMatchObject({ code: "invalid-input" });
  });

  test.each(["reviewer", "builder", "viewer"] as const)("is refused to a %s", async (role) => {
    const { team, id, make } = await makeVoice(db);
    await make();
    const asking = askForReview({ ctx: await team.as(role), input: { id, number: 1 } });
    await expect(asking).rejects.toMatchObject({ code: "not-allowed" });
    expect(await rowsOf(id)).toMatchObject([{ status: "in preparation", askedAt: null }]);
  });

  test("for what was decided already is a conflict", async () => {
    const { team, id } = await underReview();
    await decideReview({ ctx: await team.as("reviewer"), input: { id, number: 1, ...back } });
    const asking = askForReview({ ctx: await team.as("designer"), input: { id, number: 1 } });
    await expect(asking).rejects.toMatchObject({ code: "conflict" });
  });
});

describe("deciding", () => {
  test.each([
    ["release", release, "released"],
    ["return", back, "returned"],
  ] as const)("to %s is kept with name and note, and the author is told", async (_, decision, status) => {
    const { team, id } = await underReview();
    const ctx = await team.as("reviewer");
    const decided = await decideReview({ ctx, input: { id, number: 1, ...decision } });
    expect(decided).toMatchObject({
      status,
      review: { decision: decision.decision, note: decision.note, decidedBy: { id: ctx.actor.userId } },
    });
    const [mail] = await mailsTo((await team.as("designer")).actor.email);
    expect(mail?.subject).toBe(`Revision 1 of Rattle was ${status}`);
    expect(mail?.text).toContain(decision.note);
    const deeds = await db.select().from(auditEvents).where(eq(auditEvents.subjectId, id));
    expect(deeds).toContainEqual(expect.objectContaining({ action: "revision.review", actorId: ctx.actor.userId }));
  });

  test("twenty decisions at once by two reviewers: exactly one wins, the rest are told who", async () => {
    const { team, id } = await underReview();
    const people = [await team.as("reviewer"), await team.as("owner")] as const;
    const tries = Array.from({ length: 20 }, (_, i) =>
      decideReview({ ctx: people[i % 2 ? 1 : 0], input: { id, number: 1, ...(i % 3 ? release : back) } }),
    );
    const ends = await Promise.allSettled(tries);
    expect(ends.filter(({ status }) => status === "fulfilled")).toHaveLength(1);
    for (const end of ends) {
      if (end.status === "rejected")
        expect(end.reason).toMatchObject({ code: "conflict", message: expect.stringContaining("decided by") });
    }
    const deeds = await db.select().from(auditEvents).where(eq(auditEvents.subjectId, id));
    expect(deeds.filter(({ action }) => action === "revision.review")).toHaveLength(1);
  });

  test("on one's own revision is refused, to an owner too", async () => {
    const { team, id } = await makeVoice(db);
    const ctx = await team.as("owner");
    const input = { id, reason: "mine", acceptedWarnings: [], expected: null };
    await makeRevision({ ctx, input });
    await askForReview({ ctx, input: { id, number: 1 } });
    const deciding = decideReview({ ctx, input: { id, number: 1, ...release } });
    await expect(deciding).rejects.toMatchObject({ code: "not-allowed", message: expect.stringContaining("own work") });
    expect(await rowsOf(id)).toMatchObject([{ status: "under review", decision: null }]);
  });

  test.each(["designer", "builder", "viewer"] as const)("is refused to a %s", async (role) => {
    const { team, id } = await underReview();
    const before = await rowsOf(id);
    const deciding = decideReview({ ctx: await team.as(role), input: { id, number: 1, ...release } });
    await expect(deciding).rejects.toMatchObject({ code: "not-allowed" });
    expect(await rowsOf(id)).toEqual(before);
  });

  test.each(roles)("does not exist for the %s of another team", async (role) => {
    const { id } = await underReview();
    const before = await rowsOf(id);
    const ctx = await (await makeTeam(db)).as(role);
    await expect(decideReview({ ctx, input: { id, number: 1, ...release } })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(askForReview({ ctx, input: { id, number: 1 } })).rejects.toMatchObject({ code: "not-found" });
    expect(await rowsOf(id)).toEqual(before);
  });

  test("before anybody asked is a conflict", async () => {
    const { team, id, make } = await makeVoice(db);
    await make();
    const deciding = decideReview({ ctx: await team.as("reviewer"), input: { id, number: 1, ...release } });
    await expect(deciding).rejects.toMatchObject({ code: "conflict" });
  });

  test("to return needs a note", () => {
    expect(reviewDecision.safeParse({ decision: "return", note: "  " }).error?.issues).toMatchObject([
      { path: ["note"] },
    ]);
    expect(reviewDecision.safeParse({ decision: "release" }).success).toBe(true);
  });
});

describe("a release", () => {
  test("supersedes what came before it, and leaves returned ones returned", async () => {
    const { team, id, make, ask, release: releaseIt } = await makeVoice(db);
    for (const reason of ["a", "b", "c", "d"]) await make(reason);
    await releaseIt(1);
    await ask(2);
    await decideReview({ ctx: await team.as("reviewer"), input: { id, number: 2, ...back } });
    await releaseIt(4);
    const ctx = await team.as("builder");
    const statuses = [1, 2, 3, 4].map(async (number) => (await readRevision({ ctx, input: { id, number } })).status);
    expect(await Promise.all(statuses)).toEqual(["superseded", "returned", "superseded", "released"]);
  });
});
