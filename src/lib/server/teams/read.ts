import { members, users } from "#lib/db/index.ts";
import { isRole, roles, type Role } from "#lib/policy/index.ts";
import { asc, eq } from "drizzle-orm";
import { authorize, memberOf, type Context } from "../context.ts";

export interface TeamMember {
  userId: string;
  name: string;
  email: string;
  role: Role;
  since: string;
}

/** Who belongs to the actor's team: by role, then by name. */
export async function readTeamMembers({ ctx }: { ctx: Context }): Promise<TeamMember[]> {
  const { team } = memberOf(ctx);
  authorize(ctx, "team.read", { teamId: team.id });
  const rows = await ctx.db
    .select({ userId: users.id, name: users.name, email: users.email, role: members.role, since: members.createdAt })
    .from(members)
    .innerJoin(users, eq(users.id, members.userId))
    .where(eq(members.organizationId, team.id))
    .orderBy(asc(users.name), asc(users.id));
  return rows
    .flatMap(({ role, since, ...person }) => (isRole(role) ? [{ ...person, role, since: since.toISOString() }] : []))
    .sort((a, b) => roles.indexOf(a.role) - roles.indexOf(b.role));
}
