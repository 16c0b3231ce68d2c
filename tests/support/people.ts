import { members, newId, teams, users, type Database } from "#lib/db/index.ts";
import type { Actor, Role, Team } from "#lib/policy/index.ts";
import type { Context } from "#lib/server/context.ts";

export interface TestTeam {
  team: Team;
  /** The context of a request by a person of this role, who is made at first asking. */
  as(role: Role): Promise<Context & { actor: Actor }>;
}

/** A team of its own for a test, so that tests share a database without meeting. */
export async function makeTeam(db: Database, now: () => Date = () => new Date()): Promise<TestTeam> {
  const id = newId("tea");
  const team = { id, name: "Test bench", slug: id.replace("_", "-") };
  await db.insert(teams).values(team);
  const known = new Map<Role, Actor>();

  return {
    team,
    async as(role) {
      let actor = known.get(role);
      if (!actor) {
        const userId = newId("usr");
        actor = { userId, name: `The ${role}`, email: `${userId}@example.test`, team, role };
        await db.insert(users).values({ id: userId, name: actor.name, email: actor.email, emailVerified: true });
        await db.insert(members).values({ id: newId("mem"), organizationId: id, userId, role });
        known.set(role, actor);
      }
      return { db, actor, now, site: "http://clatterbench.test" };
    },
  };
}
