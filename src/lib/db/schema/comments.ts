import { sql } from "drizzle-orm";
import { check, index, jsonb, pgTable, text, type AnyPgColumn } from "drizzle-orm/pg-core";
import { createdAt, idColumn, moment, updatedAt } from "../columns.ts";
import { users } from "./auth.ts";
import { revisions } from "./revisions.ts";
import { voices } from "./voices.ts";

/** What is talked about, inside the revision: a stage, one of its parts or curves; all of it where empty. */
export interface CommentPlace {
  stage?: string | undefined;
  part?: string | undefined;
  curve?: string | undefined;
}

/** A remark on a revision, or an answer to one. The first of a thread carries its place and whether it is resolved. */
export const comments = pgTable(
  "comments",
  {
    id: idColumn(),
    voiceId: text("voice_id")
      .notNull()
      .references(() => voices.id, { onDelete: "cascade" }),
    revisionId: text("revision_id")
      .notNull()
      .references(() => revisions.id, { onDelete: "cascade" }),
    /** The first remark of the thread; null in that remark itself. */
    threadId: text("thread_id").references((): AnyPgColumn => comments.id, { onDelete: "cascade" }),
    place: jsonb("place").$type<CommentPlace>().notNull().default({}),
    text: text("text").notNull(),
    authorId: text("author_id").references(() => users.id, { onDelete: "set null" }),
    authorName: text("author_name").notNull(),
    createdAt: createdAt(),
    updatedAt: updatedAt(),
    editedAt: moment("edited_at"),
    /** What was written is gone, that something was written stays. */
    deletedAt: moment("deleted_at"),
    resolvedAt: moment("resolved_at"),
    resolvedById: text("resolved_by_id").references(() => users.id, { onDelete: "set null" }),
  },
  (table) => [
    index("comments_voice_index").on(table.voiceId, table.createdAt, table.id),
    index("comments_revision_index").on(table.revisionId, table.createdAt, table.id),
    index("comments_thread_index").on(table.threadId, table.createdAt),
    index("comments_author_index").on(table.authorId),
    index("comments_resolved_by_index").on(table.resolvedById),
    index("comments_open_threads_index")
      .on(table.revisionId)
      .where(sql`${table.threadId} is null and ${table.resolvedAt} is null and ${table.deletedAt} is null`),
    check(
      "comments_text_length",
      sql`char_length(${table.text}) <= 4000 and (${table.deletedAt} is not null or char_length(${table.text}) >= 1)`,
    ),
    check("comments_deleted_empty", sql`${table.deletedAt} is null or ${table.text} = ''`),
    check("comments_place_object", sql`jsonb_typeof(${table.place}) = 'object'`),
    check("comments_answers_not_resolved", sql`${table.threadId} is null or ${table.resolvedAt} is null`),
  ],
);
