import { libraryVersion } from "#lib/circuit/index.ts";
import { auditEvents, openDatabase, revisions, users, voices, workingCopies } from "#lib/db/index.ts";
import { roles } from "#lib/policy/index.ts";
import { listRevisions } from "#lib/server/revisions/list.ts";
import { makeRevision } from "#lib/server/revisions/make.ts";
import { readRevision } from "#lib/server/revisions/read.ts";
import { recomputeRevision } from "#lib/server/revisions/recompute.ts";
import { restoreRevision } from "#lib/server/revisions/restore.ts";
import { removeVoice } from "#lib/server/voices/remove.ts";
import { readWorkingCopy } from "#lib/server/workingCopies/read.ts";
import { revisionListQuery } from "#lib/wire/revision.ts";
import { and, eq, sql } from "drizzle-orm";
import { afterAll, describe, expect, test } from "vitest";
import { makeTeam } from "../support/people.ts";
import { makeVoice } from "../support/revisions.ts";

const db = openDatabase(process.env.DATABASE_URL ?? "");
afterAll(() => db.close());

const input = (id: string, reason = "first try") => ({ id, reason, acceptedWarnings: [], expected: null });
const rowsOf = (voiceId: string) => db.select().from(revisions).where(eq(revisions.voiceId, voiceId));

