import { invitations, teams, users } from "#lib/db/index.ts";
import { isRole, type Role } from "#lib/policy/index.ts";
import { and, desc, eq } from "drizzle-orm";
import { authorize, memberOf, type Context } from "../context.ts";
import { notFound } from "../errors.ts";

export interface OpenInvitation {
  id: string;
  email: string;
  role: Role;
  invitedBy: string;
  createdAt: string;
  expiresAt: string;
  expired: boolean;
}

const columns = {
  id: invitations.id,
  email: invitations.email,
  role: invitations.role,
  status: invitations.status,
  createdAt: invitations.createdAt,
  expiresAt: invitations.expiresAt,
  invitedBy: users.name,
  team: teams.name,
};

/** Invitations of the actor's team that nobody has answered, newest first. */
export async function openInvitations({ ctx }: { ctx: Context }): Promise<OpenInvitation[]> {
  const { team } = memberOf(ctx);
  authorize(ctx, "team.invite", { teamId: team.id });
  const rows = await ctx.db
    .select(columns)
    .from(invitations)
    .innerJoin(users, eq(users.id, invitations.inviterId))
    .innerJoin(teams, eq(teams.id, invitations.organizationId))
    .where(and(eq(invitations.organizationId, team.id), eq(invitations.status, "pending")))
    .orderBy(desc(invitations.createdAt), desc(invitations.id))
    .limit(200);
  const now = ctx.now();
  return rows.flatMap(({ id, email, role, invitedBy, createdAt, expiresAt }) =>
    isRole(role)
      ? [
          {
            ...{ id, email, role, invitedBy, expired: expiresAt < now },
            ...{ createdAt: createdAt.toISOString(), expiresAt: expiresAt.toISOString() },
          },
        ]
      : [],
  );
}

export interface ReceivedInvitation {
  id: string;
  team: string;
  email: string;
  role: string;
  invitedBy: string;
  /** "expired" is a pending one whose time is over. */
  state: "pending" | "expired" | "accepted" | "rejected" | "canceled";
}

/** An invitation as its page shows it. The id in the mail is the secret, so no session is asked for. */
export async function readInvitation({
  ctx,
  input,
}: {
  ctx: Context;
  input: { id: string };
}): Promise<ReceivedInvitation> {
  const [row] = await ctx.db
    .select(columns)
    .from(invitations)
    .innerJoin(users, eq(users.id, invitations.inviterId))
    .innerJoin(teams, eq(teams.id, invitations.organizationId))
    .where(eq(invitations.id, input.id));
  if (!row) throw notFound();
  const { id, team, email, role, invitedBy, status, expiresAt } = row;
  const late = status === "pending" && expiresAt < ctx.now();
  return { id, team, email, role, invitedBy, state: late ? "expired" : (status as ReceivedInvitation["state"]) };
}
