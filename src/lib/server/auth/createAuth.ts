import {
  accounts,
  invitations,
  members,
  newId,
  rateLimits,
  sessions,
  teams,
  users,
  verifications,
  type Database,
} from "#lib/db/index.ts";
import { drizzleAdapter } from "better-auth/adapters/drizzle";
import { APIError } from "better-auth/api";
import { betterAuth } from "better-auth/minimal";
import { organization } from "better-auth/plugins/organization";
import { eq } from "drizzle-orm";
import type { Settings } from "../env.ts";
import { log } from "../log.ts";
import {
  accountExistsLetter,
  emailChangeLetter,
  invitationLetter,
  passwordResetLetter,
  verificationLetter,
} from "../mail/letters.ts";
import type { Mailer } from "../mail/mailer.ts";
import { accessControl, teamRoles } from "./accessControl.ts";
import { ensureTeam } from "./ensureTeam.ts";
import { baseUrlFor } from "./hosts.ts";
import { peerHeader } from "./peer.ts";
import { recordSignIn, teamDeeds } from "./deeds.ts";
import { checkMemberRole, checkPersonName, checkTeam } from "./rules.ts";

const day = 24 * 60 * 60;

const prefixes: Record<string, string> = {
  user: "usr",
  session: "ses",
  account: "acc",
  verification: "ver",
  organization: "tea",
  member: "mem",
  invitation: "inv",
  rateLimit: "lim",
};

export type AuthSettings = Pick<
  Settings,
  "CLATTERBENCH_MODE" | "HOST" | "PUBLIC_URL" | "BETTER_AUTH_SECRET" | "RATE_LIMIT_ACCOUNTS"
>;

export function createAuth({ db, mailer, settings }: { db: Database; mailer: Mailer; settings: AuthSettings }) {
  const siteOf = (request: Request | undefined) =>
    settings.CLATTERBENCH_MODE === "demo" && request ? new URL(request.url).origin : settings.PUBLIC_URL;
  const attempts = settings.RATE_LIMIT_ACCOUNTS;

  return betterAuth({
    appName: "Clatterbench",
    secret: settings.BETTER_AUTH_SECRET,
    baseURL: baseUrlFor(settings),
    basePath: "/api/auth",
    // Done by verbs of our own, which hold the lock that keeps an owner in the team, and write down who did it.
    disabledPaths: ["/organization/update-member-role", "/organization/remove-member", "/organization/leave"],
    database: drizzleAdapter(db, {
      provider: "pg",
      transaction: true,
      schema: {
        user: users,
        session: sessions,
        account: accounts,
        verification: verifications,
        organization: teams,
        member: members,
        invitation: invitations,
        rateLimit: rateLimits,
      },
    }),
    advanced: {
      cookiePrefix: "clatterbench",
      useSecureCookies: settings.PUBLIC_URL.startsWith("https:"),
      defaultCookieAttributes: { httpOnly: true, sameSite: "lax", path: "/" },
      ipAddress: { ipAddressHeaders: [peerHeader] },
      database: { generateId: ({ model }) => newId(prefixes[model] ?? "row") },
    },
    session: { expiresIn: 30 * day, updateAge: day },
    rateLimit: {
      enabled: attempts > 0,
      storage: "database",
      window: 60,
      max: 600,
      customRules: {
        "/get-session": false,
        "/sign-in/email": { window: 60, max: attempts },
        "/sign-up/email": { window: 60, max: attempts },
        "/request-password-reset": { window: 60, max: attempts },
        "/send-verification-email": { window: 60, max: attempts },
        "/change-email": { window: 60, max: attempts },
        "/organization/invite-member": { window: 60, max: attempts },
      },
    },
    emailAndPassword: {
      enabled: true,
      requireEmailVerification: true,
      revokeSessionsOnPasswordReset: true,
      sendResetPassword: async ({ user, url }) =>
        mailer.send(user.email, passwordResetLetter({ name: user.name, url })),
      onExistingUserSignUp: async ({ user }, request) => {
        const url = `${siteOf(request)}/sign-in`;
        await mailer.send(user.email, accountExistsLetter({ name: user.name, url }));
      },
    },
    emailVerification: {
      sendOnSignUp: true,
      sendOnSignIn: true,
      autoSignInAfterVerification: true,
      sendVerificationEmail: async ({ user, url }) =>
        mailer.send(user.email, verificationLetter({ name: user.name, url })),
    },
    user: {
      changeEmail: {
        enabled: true,
        sendChangeEmailConfirmation: async ({ user, newEmail, url }) =>
          mailer.send(user.email, emailChangeLetter({ name: user.name, newEmail, url })),
      },
    },
    databaseHooks: {
      user: {
        create: { before: async (user) => ({ data: { ...user, name: checkPersonName(user.name) } }) },
        update: {
          before: async (change) =>
            typeof change.name === "string" ? { data: { ...change, name: checkPersonName(change.name) } } : undefined,
        },
      },
      session: {
        create: {
          before: async (session) => {
            const [person] = await db
              .select({ id: users.id, name: users.name })
              .from(users)
              .where(eq(users.id, session.userId));
            if (!person) throw new APIError("UNAUTHORIZED", { message: "This account is gone." });
            return { data: { ...session, activeOrganizationId: await ensureTeam(db, person) } };
          },
          after: async (session) => recordSignIn(db, session),
        },
      },
    },
    plugins: [
      organization({
        ac: accessControl,
        roles: teamRoles,
        creatorRole: "owner",
        disableOrganizationDeletion: true,
        organizationLimit: 20,
        membershipLimit: 500,
        invitationExpiresIn: 7 * day,
        requireEmailVerificationOnInvitation: true,
        cancelPendingInvitationsOnReInvite: true,
        organizationHooks: {
          ...teamDeeds(db),
          beforeCreateOrganization: async ({ organization: team }) => ({ data: { ...team, ...checkTeam(team) } }),
          beforeUpdateOrganization: async ({ organization: team }) => ({ data: { ...team, ...checkTeam(team) } }),
          beforeAddMember: async ({ member }) => checkMemberRole(member.role),
          beforeCreateInvitation: async ({ invitation }) => checkMemberRole(invitation.role),
        },
        sendInvitationEmail: async ({ id, email, role, organization: team, inviter }, request) => {
          const url = `${siteOf(request)}/invitations/${id}`;
          const about = { inviter: inviter.user.name, team: team.name, role, url };
          await mailer.send(email, invitationLetter(about));
        },
      }),
    ],
    logger: {
      level: "warn",
      log: (level, message, ...details) => log()[level === "error" ? "error" : "warn"]({ details }, message),
    },
    telemetry: { enabled: false },
  });
}

export type Auth = ReturnType<typeof createAuth>;
