import { members, users, type Queryable } from "#lib/db/index.ts";
import { isRole, ruleFor, type Action, type Role } from "#lib/policy/index.ts";
import { and, asc, eq, inArray } from "drizzle-orm";

export interface TeamPerson {
  userId: string;
  name: string;
  email: string;
  role: Role;
}

/** Members of a team whose role lets them do this. */
export async function peopleWhoMay(db: Queryable, teamId: string, action: Action): Promise<TeamPerson[]> {
  const rows = await db
    .select({ userId: users.id, name: users.name, email: users.email, role: members.role })
    .from(members)
    .innerJoin(users, eq(users.id, members.userId))
    .where(and(eq(members.organizationId, teamId), inArray(members.role, [...ruleFor(action).roles])))
    .orderBy(asc(users.name), asc(users.id));
  return rows.flatMap(({ role, ...person }) => (isRole(role) ? [{ ...person, role }] : []));
}