describe("making a revision", () => {
  test("keeps inputs, results, states, warnings, version and author", async () => {
    const { team, id, save } = await makeVoice(db);
    await save(2200);
    const ctx = await team.as("designer");
    const made = await makeRevision({ ctx, input: input(id, "trim reaches both ends") });
    expect(made).toMatchObject({
      ...{ number: 1, reason: "trim reaches both ends", status: "in preparation", libraryVersion, stageCount: 1 },
      createdBy: { id: ctx.actor.userId, name: ctx.actor.name },
      inputs: { format: 1, stages: [{ id: "band", parts: { rb: 2200 } }] },
      results: { band: { centreFrequency: expect.closeTo(1125.4, 0) } },
      states: { band: { centreFrequency: "outside" } },
    });
    expect(await readRevision({ ctx, input: { id, number: 1 } })).toEqual(made);
    const deeds = await db.select().from(auditEvents).where(eq(auditEvents.subjectId, id));
    expect(deeds.map(({ action }) => action)).toContain("revision.make");
  });

  test("leaves earlier ones as they were when the working copy goes on", async () => {
    const { team, id, save, make } = await makeVoice(db);
    await save(2200);
    await make();
    await save(1800);
    expect(await make("darker")).toBe(2);
    const ctx = await team.as("builder");
    expect((await readRevision({ ctx, input: { id, number: 1 } })).inputs.stages[0]?.parts.rb).toBe(2200);
    expect((await readRevision({ ctx, input: { id, number: 2 } })).inputs.stages[0]?.parts.rb).toBe(1800);
  });

  test("ten at once get ten numbers", async () => {
    const { team, id } = await makeVoice(db);
    const people = [await team.as("designer"), await team.as("owner")] as const;
    const made = await Promise.all(
      Array.from({ length: 10 }, (_, i) => makeRevision({ ctx: people[i % 2 ? 1 : 0], input: input(id) })),
    );
    expect(made.map(({ number }) => number).sort((a, b) => a - b)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
  });

  test("of a working copy that has gone on meanwhile is refused with the newer copy", async () => {
    const { team, id, save } = await makeVoice(db);
    await save(2200);
    const making = makeRevision({ ctx: await team.as("owner"), input: { ...input(id), expected: [1] } });
    await expect(making).rejects.toMatchObject({
      code: "stale-copy",
      members: { current: { stages: [{ id: "band" }] } },
    });
    expect(await rowsOf(id)).toEqual([]);
  });

  test("accepts only warnings that there are", async () => {
    const { team, id, save } = await makeVoice(db);
    await save(5);
    const ctx = await team.as("designer");
    const accepting = (code: string) =>
      makeRevision({ ctx, input: { ...input(id), acceptedWarnings: [{ stage: "band", code }] } });
    await expect(accepting("no-such-warning")).rejects.toMatchObject({ errors: [{ path: "acceptedWarnings.0" }] });
    const made = await accepting("outside-usual-range");
    expect(made.warnings.filter(({ accepted }) => accepted).map(({ code }) => code)).toContain("outside-usual-range");
  });

  test.each(["reviewer", "builder", "viewer"] as const)("is refused to a %s, and nothing is kept", async (role) => {
    const { team, id } = await makeVoice(db);
    const making = makeRevision({ ctx: await team.as(role), input: input(id) });
    await expect(making).rejects.toMatchObject({ code: "not-allowed" });
    expect(await rowsOf(id)).toEqual([]);
  });

  test.each(roles)("does not exist for the %s of another team", async (role) => {
    const { id, make } = await makeVoice(db);
    await make();
    const before = await rowsOf(id);
    const ctx = await (await makeTeam(db)).as(role);
    const asked = { ctx, input: { id, number: 1 } };
    await expect(makeRevision({ ctx, input: input(id) })).rejects.toMatchObject({ code: "not-found" });
    await expect(readRevision(asked)).rejects.toMatchObject({ code: "not-found" });
    await expect(recomputeRevision(asked)).rejects.toMatchObject({ code: "not-found" });
    await expect(restoreRevision({ ctx, input: { id, number: 1, expected: [1] } })).rejects.toMatchObject({
      code: "not-found",
    });
    await expect(listRevisions({ ctx, input: { id, ...revisionListQuery.parse({}) } })).rejects.toMatchObject({
      code: "not-found",
    });
    expect(await rowsOf(id)).toEqual(before);
  });
});

describe("reading revisions", () => {
  test.each(["owner", "designer", "reviewer", "builder"] as const)("all are open to a %s", async (role) => {
    const { team, id, make } = await makeVoice(db);
    await make();
    expect((await readRevision({ ctx: await team.as(role), input: { id, number: 1 } })).can.read).toBe(true);
  });

  test("a viewer reads the released, now or before, and is given no other", async () => {
    const { team, id, make, release } = await makeVoice(db);
    await release(await make("one"));
    await release(await make("two"));
    await make("three");
    const ctx = await team.as("viewer");
    const { revisions: seen } = await listRevisions({ ctx, input: { id, ...revisionListQuery.parse({}) } });
    expect(seen.map(({ number, status }) => [number, status])).toEqual([
      [2, "released"],
      [1, "superseded"],
    ]);
    expect(await readRevision({ ctx, input: { id, number: 1 } })).toMatchObject({ status: "superseded" });
    await expect(readRevision({ ctx, input: { id, number: 3 } })).rejects.toMatchObject({ code: "not-allowed" });
  });

  test("come in pages, sorted and filtered", async () => {
    const { team, id, make, release } = await makeVoice(db);
    for (const reason of ["a", "b", "c"]) await make(reason);
    await release(2);
    const ctx = await team.as("builder");
    const page = async (query: Record<string, unknown>) =>
      listRevisions({ ctx, input: { id, ...revisionListQuery.parse(query) } });
    const first = await page({ limit: 2 });
    expect(first.revisions.map(({ number }) => number)).toEqual([3, 2]);
    const rest = await page({ limit: 2, cursor: first.nextCursor });
    expect([rest.revisions.map(({ number }) => number), rest.nextCursor]).toEqual([[1], null]);
    expect((await page({ sort: "oldest" })).revisions.map(({ number }) => number)).toEqual([1, 2, 3]);
    expect((await page({ status: "released" })).revisions.map(({ number }) => number)).toEqual([2]);
    await expect(page({ sort: "oldest", cursor: first.nextCursor })).rejects.toMatchObject({
      errors: [{ path: "cursor" }],
    });
  });
});

describe("restoring", () => {
  test("puts the kept document into the working copy, and the log says from where", async () => {
    const { team, id, save, make } = await makeVoice(db);
    await save(2200);
    await make();
    await save(1800);
    const ctx = await team.as("designer");
    await restoreRevision({ ctx, input: { id, number: 1, expected: [3] } });
    const { copy, etag } = await readWorkingCopy({ ctx, input: { id } });
    expect([copy.stages[0]?.parts.rb, etag]).toEqual([2200, '"v4"']);
    const deeds = await db.select().from(auditEvents).where(eq(auditEvents.subjectId, id));
    expect(deeds.map(({ detail }) => detail)).toContainEqual({ restored: 1, version: 4, stages: 1 });
  });

  test("over a newer copy is refused, and that copy stays", async () => {
    const { team, id, save, make } = await makeVoice(db);
    await save(2200);
    await make();
    await save(1800);
    const restoring = restoreRevision({ ctx: await team.as("owner"), input: { id, number: 1, expected: [2] } });
    await expect(restoring).rejects.toMatchObject({ code: "stale-copy" });
    const [row] = await db.select().from(workingCopies).where(eq(workingCopies.voiceId, id));
    expect(row).toMatchObject({ version: 3, document: { stages: [{ parts: { rb: 1800 } }] } });
  });

  test.each(["reviewer", "builder", "viewer"] as const)("is refused to a %s", async (role) => {
    const { team, id, make } = await makeVoice(db);
    await make();
    const restoring = restoreRevision({ ctx: await team.as(role), input: { id, number: 1, expected: [1] } });
    await expect(restoring).rejects.toMatchObject({ code: "not-allowed" });
  });
});

test("recomputing tells that the same library gives the same figures", async () => {
  const { team, id, save, make } = await makeVoice(db);
  await save(2200);
  await make();
  expect(await recomputeRevision({ ctx: await team.as("builder"), input: { id, number: 1 } })).toEqual({
    ...{ keptWith: libraryVersion, computedWith: libraryVersion, differences: [] },
    warnings: { gone: [], new: [] },
  });
});

describe("the database itself", () => {
  const frozen = { cause: { code: "23000" } };
  const setting = (id: string, change: Partial<typeof revisions.$inferInsert>) =>
    db.update(revisions).set(change).where(eq(revisions.voiceId, id));

  test.each([
    ["the inputs", { inputs: { format: 1, stages: [], links: [], conditions: {} } }],
    ["the figures", { analysis: { results: {}, states: {}, warnings: [] } }],
    ["the reason", { reason: "another" }],
    ["the number", { number: 7 }],
    ["the version", { libraryVersion: "9.9.9" }],
    ["the author's name", { authorName: "Somebody" }],
    ["accepted warnings", { acceptedWarnings: [{ stage: "band", code: "x" }] }],
    ["the moment", { createdAt: new Date(0) }],
    ["a status out of turn", { status: "returned" as const, decision: "return" as const }],
  ])("refuses to change %s", async (_, change) => {
    const { id, save, make } = await makeVoice(db);
    await save(2200);
    await make();
    const before = await rowsOf(id);
    const decided = "decision" in change ? { decidedAt: new Date(), decidedByName: "x" } : {};
    await expect(setting(id, { ...change, ...decided })).rejects.toMatchObject(frozen);
    expect(await rowsOf(id)).toEqual(before);
  });

  test("refuses to take a decision back", async () => {
    const { id, make, release } = await makeVoice(db);
    await release(await make());
    await expect(setting(id, { decisionNote: "never mind" })).rejects.toMatchObject(frozen);
    await expect(setting(id, { status: "under review" })).rejects.toMatchObject(frozen);
  });

  test("refuses a decision by the author", async () => {
    const { id, make, ask } = await makeVoice(db);
    await make();
    await ask(1);
    const [row] = await rowsOf(id);
    const decided = { status: "released", decision: "release", decidedAt: new Date(), decidedByName: "x" } as const;
    await expect(setting(id, { ...decided, decidedById: row!.authorId })).rejects.toMatchObject({
      cause: { code: "23514", constraint_name: "revisions_never_own" },
    });
  });

  test("refuses to remove a revision, or all of them, while the voice stands", async () => {
    const { id, make } = await makeVoice(db);
    await make();
    await expect(db.delete(revisions).where(eq(revisions.voiceId, id))).rejects.toMatchObject(frozen);
    await expect(db.execute(sql`truncate revisions cascade`)).rejects.toMatchObject(frozen);
    expect(await rowsOf(id)).toHaveLength(1);
  });

  test("keeps the author's name when the account goes", async () => {
    const { team, id, make } = await makeVoice(db);
    await make();
    const { actor } = await team.as("designer");
    await db.delete(users).where(eq(users.id, actor.userId));
    expect(await rowsOf(id)).toMatchObject([{ authorId: null, authorName: actor.name }]);
  });

  test("refuses to change or remove what the log says", async () => {
    const { id } = await makeVoice(db);
    const mine = and(eq(auditEvents.subjectId, id), eq(auditEvents.action, "voice.create"));
    await expect(db.update(auditEvents).set({ action: "other" }).where(mine)).rejects.toMatchObject(frozen);
    await expect(db.delete(auditEvents).where(mine)).rejects.toMatchObject(frozen);
    expect(await db.select().from(auditEvents).where(mine)).toHaveLength(1);
  });
});

describe("a voice with a released revision", () => {
  test("is removed by an owner alone, and its revisions with it", async () => {
    const { team, id, make, release } = await makeVoice(db);
    await release(await make());
    await expect(removeVoice({ ctx: await team.as("designer"), input: { id } })).rejects.toMatchObject({
      code: "conflict",
    });
    expect(await rowsOf(id)).toHaveLength(1);
    await removeVoice({ ctx: await team.as("owner"), input: { id } });
    expect(await rowsOf(id)).toEqual([]);
    expect(await db.select().from(voices).where(eq(voices.id, id))).toEqual([]);
  });
});
