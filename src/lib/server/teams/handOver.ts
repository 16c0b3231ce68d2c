import { members } from "#lib/db/index.ts";
import { eq } from "drizzle-orm";
import { recordDeed } from "../audit.ts";
import { authorize, memberOf, type Context } from "../context.ts";
import { notFound, Refusal } from "../errors.ts";
import { lockMembers } from "./lockMembers.ts";

interface HandOver {
  ctx: Context;
  input: { userId: string };
}

/** Makes another member an owner and the actor a designer, both or neither. */
export async function handOverTeam({ ctx, input: { userId } }: HandOver): Promise<void> {
  const actor = memberOf(ctx);
  const teamId = actor.team.id;
  authorize(ctx, "team.handOver", { teamId });
  await ctx.db.transaction(async (tx) => {
    const all = await lockMembers(tx, teamId);
    const [heir, self] = [userId, actor.userId].map((id) => all.find((member) => member.userId === id));
    if (!heir || !self) throw notFound();
    if (heir === self) throw new Refusal("conflict", "You are an owner already. Choose somebody else.");
    // The actor may have been made something else since the request began.
    if (self.role !== "owner") throw new Refusal("conflict", "You are no owner any more. Nothing was changed.");
    await tx.update(members).set({ role: "owner" }).where(eq(members.id, heir.id));
    await tx.update(members).set({ role: "designer" }).where(eq(members.id, self.id));
    const deed = { teamId, actorId: actor.userId, subjectId: userId, detail: { name: heir.name }, at: ctx.now() };
    await recordDeed(tx, { ...deed, action: "team.handOver" });
  });
}
