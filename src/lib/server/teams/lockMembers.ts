import { members, teams, users, type Queryable } from "#lib/db/index.ts";
import { isRole, type Role } from "#lib/policy/index.ts";
import { eq } from "drizzle-orm";
import { Refusal } from "../errors.ts";

export interface LockedMember {
  id: string;
  userId: string;
  name: string;
  role: Role;
}

/** The members of a team, which nobody else changes until the transaction ends. */
export async function lockMembers(tx: Queryable, teamId: string): Promise<LockedMember[]> {
  await tx.select({ id: teams.id }).from(teams).where(eq(teams.id, teamId)).for("update");
  const rows = await tx
    .select({ id: members.id, userId: members.userId, name: users.name, role: members.role })
    .from(members)
    .innerJoin(users, eq(users.id, members.userId))
    .where(eq(members.organizationId, teamId));
  return rows.flatMap(({ role, ...member }) => (isRole(role) ? [{ ...member, role }] : []));
}

/** Refuses what would leave the team without an owner; the database would too, but could not say it in words. */
export function keepAnOwner(all: readonly LockedMember[], without: LockedMember): void {
  if (without.role !== "owner" || all.some(({ id, role }) => role === "owner" && id !== without.id)) return;
  throw new Refusal(
    "conflict",
    `${without.name} is the only owner, and a team always has one. Hand ownership over first. Nothing was changed.`,
  );
}
