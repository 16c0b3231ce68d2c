import { members, newId, teams, type Database } from "#lib/db/index.ts";
import { asc, eq, sql } from "drizzle-orm";

export function slugFrom(name: string): string {
  const words = name
    .normalize("NFKD")
    .replace(/\p{M}/gu, "")
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, "-")
    .replace(/^-+|-+$/g, "")
    .slice(0, 40)
    .replace(/-+$/, "");
  return words || "team";
}

/** Gives a person a team of their own unless they already belong to one. Returns the team to act in. */
export async function ensureTeam(db: Database, person: { id: string; name: string }): Promise<string> {
  return db.transaction(async (tx) => {
    // Two first sign-ins at once must not make two teams.
    await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${person.id}, 0))`);
    const [membership] = await tx
      .select({ teamId: members.organizationId })
      .from(members)
      .where(eq(members.userId, person.id))
      .orderBy(asc(members.createdAt), asc(members.id))
      .limit(1);
    if (membership) return membership.teamId;

    const id = newId("tea");
    const name = `${person.name.trim().slice(0, 60).trim()}’s team`;
    await tx.insert(teams).values({ id, name, slug: `${slugFrom(person.name)}-${id.slice(-8)}` });
    await tx.insert(members).values({ id: newId("mem"), organizationId: id, userId: person.id, role: "owner" });
    return id;
  });
}
