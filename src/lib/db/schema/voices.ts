import { index, pgTable, text } from "drizzle-orm/pg-core";
import { createdAt, idColumn, trimmedText, updatedAt } from "../columns.ts";
import { users } from "./auth.ts";
import { teams } from "./teams.ts";

export const voices = pgTable(
  "voices",
  {
    id: idColumn(),
    // A team that still owns voices cannot vanish by accident, so this does not cascade.
    teamId: text("team_id")
      .notNull()
      .references(() => teams.id, { onDelete: "restrict" }),
    name: text("name").notNull(),
    // The voice outlives the account of whoever drew it.
    createdBy: text("created_by").references(() => users.id, { onDelete: "set null" }),
    createdAt: createdAt(),
    updatedAt: updatedAt(),
  },
  (table) => [
    trimmedText("voices_name_length", table.name, 120),
    index("voices_team_updated_index").on(table.teamId, table.updatedAt, table.id),
    index("voices_team_created_index").on(table.teamId, table.createdAt, table.id),
    index("voices_team_name_index").on(table.teamId, table.name, table.id),
    index("voices_created_by_index").on(table.createdBy),
  ],
);
