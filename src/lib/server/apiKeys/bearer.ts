import { apiKeys, members, teams, users } from "#lib/db/index.ts";
import { isRole, type Actor } from "#lib/policy/index.ts";
import { and, eq, isNull, lt, or } from "drizzle-orm";
import { database } from "../database.ts";
import { hashOfSecret } from "../secretToken.ts";

const keyForm = /^Bearer\s+(cbk_[\w-]{43})$/i;

/** More often than this the last use is not written: it is for people to read. */
const minute = 60_000;

/** Whether a request comes with a key at all; if so no session counts, so that a script never acts by accident of a cookie. */
export const hasBearer = (headers: Headers): boolean => /^Bearer(\s|$)/i.test(headers.get("authorization") ?? "");

/** Whom a key speaks for: its owner, with the role they hold in its team now. Null for one that is unknown or revoked. */
export async function actorOfKey(headers: Headers): Promise<Actor | null> {
  const [, key] = keyForm.exec(headers.get("authorization") ?? "") ?? [];
  if (key === undefined) return null;
  const db = database();
  const [found] = await db
    .select({
      id: apiKeys.id,
      userId: users.id,
      name: users.name,
      email: users.email,
      role: members.role,
      team: { id: teams.id, name: teams.name, slug: teams.slug },
    })
    .from(apiKeys)
    .innerJoin(users, eq(users.id, apiKeys.userId))
    .innerJoin(teams, eq(teams.id, apiKeys.teamId))
    .innerJoin(members, and(eq(members.userId, apiKeys.userId), eq(members.organizationId, apiKeys.teamId)))
    .where(and(eq(apiKeys.hash, hashOfSecret(key)), isNull(apiKeys.revokedAt)));
  if (!found || !isRole(found.role)) return null;
  const now = new Date();
  const stale = or(isNull(apiKeys.lastUsedAt), lt(apiKeys.lastUsedAt, new Date(now.getTime() - minute)));
  await db
    .update(apiKeys)
    .set({ lastUsedAt: now })
    .where(and(eq(apiKeys.id, found.id), stale));
  const { userId, name, email, role, team } = found;
  return { userId, name, email, role, team };
}
