import { members } from "#lib/db/index.ts";
import { eq } from "drizzle-orm";
import { recordDeed } from "../audit.ts";
import { authorize, memberOf, type Context } from "../context.ts";
import { notFound } from "../errors.ts";
import { keepAnOwner, lockMembers } from "./lockMembers.ts";

interface RemoveMember {
  ctx: Context;
  input: { userId: string };
}

/** Takes a member out of the actor's team, or lets the actor leave it. What they made stays, under their name. */
export async function removeMember({ ctx, input: { userId } }: RemoveMember): Promise<void> {
  const actor = memberOf(ctx);
  const teamId = actor.team.id;
  const leaving = actor.userId === userId;
  if (!leaving) authorize(ctx, "team.changeRoles", { teamId });
  await ctx.db.transaction(async (tx) => {
    const all = await lockMembers(tx, teamId);
    const member = all.find((candidate) => candidate.userId === userId);
    if (!member) throw notFound();
    keepAnOwner(all, member);
    await tx.delete(members).where(eq(members.id, member.id));
    const detail = { name: member.name, role: member.role };
    const deed = { teamId, actorId: actor.userId, subjectId: userId, detail, at: ctx.now() };
    await recordDeed(tx, { ...deed, action: leaving ? "member.leave" : "member.remove" });
  });
}
