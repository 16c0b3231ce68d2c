import { sql, type SQL } from "drizzle-orm";
import { check, text, timestamp, type AnyPgColumn } from "drizzle-orm/pg-core";

/** Milliseconds and no finer, so that a moment survives the way through a JavaScript Date and back unchanged. */
export const moment = (name: string) => timestamp(name, { withTimezone: true, precision: 3, mode: "date" });

export const idColumn = () => text("id").primaryKey();

export const createdAt = () => moment("created_at").notNull().defaultNow();

export const updatedAt = () => moment("updated_at").notNull().defaultNow();

/** One of a closed list of words. */
export function oneOf(name: string, column: AnyPgColumn, words: readonly string[]) {
  const list = sql.raw(words.map((word) => `'${word}'`).join(", "));
  return check(name, sql`${column} in (${list})`);
}

/** Text of a bounded length without blanks at its ends. */
export function trimmedText(name: string, column: AnyPgColumn, most: number) {
  return check(
    name,
    sql`char_length(${column}) between 1 and ${sql.raw(String(most))} and ${column} = btrim(${column})`,
  );
}

/** A member of a JSON document that must be there with the given type. */
export function jsonMember(column: AnyPgColumn, key: string, type: "array" | "object" | "number"): SQL {
  return sql`coalesce(jsonb_typeof(${column} -> '${sql.raw(key)}'), '') = '${sql.raw(type)}'`;
}
