import { z } from "zod";
import { nextCursor, pageQuery, person } from "./page.ts";
import { keptInputs, revisionStatus, stageWarningAnswer } from "./revision.ts";

export const newShareLink = z.strictObject({
  revision: z.int().min(1).meta({ description: "Number of a released revision" }),
  expiresAt: z.iso
    .datetime({ offset: true, error: "Give a moment such as 2030-01-31T12:00:00Z." })
    .optional()
    .meta({ description: "It opens until it is revoked where left out" }),
});

export const shareLinkListQuery = z.strictObject(pageQuery);

export const shareLinkAnswer = z.object({
  id: z.string(),
  revision: z.int(),
  createdAt: z.iso.datetime(),
  updatedAt: z.iso.datetime(),
  createdBy: person.nullable(),
  expiresAt: z.iso.datetime().nullable(),
  openings: z.int().meta({ description: "How often it has been opened" }),
  lastOpenedAt: z.iso.datetime().nullable(),
});

export type ShareLinkAnswer = z.infer<typeof shareLinkAnswer>;

export const newShareLinkAnswer = shareLinkAnswer.extend({
  url: z.string().meta({ description: "Shown this once" }),
});

export const shareLinkListAnswer = z.object({ shareLinks: z.array(shareLinkAnswer), nextCursor });

const resultValue = z.union([z.number(), z.array(z.number())]);

/** What a guest is given: the revision and the names of its title block, nothing of the team behind it. */
export const sharedRevision = z.object({
  voice: z.string(),
  revision: z.int(),
  status: revisionStatus,
  reason: z.string(),
  preparedBy: z.string(),
  checkedBy: z.string().nullable(),
  createdAt: z.iso.datetime(),
  decidedAt: z.iso.datetime().nullable(),
  libraryVersion: z.string(),
  inputs: keptInputs,
  results: z.record(z.string(), z.record(z.string(), resultValue)),
  states: z.record(z.string(), z.record(z.string(), z.enum(["within", "close", "outside"]))),
  warnings: z.array(stageWarningAnswer.extend({ accepted: z.boolean() })),
});

export type SharedRevision = z.infer<typeof sharedRevision>;
