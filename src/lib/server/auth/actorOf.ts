import { members, teams } from "#lib/db/index.ts";
import { isRole, type Actor } from "#lib/policy/index.ts";
import { asc, eq, sql } from "drizzle-orm";
import { database } from "../database.ts";
import { auth } from "./index.ts";

export interface Visit {
  actor: Actor | null;
  /** Id of the session, if there is one. */
  sessionId: string | null;
  /** Cookies to send along, when the session was prolonged. */
  cookies: string[];
}

const nobody: Visit = { actor: null, sessionId: null, cookies: [] };

const sessionCookie = /(?:^|;\s*)(?:__Secure-)?clatterbench\.session_token=/;

/** Finds out who asks. A request without a session cookie costs nothing. */
export async function actorOf(headers: Headers): Promise<Visit> {
  if (!sessionCookie.test(headers.get("cookie") ?? "")) return nobody;
  const { response: found, headers: answered } = await auth().api.getSession({ headers, returnHeaders: true });
  const cookies = answered.getSetCookie();
  if (!found) return { ...nobody, cookies };

  const { user, session } = found;
  const sessionId = session.id;
  const [membership] = await database()
    .select({ role: members.role, id: teams.id, name: teams.name, slug: teams.slug })
    .from(members)
    .innerJoin(teams, eq(teams.id, members.organizationId))
    .where(eq(members.userId, user.id))
    // The team chosen in this session first; if the person left it, the one they joined earliest.
    .orderBy(
      sql`${members.organizationId} = ${session.activeOrganizationId ?? ""} desc`,
      asc(members.createdAt),
      asc(members.id),
    )
    .limit(1);

  const person = { userId: user.id, name: user.name, email: user.email };
  if (!membership || !isRole(membership.role))
    return { actor: { ...person, team: null, role: null }, sessionId, cookies };
  const { role, ...team } = membership;
  return { actor: { ...person, team, role }, sessionId, cookies };
}
