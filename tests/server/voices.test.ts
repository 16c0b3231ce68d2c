import { auditEvents, openDatabase, voices } from "#lib/db/index.ts";
import { roles } from "#lib/policy/index.ts";
import { createVoice } from "#lib/server/voices/create.ts";
import { readVoice } from "#lib/server/voices/read.ts";
import { removeVoice } from "#lib/server/voices/remove.ts";
import { renameVoice } from "#lib/server/voices/rename.ts";
import { eq } from "drizzle-orm";
import { afterAll, describe, expect, test } from "vitest";
import { makeTeam, type TestTeam } from "../support/people.ts";

const db = openDatabase(process.env.DATABASE_URL ?? "");
afterAll(() => db.close());

const empty = (name: string) => ({ name, template: "empty" as const });

async function voiceOf(team: TestTeam, name = "Rattle") {
  return createVoice({ ctx: await team.as("designer"), input: empty(name) });
}

const rowOf = async (id: string) => (await db.select().from(voices).where(eq(voices.id, id)))[0];

describe("beginning a voice", () => {
  test("gives it to the team and writes down who did it", async () => {
    const team = await makeTeam(db);
    const ctx = await team.as("designer");
    const voice = await createVoice({ ctx, input: empty("Rattle") });
    expect(voice).toMatchObject({ name: "Rattle", stageCount: 0, createdBy: { id: ctx.actor.userId } });
    expect(await rowOf(voice.id)).toMatchObject({ teamId: team.team.id, createdBy: ctx.actor.userId });
    const deeds = await db.select().from(auditEvents).where(eq(auditEvents.subjectId, voice.id));
    expect(deeds).toMatchObject([{ action: "voice.create", actorId: ctx.actor.userId, teamId: team.team.id }]);
  });

  test.each(["two-path-noise", "struck-tone"] as const)("from the template %s brings stages", async (template) => {
    const team = await makeTeam(db);
    const voice = await createVoice({ ctx: await team.as("owner"), input: { name: "From template", template } });
    expect(voice.stageCount).toBeGreaterThan(0);
  });

  test.each(["reviewer", "builder", "viewer"] as const)("is refused to a %s, and nothing is stored", async (role) => {
    const team = await makeTeam(db);
    const beginning = createVoice({ ctx: await team.as(role), input: empty("No") });
    await expect(beginning).rejects.toMatchObject({ code: "not-allowed" });
    expect(await db.select().from(voices).where(eq(voices.teamId, team.team.id))).toEqual([]);
  });

  test("is refused without a session", async () => {
    const ctx = { db, actor: null, now: () => new Date(), site: "http://clatterbench.test" };
    await expect(createVoice({ ctx, input: empty("No") })).rejects.toMatchObject({ code: "no-session" });
  });
});

describe("a voice", () => {
  test.each(roles)("is read by a %s of the team, with what they may do", async (role) => {
    const team = await makeTeam(db);
    const { id } = await voiceOf(team);
    const { can } = await readVoice({ ctx: await team.as(role), input: { id } });
    const draws = role === "owner" || role === "designer";
    expect(can).toEqual({ rename: draws, remove: draws, readWorkingCopy: role !== "viewer", editWorkingCopy: draws });
  });

  test.each(["reviewer", "builder", "viewer"] as const)(
    "stays as it was when a %s renames or removes it",
    async (role) => {
      const team = await makeTeam(db);
      const { id } = await voiceOf(team);
      const before = await rowOf(id);
      const ctx = await team.as(role);
      await expect(renameVoice({ ctx, input: { id, name: "Other" } })).rejects.toMatchObject({ code: "not-allowed" });
      await expect(removeVoice({ ctx, input: { id } })).rejects.toMatchObject({ code: "not-allowed" });
      expect(await rowOf(id)).toEqual(before);
    },
  );

  test.each(roles)("does not exist for the %s of another team", async (role) => {
    const { id } = await voiceOf(await makeTeam(db));
    const before = await rowOf(id);
    const ctx = await (await makeTeam(db)).as(role);
    await expect(readVoice({ ctx, input: { id } })).rejects.toMatchObject({ code: "not-found" });
    await expect(renameVoice({ ctx, input: { id, name: "Mine" } })).rejects.toMatchObject({ code: "not-found" });
    await expect(removeVoice({ ctx, input: { id } })).rejects.toMatchObject({ code: "not-found" });
    expect(await rowOf(id)).toEqual(before);
  });

  test("is renamed and removed by a designer, and both are written down", async () => {
    const team = await makeTeam(db);
    const { id } = await voiceOf(team);
    const ctx = await team.as("designer");
    expect(await renameVoice({ ctx, input: { id, name: "Husk" } })).toMatchObject({ name: "Husk" });
    await removeVoice({ ctx, input: { id } });
    expect(await rowOf(id)).toBeUndefined();
    const deeds = await db.select().from(auditEvents).where(eq(auditEvents.subjectId, id));
    expect(deeds.map(({ action }) => action).sort()).toEqual(["voice.create", "voice.remove", "voice.rename"]);
  });
});
