import type { Database } from "#lib/db/index.ts";
import type { DeedName } from "#lib/policy/index.ts";
import type { OrganizationOptions } from "better-auth/plugins/organization";
import { recordDeed } from "../audit.ts";

type Hooks = NonNullable<OrganizationOptions["organizationHooks"]>;

/** Writes down what better-auth's own routes do to the members of a team. */
export function teamDeeds(db: Database): Hooks {
  const record = (
    teamId: string,
    actorId: string,
    action: DeedName,
    subjectId: string,
    detail: Record<string, unknown>,
  ) => recordDeed(db, { teamId, actorId, action, subjectId, detail, at: new Date() });

  return {
    afterCreateInvitation: async ({ invitation: { id, email, role }, inviter, organization: team }) =>
      record(team.id, inviter.id, "team.invite", id, { email, role }),
    afterAcceptInvitation: async ({ invitation: { id, role }, user, organization: team }) =>
      record(team.id, user.id, "invitation.accept", id, { name: user.name, role }),
    afterRejectInvitation: async ({ invitation: { id, email }, user, organization: team }) =>
      record(team.id, user.id, "invitation.decline", id, { email }),
    afterCancelInvitation: async ({ invitation: { id, email }, cancelledBy, organization: team }) =>
      record(team.id, cancelledBy.id, "invitation.revoke", id, { email }),
  };
}

/** A sign-in, in the log of the team it leads to. */
export async function recordSignIn(
  db: Database,
  session: { userId: string; id: string } & Record<string, unknown>,
): Promise<void> {
  const teamId = session.activeOrganizationId;
  if (typeof teamId !== "string") return;
  const { userId, id } = session;
  await recordDeed(db, { teamId, actorId: userId, action: "session.begin", subjectId: id, at: new Date() });
}
