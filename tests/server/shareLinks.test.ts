import { auditEvents, openDatabase, shareLinks } from "#lib/db/index.ts";
import { roles } from "#lib/policy/index.ts";
import { listActivity } from "#lib/server/activity/list.ts";
import { listShareLinks, revokeShareLink } from "#lib/server/shareLinks/list.ts";
import { makeShareLink } from "#lib/server/shareLinks/make.ts";
import { openShareLink } from "#lib/server/shareLinks/open.ts";
import { activityQuery } from "#lib/wire/activity.ts";
import { sharedRevision } from "#lib/wire/shareLink.ts";
import { eq } from "drizzle-orm";
import { afterAll, describe, expect, test } from "vitest";
import { makeTeam } from "../support/people.ts";
import { makeVoice } from "../support/revisions.ts";

const db = openDatabase(process.env.DATABASE_URL ?? "");
afterAll(() => db.close());

const guestAt = (moment = new Date()) => ({ db, actor: null, now: () => moment, site: "" });
const tokenOf = (url: string) => url.split("/share/")[1] ?? "";
const open = (url: string, moment?: Date) =>
  openShareLink({ ctx: guestAt(moment), input: { token: tokenOf(url), download: false } });
const rowsOf = (voiceId: string) => db.select().from(shareLinks).where(eq(shareLinks.voiceId, voiceId));

async function released() {
  const voice = await makeVoice(db);
  await voice.save(2200);
  await voice.release(await voice.make());
  return voice;
}

describe("a guest link", () => {
  test("opens its revision, and nothing of the team behind it", async () => {
    const { team, id } = await released();
    const made = await makeShareLink({ ctx: await team.as("owner"), input: { id, revision: 1 } });
    const shared = await open(made.url);
    expect(sharedRevision.parse(shared)).toEqual(shared);
    expect(shared).toMatchObject({
      ...{ voice: "Rattle", revision: 1, status: "released", preparedBy: "The designer", checkedBy: "The reviewer" },
      results: { band: { centreFrequency: expect.any(Number) } },
    });
    const text = JSON.stringify(shared);
    for (const secret of [team.team.id, team.team.name, id, "@example.test", "usr_"])
      expect(text).not.toContain(secret);
  });

  test("is kept as a hash; openings are counted and written down", async () => {
    const { team, id } = await released();
    const made = await makeShareLink({ ctx: await team.as("owner"), input: { id, revision: 1 } });
    expect(tokenOf(made.url)).toMatch(/^[\w-]{43}$/);
    expect(JSON.stringify(await rowsOf(id))).not.toContain(tokenOf(made.url));
    await Promise.all([open(made.url), open(made.url), open(made.url)]);
    const { shareLinks: listed } = await listShareLinks({ ctx: await team.as("owner"), input: { id, limit: 10 } });
    expect(listed).toMatchObject([{ id: made.id, openings: 3, revision: 1 }]);
    const deeds = await db.select().from(auditEvents).where(eq(auditEvents.subjectId, id));
    expect(deeds.filter(({ action }) => action === "shareLink.open")).toHaveLength(3);
  });

  test("is over once it has expired or been revoked", async () => {
    const { team, id } = await released();
    const ctx = await team.as("owner");
    const hour = new Date(Date.now() + 3_600_000);
    const short = await makeShareLink({ ctx, input: { id, revision: 1, expiresAt: hour.toISOString() } });
    await open(short.url);
    await expect(open(short.url, new Date(hour.getTime() + 1))).rejects.toMatchObject({ code: "not-found" });
    await revokeShareLink({ ctx, input: { id, linkId: short.id } });
    await expect(open(short.url)).rejects.toMatchObject({ code: "not-found" });
    await expect(revokeShareLink({ ctx, input: { id, linkId: short.id } })).rejects.toMatchObject({
      code: "not-found",
    });
  });

  test.each(["", "x", "a".repeat(43), "../../etc"])("that is none opens nothing: “%s”", async (token) => {
    const opening = openShareLink({ ctx: guestAt(), input: { token, download: false } });
    await expect(opening).rejects.toMatchObject({ code: "not-found" });
  });

  test("is made of a released revision alone, and for a time to come", async () => {
    const { team, id, make } = await released();
    await make("later");
    const ctx = await team.as("owner");
    await expect(makeShareLink({ ctx, input: { id, revision: 2 } })).rejects.toMatchObject({ code: "conflict" });
    const late = { id, revision: 1, expiresAt: "2001-01-01T00:00:00Z" };
    await expect(makeShareLink({ ctx, input: late })).rejects.toMatchObject({ errors: [{ path: "expiresAt" }] });
    expect(await rowsOf(id)).toEqual([]);
  });

  test.each(["designer", "reviewer", "builder", "viewer"] as const)("is none of a %s's business", async (role) => {
    const { team, id } = await released();
    const made = await makeShareLink({ ctx: await team.as("owner"), input: { id, revision: 1 } });
    const before = await rowsOf(id);
    const ctx = await team.as(role);
    const asked = [
      () => makeShareLink({ ctx, input: { id, revision: 1 } }),
      () => revokeShareLink({ ctx, input: { id, linkId: made.id } }),
      () => listShareLinks({ ctx, input: { id, limit: 10 } }),
    ];
    for (const deed of asked) await expect(deed()).rejects.toMatchObject({ code: "not-allowed" });
    expect(await rowsOf(id)).toEqual(before);
  });

  test.each(roles)("does not exist for the %s of another team", async (role) => {
    const { team, id } = await released();
    const made = await makeShareLink({ ctx: await team.as("owner"), input: { id, revision: 1 } });
    const ctx = await (await makeTeam(db)).as(role);
    await expect(makeShareLink({ ctx, input: { id, revision: 1 } })).rejects.toMatchObject({ code: "not-found" });
    await expect(revokeShareLink({ ctx, input: { id, linkId: made.id } })).rejects.toMatchObject({ code: "not-found" });
    await expect(listShareLinks({ ctx, input: { id, limit: 10 } })).rejects.toMatchObject({ code: "not-found" });
    expect(await rowsOf(id)).toMatchObject([{ revokedAt: null }]);
  });
});

