import { voiceTemplates, type VoiceTemplateId } from "#lib/circuit/kinds/templates.ts";
import { z } from "zod";

/** What the title block carries; longer names would not fit a drawing. */
export const voiceName = z
  .string()
  .trim()
  .min(1, "Type a name for the voice.")
  .max(120, "Use at most 120 characters.")
  .refine((text) => !/\p{Cc}/u.test(text), { error: "Leave out line breaks and other control characters." })
  .meta({ description: "Name of the voice, 1 to 120 characters" });

export const voiceTemplate = z
  .enum(voiceTemplates.map(({ id }) => id) as [VoiceTemplateId, ...VoiceTemplateId[]])
  .meta({ description: "What the voice begins with" });

export const newVoice = z.strictObject({ name: voiceName, template: voiceTemplate.default("empty") });

export const voiceChange = z.strictObject({ name: voiceName });

export const voiceAnswer = z.object({
  id: z.string(),
  name: z.string(),
  createdAt: z.iso.datetime(),
  updatedAt: z.iso.datetime(),
  createdBy: z
    .object({ id: z.string(), name: z.string() })
    .nullable()
    .meta({ description: "Null once that account is gone" }),
  stageCount: z.int().min(0),
  can: z
    .object({ rename: z.boolean(), remove: z.boolean(), readWorkingCopy: z.boolean(), editWorkingCopy: z.boolean() })
    .meta({ description: "What the person who asks may do to it" }),
});

export type VoiceAnswer = z.infer<typeof voiceAnswer>;

export const voiceListQuery = z.strictObject({
  limit: z.coerce.number().int().min(1).max(200).default(50).meta({ description: "Entries on a page" }),
  cursor: z.string().max(500).optional().meta({ description: "nextCursor of the page before" }),
  sort: z.enum(["updated", "created", "name"]).default("updated").meta({ description: "Newest first, or by name" }),
  name: z.string().trim().max(120).optional().meta({ description: "Only voices whose name contains this" }),
});

export const voiceListAnswer = z.object({
  voices: z.array(voiceAnswer),
  nextCursor: z.string().nullable().meta({ description: "Null on the last page" }),
});

export type VoiceListAnswer = z.infer<typeof voiceListAnswer>;
