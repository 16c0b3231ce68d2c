import { members } from "#lib/db/index.ts";
import type { Role } from "#lib/policy/index.ts";
import { eq } from "drizzle-orm";
import { recordDeed } from "../audit.ts";
import { authorize, memberOf, type Context } from "../context.ts";
import { notFound } from "../errors.ts";
import { keepAnOwner, lockMembers } from "./lockMembers.ts";

interface ChangeRole {
  ctx: Context;
  input: { userId: string; role: Role };
}

/** Gives a member of the actor's team another role. */
export async function changeRole({ ctx, input: { userId, role } }: ChangeRole): Promise<void> {
  const actor = memberOf(ctx);
  const teamId = actor.team.id;
  authorize(ctx, "team.changeRoles", { teamId });
  await ctx.db.transaction(async (tx) => {
    const all = await lockMembers(tx, teamId);
    const member = all.find((candidate) => candidate.userId === userId);
    if (!member) throw notFound();
    if (member.role === role) return;
    if (role !== "owner") keepAnOwner(all, member);
    await tx.update(members).set({ role }).where(eq(members.id, member.id));
    const detail = { name: member.name, from: member.role, to: role };
    const deed = { teamId, actorId: actor.userId, subjectId: userId, detail, at: ctx.now() };
    await recordDeed(tx, { ...deed, action: "team.changeRoles" });
  });
}