describe("the activity of a team", () => {
  const read = async (ctx: Parameters<typeof listActivity>[0]["ctx"], query: Record<string, unknown> = {}) =>
    listActivity({ ctx, input: activityQuery.parse(query) });

  test("tells who did what, newest first, page by page", async () => {
    const { team, id } = await released();
    const ctx = await team.as("builder");
    const whole = await read(ctx, { voice: id });
    expect(whole.events[0]).toMatchObject({
      action: "revision.review",
      actor: { name: "The reviewer" },
      subject: { name: "Rattle" },
    });
    const seen: string[] = [];
    let cursor: string | null = null;
    do {
      const page: Awaited<ReturnType<typeof read>> = await read(ctx, { limit: 2, ...(cursor ? { cursor } : {}) });
      seen.push(...page.events.map((event) => event.id));
      cursor = page.nextCursor;
    } while (cursor);
    expect(new Set(seen).size).toBe(seen.length);
    expect(seen).toEqual((await read(ctx)).events.map((event) => event.id));
  });

  test("is filtered by person and by deed", async () => {
    const { team } = await released();
    const ctx = await team.as("owner");
    const reviewer = (await team.as("reviewer")).actor.userId;
    expect((await read(ctx, { person: reviewer })).events.map(({ action }) => action)).toEqual(["revision.review"]);
    expect((await read(ctx, { action: "revision.make" })).events).toHaveLength(1);
  });

  test("is closed to a viewer, and holds nothing of another team", async () => {
    const { team } = await released();
    await expect(read(await team.as("viewer"))).rejects.toMatchObject({ code: "not-allowed" });
    expect((await read(await (await makeTeam(db)).as("owner"))).events).toEqual([]);
  });
});
