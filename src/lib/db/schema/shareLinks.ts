import { sql } from "drizzle-orm";
import { check, index, integer, pgTable, text, uniqueIndex } from "drizzle-orm/pg-core";
import { createdAt, idColumn, moment, updatedAt } from "../columns.ts";
import { users } from "./auth.ts";
import { revisions } from "./revisions.ts";
import { voices } from "./voices.ts";

/** An address that opens one revision without an account, until it expires or is revoked. */
export const shareLinks = pgTable(
  "share_links",
  {
    id: idColumn(),
    voiceId: text("voice_id")
      .notNull()
      .references(() => voices.id, { onDelete: "cascade" }),
    revisionId: text("revision_id")
      .notNull()
      .references(() => revisions.id, { onDelete: "cascade" }),
    /** SHA-256 of the token in the address, which itself is shown once and kept nowhere. */
    tokenHash: text("token_hash").notNull(),
    createdById: text("created_by_id").references(() => users.id, { onDelete: "set null" }),
    createdAt: createdAt(),
    updatedAt: updatedAt(),
    expiresAt: moment("expires_at"),
    revokedAt: moment("revoked_at"),
    openings: integer("openings").notNull().default(0),
    lastOpenedAt: moment("last_opened_at"),
  },
  (table) => [
    uniqueIndex("share_links_token_key").on(table.tokenHash),
    index("share_links_voice_index").on(table.voiceId, table.createdAt, table.id),
    index("share_links_revision_index").on(table.revisionId),
    index("share_links_created_by_index").on(table.createdById),
    check("share_links_hash_form", sql`${table.tokenHash} ~ '^[0-9a-f]{64}$'`),
    check("share_links_openings_counted", sql`${table.openings} >= 0`),
  ],
);
