import { members, teams } from "#lib/db/index.ts";
import { isRole, type Role } from "#lib/policy/index.ts";
import { asc, eq } from "drizzle-orm";
import { noSession, type Context } from "../context.ts";

export interface OwnTeam {
  id: string;
  name: string;
  role: Role;
  /** The one this session acts in. */
  current: boolean;
}

/** Every team that the actor belongs to. */
export async function myTeams({ ctx }: { ctx: Context }): Promise<OwnTeam[]> {
  const { actor } = ctx;
  if (!actor) throw noSession();
  const rows = await ctx.db
    .select({ id: teams.id, name: teams.name, role: members.role })
    .from(members)
    .innerJoin(teams, eq(teams.id, members.organizationId))
    .where(eq(members.userId, actor.userId))
    .orderBy(asc(teams.name), asc(teams.id));
  return rows.flatMap(({ role, ...team }) =>
    isRole(role) ? [{ ...team, role, current: team.id === actor.team?.id }] : [],
  );
}
