import { sessions } from "#lib/db/index.ts";
import type { SessionAnswer } from "#lib/wire/session.ts";
import { and, desc, eq, gt } from "drizzle-orm";
import { noSession, type Context } from "../context.ts";
import { notFound } from "../errors.ts";

/** Where the actor is signed in. Tokens stay here: an id is enough to end one. */
export async function listSessions({
  ctx,
  input: { current },
}: {
  ctx: Context;
  input: { current: string | null };
}): Promise<SessionAnswer[]> {
  if (!ctx.actor) throw noSession();
  const rows = await ctx.db
    .select()
    .from(sessions)
    .where(and(eq(sessions.userId, ctx.actor.userId), gt(sessions.expiresAt, ctx.now())))
    .orderBy(desc(sessions.updatedAt), desc(sessions.id))
    .limit(200);
  return rows.map((row) => ({
    id: row.id,
    createdAt: row.createdAt.toISOString(),
    updatedAt: row.updatedAt.toISOString(),
    expiresAt: row.expiresAt.toISOString(),
    address: row.ipAddress || null,
    browser: row.userAgent || null,
    current: row.id === current,
  }));
}

/** Signs the actor out at one place. */
export async function endSession({ ctx, input: { id } }: { ctx: Context; input: { id: string } }): Promise<void> {
  if (!ctx.actor) throw noSession();
  const ended = await ctx.db
    .delete(sessions)
    .where(and(eq(sessions.id, id), eq(sessions.userId, ctx.actor.userId)))
    .returning({ id: sessions.id });
  if (ended.length === 0) throw notFound();
}
