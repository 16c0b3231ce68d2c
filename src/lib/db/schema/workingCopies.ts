import { sql } from "drizzle-orm";
import { check, index, integer, jsonb, pgTable, text } from "drizzle-orm/pg-core";
import { createdAt, jsonMember, updatedAt } from "../columns.ts";
import { users } from "./auth.ts";
import { voices } from "./voices.ts";

export const workingCopies = pgTable(
  "working_copies",
  {
    voiceId: text("voice_id")
      .primaryKey()
      .references(() => voices.id, { onDelete: "cascade" }),
    /** Counts saves; the ETag is made of it. */
    version: integer("version").notNull().default(1),
    document: jsonb("document").$type<unknown>().notNull(),
    updatedBy: text("updated_by").references(() => users.id, { onDelete: "set null" }),
    createdAt: createdAt(),
    updatedAt: updatedAt(),
  },
  (table) => [
    check("working_copies_version_positive", sql`${table.version} >= 1`),
    check("working_copies_document_object", sql`jsonb_typeof(${table.document}) = 'object'`),
    check(
      "working_copies_document_members",
      sql`${jsonMember(table.document, "format", "number")} and ${jsonMember(table.document, "stages", "array")} and ${jsonMember(table.document, "links", "array")} and ${jsonMember(table.document, "conditions", "object")}`,
    ),
    index("working_copies_updated_by_index").on(table.updatedBy),
  ],
);
