import { roles } from "#lib/policy/index.ts";
import { index, pgTable, text, uniqueIndex } from "drizzle-orm/pg-core";
import { createdAt, idColumn, moment, oneOf } from "../columns.ts";
import { users } from "./auth.ts";
import { teams } from "./teams.ts";

export const members = pgTable(
  "members",
  {
    id: idColumn(),
    organizationId: text("team_id")
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    role: text("role").notNull(),
    createdAt: createdAt(),
  },
  (table) => [
    uniqueIndex("members_team_user_key").on(table.organizationId, table.userId),
    index("members_user_id_index").on(table.userId, table.createdAt),
    oneOf("members_role_word", table.role, roles),
  ],
);

const invitationStates = ["pending", "accepted", "rejected", "canceled"] as const;

export const invitations = pgTable(
  "invitations",
  {
    id: idColumn(),
    organizationId: text("team_id")
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    email: text("email").notNull(),
    role: text("role").notNull(),
    status: text("status").notNull().default("pending"),
    expiresAt: moment("expires_at").notNull(),
    inviterId: text("inviter_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    createdAt: createdAt(),
  },
  (table) => [
    index("invitations_team_id_index").on(table.organizationId, table.createdAt),
    index("invitations_email_index").on(table.email),
    index("invitations_inviter_id_index").on(table.inviterId),
    oneOf("invitations_role_word", table.role, roles),
    oneOf("invitations_status_word", table.status, invitationStates),
  ],
);
