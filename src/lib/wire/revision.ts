import { revisionStatuses } from "#lib/policy/index.ts";
import { z } from "zod";
import { warningAnswer } from "./calculator.ts";
import { asFormat, nextCursor, pageQuery, person } from "./page.ts";
import { oneLine, someLines } from "./plainText.ts";
import { linkSchema } from "./workingCopy.ts";

const word = z.string().min(1).max(60);

export const longestReason = 200;

export const revisionReason = oneLine(longestReason, "Say in one line why this revision is made.").meta({
  description: "Why this revision is made, in one line",
});

const acceptedWarning = z.strictObject({ stage: word, code: word });

export const newRevision = z.strictObject({
  reason: revisionReason,
  acceptedWarnings: z
    .array(acceptedWarning)
    .max(1000)
    .default([])
    .meta({ description: "Warnings that were looked at and are meant to stay" }),
});

export const reviewRequest = z.strictObject({
  reviewer: z.string().max(60).nullable().optional().meta({ description: "Who is asked; any reviewer where left out" }),
});

export const longestNote = 2000;

export const reviewDecision = z
  .strictObject({
    decision: z.enum(["release", "return"]),
    note: someLines(longestNote).default("").meta({ description: "What the author should know; needed to return" }),
  })
  .refine(({ decision, note }) => decision === "release" || note !== "", {
    path: ["note"],
    error: "Say what has to change before it can be released.",
  });

export const revisionStatus = z.enum(revisionStatuses);

export const revisionListQuery = z.strictObject({
  ...pageQuery,
  sort: z.enum(["newest", "oldest"]).default("newest").meta({ description: "By number" }),
  status: revisionStatus.optional().meta({ description: "Only those of this status" }),
  format: asFormat,
});

const resultValue = z.union([z.number(), z.array(z.number())]);

/** What revisions keep is answered as it was kept; the schema of a stage may have moved on since. */
const keptStage = z.object({
  id: z.string(),
  kind: z.string(),
  topology: z.string(),
  name: z.string(),
  parts: z.record(z.string(), z.number()),
  conditions: z.record(z.string(), z.union([z.number(), z.string(), z.null()])),
  targets: z.record(z.string(), z.number()),
  windows: z.record(z.string(), z.number()).optional(),
  designators: z.record(z.string(), z.string()),
  apart: z.boolean().optional(),
  notFitted: z.array(z.string()).optional(),
});

export const keptInputs = z.object({
  format: z.literal(1),
  stages: z.array(keptStage),
  links: z.array(linkSchema),
  conditions: z.record(z.string(), z.union([z.number(), z.string()])),
  accepted: z.array(z.object({ stage: z.string(), code: z.string(), reason: z.string(), by: z.string() })).optional(),
});

export const stageWarningAnswer = warningAnswer.extend({ stage: z.string().meta({ description: "Id of the stage" }) });

const review = z.object({
  askedAt: z.iso.datetime().nullable(),
  askedBy: person.nullable(),
  reviewer: person.nullable().meta({ description: "Null where any reviewer may decide" }),
  decision: z.enum(["release", "return"]).nullable(),
  decidedAt: z.iso.datetime().nullable(),
  decidedBy: person.nullable(),
  note: z.string().nullable(),
});

export const revisionSummary = z.object({
  id: z.string(),
  number: z.int().min(1),
  reason: z.string(),
  status: revisionStatus,
  createdAt: z.iso.datetime(),
  updatedAt: z.iso.datetime(),
  createdBy: person,
  libraryVersion: z.string().meta({ description: "Version of the calculation library that gave the figures" }),
  stageCount: z.int().min(0),
  warningCount: z.int().min(0),
  review,
  can: z
    .object({
      read: z.boolean(),
      restore: z.boolean(),
      askForReview: z.boolean(),
      review: z.boolean(),
      share: z.boolean(),
    })
    .meta({ description: "What the person who asks may do to it now" }),
});

export type RevisionSummary = z.infer<typeof revisionSummary>;

export const revisionAnswer = revisionSummary.extend({
  inputs: keptInputs,
  results: z
    .record(z.string(), z.record(z.string(), resultValue))
    .meta({ description: "By id of the stage and name, in SI base units" }),
  states: z
    .record(z.string(), z.record(z.string(), z.enum(["within", "close", "outside"])))
    .meta({ description: "How each target is met" }),
  warnings: z.array(stageWarningAnswer.extend({ accepted: z.boolean() })),
});

export type RevisionAnswer = z.infer<typeof revisionAnswer>;

export const revisionListAnswer = z.object({ revisions: z.array(revisionSummary), nextCursor });

const warningChanges = z.object({ gone: z.array(stageWarningAnswer), new: z.array(stageWarningAnswer) });

export const recomputeAnswer = z.object({
  keptWith: z.string().meta({ description: "Library version of the kept figures" }),
  computedWith: z.string().meta({ description: "Library version of this server" }),
  differences: z.array(
    z.object({
      stage: z.string(),
      name: z.string(),
      label: z.string(),
      unit: z.string(),
      from: resultValue.optional(),
      to: resultValue.optional(),
      reason: z.string().optional().meta({ description: "Why, where the newer version declares it" }),
    }),
  ),
  warnings: warningChanges,
});
