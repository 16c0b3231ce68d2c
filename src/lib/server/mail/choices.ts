import { mailChoices, users } from "#lib/db/index.ts";
import { eq } from "drizzle-orm";
import { noSession, type Context } from "../context.ts";
import { notFound } from "../errors.ts";
import { personOfToken } from "./unsubscribe.ts";

async function choose(ctx: Context, userId: string, mentions: boolean): Promise<void> {
  const change = { mentions, updatedAt: ctx.now() };
  await ctx.db
    .insert(mailChoices)
    .values({ userId, ...change })
    .onConflictDoUpdate({ target: mailChoices.userId, set: change });
}

/** Stops mails about mentions, on the word of a link in one of them. */
export async function unsubscribe({ ctx, input }: { ctx: Context; input: { token: string } }): Promise<void> {
  const userId = personOfToken(input.token);
  if (userId === null) throw notFound();
  const [known] = await ctx.db.select({ id: users.id }).from(users).where(eq(users.id, userId));
  if (!known) throw notFound();
  await choose(ctx, userId, false);
}

export async function wantsMentions({ ctx }: { ctx: Context }): Promise<boolean> {
  if (!ctx.actor) throw noSession();
  const [row] = await ctx.db
    .select({ mentions: mailChoices.mentions })
    .from(mailChoices)
    .where(eq(mailChoices.userId, ctx.actor.userId));
  return row?.mentions ?? true;
}

/** The actor's own choice, taken back or made again. */
export async function chooseMentions({ ctx, input }: { ctx: Context; input: { mentions: boolean } }): Promise<void> {
  if (!ctx.actor) throw noSession();
  await choose(ctx, ctx.actor.userId, input.mentions);
}
