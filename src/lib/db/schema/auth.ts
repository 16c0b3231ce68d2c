import { sql } from "drizzle-orm";
import { bigint, boolean, check, index, integer, pgTable, text, uniqueIndex } from "drizzle-orm/pg-core";
import { createdAt, idColumn, moment, updatedAt } from "../columns.ts";
import { teams } from "./teams.ts";

// Property names are those better-auth's adapter looks for; SQL names are ours.

export const users = pgTable(
  "users",
  {
    id: idColumn(),
    name: text("name").notNull(),
    email: text("email").notNull(),
    emailVerified: boolean("email_verified").notNull().default(false),
    image: text("image"),
    createdAt: createdAt(),
    updatedAt: updatedAt(),
  },
  (table) => [
    uniqueIndex("users_email_key").on(table.email),
    check("users_email_lower_case", sql`${table.email} = lower(${table.email})`),
    check("users_email_length", sql`char_length(${table.email}) between 3 and 320`),
    check("users_name_length", sql`char_length(${table.name}) between 1 and 120`),
  ],
);

export const sessions = pgTable(
  "sessions",
  {
    id: idColumn(),
    token: text("token").notNull(),
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    activeOrganizationId: text("active_team_id").references(() => teams.id, { onDelete: "set null" }),
    expiresAt: moment("expires_at").notNull(),
    ipAddress: text("ip_address"),
    userAgent: text("user_agent"),
    createdAt: createdAt(),
    updatedAt: updatedAt(),
  },
  (table) => [
    uniqueIndex("sessions_token_key").on(table.token),
    index("sessions_user_id_index").on(table.userId),
    index("sessions_active_team_id_index").on(table.activeOrganizationId),
  ],
);

export const accounts = pgTable(
  "accounts",
  {
    id: idColumn(),
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    providerId: text("provider_id").notNull(),
    accountId: text("account_id").notNull(),
    password: text("password"),
    accessToken: text("access_token"),
    refreshToken: text("refresh_token"),
    idToken: text("id_token"),
    accessTokenExpiresAt: moment("access_token_expires_at"),
    refreshTokenExpiresAt: moment("refresh_token_expires_at"),
    scope: text("scope"),
    createdAt: createdAt(),
    updatedAt: updatedAt(),
  },
  (table) => [
    index("accounts_user_id_index").on(table.userId),
    uniqueIndex("accounts_provider_account_key").on(table.providerId, table.accountId),
  ],
);

export const verifications = pgTable(
  "verifications",
  {
    id: idColumn(),
    identifier: text("identifier").notNull(),
    value: text("value").notNull(),
    expiresAt: moment("expires_at").notNull(),
    createdAt: createdAt(),
    updatedAt: updatedAt(),
  },
  (table) => [index("verifications_identifier_index").on(table.identifier)],
);

export const rateLimits = pgTable(
  "rate_limits",
  {
    id: idColumn(),
    key: text("key").notNull(),
    count: integer("count").notNull(),
    lastRequest: bigint("last_request", { mode: "number" }).notNull(),
  },
  (table) => [
    uniqueIndex("rate_limits_key_key").on(table.key),
    check("rate_limits_count_positive", sql`${table.count} >= 0`),
  ],
);
