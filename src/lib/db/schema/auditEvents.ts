import { sql } from "drizzle-orm";
import { check, index, jsonb, pgTable, text } from "drizzle-orm/pg-core";
import { idColumn, moment } from "../columns.ts";
import { users } from "./auth.ts";
import { teams } from "./teams.ts";

/** What was done, by whom, to what. Written in the transaction of the deed; kept when its subject is gone. */
export const auditEvents = pgTable(
  "audit_events",
  {
    id: idColumn(),
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id, { onDelete: "cascade" }),
    actorId: text("actor_id").references(() => users.id, { onDelete: "set null" }),
    action: text("action").notNull(),
    subjectId: text("subject_id").notNull(),
    detail: jsonb("detail").$type<Record<string, unknown>>().notNull().default({}),
    at: moment("at").notNull().defaultNow(),
  },
  (table) => [
    check("audit_events_action_length", sql`char_length(${table.action}) between 1 and 60`),
    check("audit_events_detail_object", sql`jsonb_typeof(${table.detail}) = 'object'`),
    index("audit_events_team_at_index").on(table.teamId, table.at, table.id),
    index("audit_events_subject_index").on(table.subjectId, table.at),
    index("audit_events_actor_index").on(table.actorId),
  ],
);
