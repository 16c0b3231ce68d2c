import { auditEvents, members, openDatabase } from "#lib/db/index.ts";
import { roles } from "#lib/policy/index.ts";
import { changeRole } from "#lib/server/teams/changeRole.ts";
import { handOverTeam } from "#lib/server/teams/handOver.ts";
import { openInvitations } from "#lib/server/teams/invitations.ts";
import { readTeamMembers } from "#lib/server/teams/read.ts";
import { removeMember } from "#lib/server/teams/removeMember.ts";
import { and, eq } from "drizzle-orm";
import { afterAll, describe, expect, test } from "vitest";
import { makeTeam, type TestTeam } from "../support/people.ts";
import { makeVoice } from "../support/revisions.ts";
import { readRevision } from "#lib/server/revisions/read.ts";

const db = openDatabase(process.env.DATABASE_URL ?? "");
afterAll(() => db.close());

const rolesIn = async (team: TestTeam) =>
  Object.fromEntries(
    (await db.select().from(members).where(eq(members.organizationId, team.team.id))).map((row) => [
      row.userId,
      row.role,
    ]),
  );
const deedsOf = (team: TestTeam) => db.select().from(auditEvents).where(eq(auditEvents.teamId, team.team.id));

async function fullTeam() {
  const team = await makeTeam(db);
  for (const role of roles) await team.as(role);
  return team;
}

describe("another role", () => {
  test("is given by an owner, and the log says from which to which and by whom", async () => {
    const team = await fullTeam();
    const ctx = await team.as("owner");
    const { userId } = (await team.as("viewer")).actor;
    await changeRole({ ctx, input: { userId, role: "builder" } });
    expect((await rolesIn(team))[userId]).toBe("builder");
    expect(await deedsOf(team)).toMatchObject([
      {
        ...{ action: "team.changeRoles", actorId: ctx.actor.userId, subjectId: userId },
        detail: { from: "viewer", to: "builder" },
      },
    ]);
  });

  test.each(["designer", "reviewer", "builder", "viewer"] as const)("is not given by a %s", async (role) => {
    const team = await fullTeam();
    const before = await rolesIn(team);
    const ctx = await team.as(role);
    const owner = (await team.as("owner")).actor.userId;
    const deeds = [
      () => changeRole({ ctx, input: { userId: ctx.actor.userId, role: "owner" } }),
      () => removeMember({ ctx, input: { userId: owner } }),
      () => handOverTeam({ ctx, input: { userId: ctx.actor.userId } }),
      () => openInvitations({ ctx }),
    ];
    for (const deed of deeds) await expect(deed()).rejects.toMatchObject({ code: "not-allowed" });
    expect(await rolesIn(team)).toEqual(before);
  });

  test("is not given to somebody of another team, who does not exist here", async () => {
    const [team, other] = [await fullTeam(), await fullTeam()];
    const { userId } = (await other.as("viewer")).actor;
    const ctx = await team.as("owner");
    await expect(changeRole({ ctx, input: { userId, role: "owner" } })).rejects.toMatchObject({ code: "not-found" });
    await expect(removeMember({ ctx, input: { userId } })).rejects.toMatchObject({ code: "not-found" });
    await expect(handOverTeam({ ctx, input: { userId } })).rejects.toMatchObject({ code: "not-found" });
    expect((await rolesIn(other))[userId]).toBe("viewer");
  });
});

describe("a team always has an owner", () => {
  test("the only one can neither step down nor leave", async () => {
    const team = await fullTeam();
    const ctx = await team.as("owner");
    const { userId } = ctx.actor;
    await expect(changeRole({ ctx, input: { userId, role: "viewer" } })).rejects.toMatchObject({ code: "conflict" });
    await expect(removeMember({ ctx, input: { userId } })).rejects.toMatchObject({ code: "conflict" });
    expect((await rolesIn(team))[userId]).toBe("owner");
  });

  test("of two who step down at once one stays", async () => {
    const team = await fullTeam();
    const first = await team.as("owner");
    const second = await team.as("designer");
    await changeRole({ ctx: first, input: { userId: second.actor.userId, role: "owner" } });
    const asOwner = { ...second, actor: { ...second.actor, role: "owner" as const } };
    const ends = await Promise.allSettled([
      changeRole({ ctx: first, input: { userId: first.actor.userId, role: "viewer" } }),
      removeMember({ ctx: asOwner, input: { userId: second.actor.userId } }),
    ]);
    expect(ends.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    expect(Object.values(await rolesIn(team)).filter((role) => role === "owner")).toHaveLength(1);
  });

  test("the database refuses it too, whoever asks", async () => {
    const team = await fullTeam();
    const owner = and(eq(members.organizationId, team.team.id), eq(members.role, "owner"));
    const refused = { cause: { code: "23000" } };
    await expect(db.update(members).set({ role: "viewer" }).where(owner)).rejects.toMatchObject(refused);
    await expect(db.delete(members).where(owner)).rejects.toMatchObject(refused);
    expect(Object.values(await rolesIn(team))).toContain("owner");
  });

  test("handed over, it has another one, and the former is a designer", async () => {
    const team = await fullTeam();
    const ctx = await team.as("owner");
    const heir = (await team.as("reviewer")).actor.userId;
    await handOverTeam({ ctx, input: { userId: heir } });
    const now = await rolesIn(team);
    expect([now[heir], now[ctx.actor.userId]]).toEqual(["owner", "designer"]);
    // The old role in a request that was under way no longer counts.
    await expect(handOverTeam({ ctx, input: { userId: heir } })).rejects.toMatchObject({ code: "conflict" });
  });
});

describe("leaving", () => {
  test.each(["designer", "reviewer", "builder", "viewer"] as const)("is up to a %s", async (role) => {
    const team = await fullTeam();
    const ctx = await team.as(role);
    await removeMember({ ctx, input: { userId: ctx.actor.userId } });
    expect((await rolesIn(team))[ctx.actor.userId]).toBeUndefined();
    expect(await deedsOf(team)).toMatchObject([{ action: "member.leave", actorId: ctx.actor.userId }]);
  });

  test("leaves what they made, under their name", async () => {
    const { team, id, make } = await makeVoice(db);
    await make("mine");
    const { actor } = await team.as("designer");
    await removeMember({ ctx: await team.as("owner"), input: { userId: actor.userId } });
    const kept = await readRevision({ ctx: await team.as("builder"), input: { id, number: 1 } });
    expect(kept.createdBy.name).toBe(actor.name);
    const names = (await readTeamMembers({ ctx: await team.as("builder") })).map(({ userId }) => userId);
    expect(names).not.toContain(actor.userId);
  });
});
