import { boolean, pgTable, text } from "drizzle-orm/pg-core";
import { updatedAt } from "../columns.ts";
import { users } from "./auth.ts";

/** Which mails a person wants; a person without a row wants all. */
export const mailChoices = pgTable("mail_choices", {
  userId: text("user_id")
    .primaryKey()
    .references(() => users.id, { onDelete: "cascade" }),
  mentions: boolean("mentions").notNull().default(true),
  updatedAt: updatedAt(),
});
