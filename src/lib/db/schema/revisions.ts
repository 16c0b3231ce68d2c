import { revisionStatuses, type RevisionStatus } from "#lib/policy/index.ts";
import { sql } from "drizzle-orm";
import { check, index, integer, jsonb, pgTable, text, uniqueIndex } from "drizzle-orm/pg-core";
import { createdAt, idColumn, jsonMember, moment, oneOf, trimmedText, updatedAt } from "../columns.ts";
import { users } from "./auth.ts";
import { voices } from "./voices.ts";

/**
 * A state of a voice that somebody stood up for. All but what the review writes is frozen: triggers refuse every change of
 * it, and removal except together with the whole voice.
 */
export const revisions = pgTable(
  "revisions",
  {
    id: idColumn(),
    voiceId: text("voice_id")
      .notNull()
      .references(() => voices.id, { onDelete: "cascade" }),
    /** Counts from 1 in each voice. */
    number: integer("number").notNull(),
    reason: text("reason").notNull(),
    inputs: jsonb("inputs").$type<unknown>().notNull(),
    /** Results, states and warnings as the library of `libraryVersion` gave them. */
    analysis: jsonb("analysis").$type<unknown>().notNull(),
    acceptedWarnings: jsonb("accepted_warnings").$type<unknown>().notNull(),
    libraryVersion: text("library_version").notNull(),
    authorId: text("author_id").references(() => users.id, { onDelete: "set null" }),
    /** Kept as it stood, for when the account is gone. */
    authorName: text("author_name").notNull(),
    createdAt: createdAt(),

    status: text("status").$type<RevisionStatus>().notNull().default("in preparation"),
    updatedAt: updatedAt(),
    askedAt: moment("asked_at"),
    askedById: text("asked_by_id").references(() => users.id, { onDelete: "set null" }),
    /** Null where any reviewer may decide. */
    reviewerId: text("reviewer_id").references(() => users.id, { onDelete: "set null" }),
    decidedAt: moment("decided_at"),
    decidedById: text("decided_by_id").references(() => users.id, { onDelete: "set null" }),
    decidedByName: text("decided_by_name"),
    decision: text("decision").$type<"release" | "return">(),
    decisionNote: text("decision_note"),
  },
  (table) => [
    uniqueIndex("revisions_voice_number_key").on(table.voiceId, table.number),
    index("revisions_voice_status_index").on(table.voiceId, table.status, table.number),
    index("revisions_reviewer_index").on(table.reviewerId, table.status),
    index("revisions_author_index").on(table.authorId),
    index("revisions_asked_by_index").on(table.askedById),
    index("revisions_decided_by_index").on(table.decidedById),
    // A review that waits is looked for in the whole team.
    index("revisions_under_review_index")
      .on(table.voiceId)
      .where(sql`${table.status} = 'under review'`),
    // Two released revisions of one voice would leave open which one is built.
    uniqueIndex("revisions_one_released_key")
      .on(table.voiceId)
      .where(sql`${table.status} = 'released'`),
    check("revisions_number_positive", sql`${table.number} >= 1`),
    trimmedText("revisions_reason_length", table.reason, 200),
    oneOf("revisions_status_word", table.status, revisionStatuses),
    check("revisions_inputs_object", sql`jsonb_typeof(${table.inputs}) = 'object'`),
    check(
      "revisions_analysis_members",
      sql`${jsonMember(table.analysis, "results", "object")} and ${jsonMember(table.analysis, "warnings", "array")}`,
    ),
    check("revisions_accepted_list", sql`jsonb_typeof(${table.acceptedWarnings}) = 'array'`),
    check("revisions_decision_word", sql`${table.decision} in ('release', 'return')`),
    check(
      "revisions_decision_whole",
      sql`(${table.decidedAt} is null) = (${table.decision} is null) and (${table.decision} is null) = (${table.decidedByName} is null)`,
    ),
    check(
      "revisions_released_decided",
      sql`(${table.status} <> 'released' or ${table.decision} = 'release') and (${table.status} <> 'returned' or ${table.decision} = 'return')`,
    ),
    check("revisions_review_asked", sql`${table.status} <> 'under review' or ${table.askedAt} is not null`),
    // Also here, since a slip in the code would undo what a review is for.
    check("revisions_never_own", sql`${table.decidedById} is null or ${table.decidedById} <> ${table.authorId}`),
    check("revisions_note_length", sql`char_length(${table.decisionNote}) <= 2000`),
  ],
);
