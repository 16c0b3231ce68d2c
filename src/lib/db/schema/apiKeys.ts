import { check, index, pgTable, text, uniqueIndex } from "drizzle-orm/pg-core";
import { sql } from "drizzle-orm";
import { createdAt, idColumn, moment, trimmedText } from "../columns.ts";
import { users } from "./auth.ts";
import { teams } from "./teams.ts";

/** A person's key for scripts. It acts in one team, with whatever role its owner has there at that moment. */
export const apiKeys = pgTable(
  "api_keys",
  {
    id: idColumn(),
    userId: text("user_id")
      .notNull()
      .references(() => users.id, { onDelete: "cascade" }),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    name: text("name").notNull(),
    /** SHA-256 of the key, which itself is shown once and kept nowhere. */
    hash: text("hash").notNull(),
    /** Its first characters, by which a person tells keys apart. */
    start: text("start").notNull(),
    createdAt: createdAt(),
    lastUsedAt: moment("last_used_at"),
    revokedAt: moment("revoked_at"),
  },
  (table) => [
    uniqueIndex("api_keys_hash_key").on(table.hash),
    index("api_keys_user_index").on(table.userId, table.createdAt),
    index("api_keys_team_index").on(table.teamId),
    trimmedText("api_keys_name_length", table.name, 80),
    check("api_keys_hash_form", sql`${table.hash} ~ '^[0-9a-f]{64}$'`),
  ],
);
