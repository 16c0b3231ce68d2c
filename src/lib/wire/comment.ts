import { z } from "zod";
import { nextCursor, pageQuery, person } from "./page.ts";
import { someLines } from "./plainText.ts";

const word = z.string().min(1).max(60);

export const longestComment = 4000;

const commentText = someLines(longestComment)
  .refine((text) => text !== "", { error: "Write something first." })
  .meta({ description: "Write @ and a member's name to tell them by e-mail" });

export const commentPlace = z
  .strictObject({ stage: word, part: word.optional(), curve: word.optional() })
  .meta({ description: "What it is about; the whole revision where left out" });

export const newComment = z.strictObject({
  revision: z.int().min(1).meta({ description: "Number of the revision" }),
  at: commentPlace.optional(),
  thread: z.string().max(60).optional().meta({ description: "Id of the remark that this answers" }),
  text: commentText,
});

export const commentChange = z
  .strictObject({ text: commentText.optional(), resolved: z.boolean().optional() })
  .refine(({ text, resolved }) => (text === undefined) !== (resolved === undefined), {
    error: "Send either another text, or whether the thread is resolved.",
  });

export const commentListQuery = z.strictObject({
  ...pageQuery,
  revision: z.coerce.number().int().min(1).optional().meta({ description: "Only those on this revision" }),
  sort: z.enum(["oldest", "newest"]).default("oldest"),
  open: z
    .enum(["true", "false"])
    .optional()
    .meta({ description: "Only first remarks of threads that are not resolved, or that are" }),
});

export const commentAnswer = z.object({
  id: z.string(),
  revision: z.int(),
  thread: z.string().nullable().meta({ description: "The remark it answers; null for the first of a thread" }),
  at: z.object({ stage: word.optional(), part: word.optional(), curve: word.optional() }),
  text: z.string().meta({ description: "Empty where it was deleted" }),
  author: person,
  createdAt: z.iso.datetime(),
  updatedAt: z.iso.datetime(),
  editedAt: z.iso.datetime().nullable(),
  deletedAt: z.iso.datetime().nullable(),
  resolvedAt: z.iso.datetime().nullable(),
  resolvedBy: person.nullable(),
  can: z.object({ change: z.boolean(), resolve: z.boolean() }),
});

export type CommentAnswer = z.infer<typeof commentAnswer>;

export const commentListAnswer = z.object({ comments: z.array(commentAnswer), nextCursor });
