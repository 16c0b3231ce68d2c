import { apiKeys, newId, teams } from "#lib/db/index.ts";
import type { ApiKeyAnswer, newApiKey, newApiKeyAnswer } from "#lib/wire/apiKey.ts";
import { and, desc, eq, isNull } from "drizzle-orm";
import type { z } from "zod";
import { recordDeed } from "../audit.ts";
import { memberOf, type Context } from "../context.ts";
import { notFound, Refusal } from "../errors.ts";
import { hashOfSecret, newSecret } from "../secretToken.ts";

const mostKeys = 50;

/** The actor's own keys that still work, newest first. */
export async function listApiKeys({ ctx }: { ctx: Context }): Promise<ApiKeyAnswer[]> {
  const { userId } = memberOf(ctx);
  const rows = await ctx.db
    .select({ key: apiKeys, team: { id: teams.id, name: teams.name } })
    .from(apiKeys)
    .innerJoin(teams, eq(teams.id, apiKeys.teamId))
    .where(and(eq(apiKeys.userId, userId), isNull(apiKeys.revokedAt)))
    .orderBy(desc(apiKeys.createdAt), desc(apiKeys.id));
  return rows.map(({ key, team }) => present(key, team));
}

/** Makes a key that acts in the actor's present team. The key itself leaves here and is kept nowhere. */
export async function makeApiKey({
  ctx,
  input: { name },
}: {
  ctx: Context;
  input: z.output<typeof newApiKey>;
}): Promise<z.output<typeof newApiKeyAnswer>> {
  const { userId, team } = memberOf(ctx);
  const key = `cbk_${newSecret()}`;
  const id = newId("key");
  const at = ctx.now();
  return ctx.db.transaction(async (tx) => {
    const known = await tx
      .select({ id: apiKeys.id })
      .from(apiKeys)
      .where(and(eq(apiKeys.userId, userId), isNull(apiKeys.revokedAt)))
      .limit(mostKeys);
    if (known.length >= mostKeys) {
      throw new Refusal("conflict", `You have ${mostKeys} keys, which is the most there can be. Revoke one first.`);
    }
    const [row] = await tx
      .insert(apiKeys)
      .values({ id, userId, teamId: team.id, name, hash: hashOfSecret(key), start: key.slice(0, 10), createdAt: at })
      .returning();
    await recordDeed(tx, {
      ...{ teamId: team.id, actorId: userId, subjectId: id, detail: { name }, at },
      action: "apiKey.make",
    });
    return { ...present(row!, team), key };
  });
}

/** Ends one of the actor's own keys at once. */
export async function revokeApiKey({ ctx, input: { id } }: { ctx: Context; input: { id: string } }): Promise<void> {
  const { userId } = memberOf(ctx);
  const at = ctx.now();
  await ctx.db.transaction(async (tx) => {
    const [row] = await tx
      .update(apiKeys)
      .set({ revokedAt: at })
      .where(and(eq(apiKeys.id, id), eq(apiKeys.userId, userId), isNull(apiKeys.revokedAt)))
      .returning();
    if (!row) throw notFound();
    const deed = { teamId: row.teamId, actorId: userId, subjectId: id, detail: { name: row.name }, at };
    await recordDeed(tx, { ...deed, action: "apiKey.revoke" });
  });
}

function present(key: typeof apiKeys.$inferSelect, team: { id: string; name: string }): ApiKeyAnswer {
  return {
    ...{ id: key.id, name: key.name, start: key.start, team: { id: team.id, name: team.name } },
    createdAt: key.createdAt.toISOString(),
    updatedAt: (key.revokedAt ?? key.createdAt).toISOString(),
    lastUsedAt: key.lastUsedAt?.toISOString() ?? null,
  };
}
