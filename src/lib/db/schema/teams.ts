import { sql } from "drizzle-orm";
import { check, pgTable, text, uniqueIndex } from "drizzle-orm/pg-core";
import { createdAt, idColumn, trimmedText, updatedAt } from "../columns.ts";

/** A team: better-auth calls it an organization. */
export const teams = pgTable(
  "teams",
  {
    id: idColumn(),
    name: text("name").notNull(),
    slug: text("slug").notNull(),
    logo: text("logo"),
    metadata: text("metadata"),
    createdAt: createdAt(),
    updatedAt: updatedAt(),
  },
  (table) => [
    uniqueIndex("teams_slug_key").on(table.slug),
    trimmedText("teams_name_length", table.name, 80),
    check("teams_slug_form", sql`${table.slug} ~ '^[a-z0-9]+(-[a-z0-9]+)*$' and char_length(${table.slug}) <= 80`),
  ],
);
