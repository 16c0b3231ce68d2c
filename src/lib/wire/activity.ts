import { z } from "zod";
import { asFormat, nextCursor, pageQuery, person } from "./page.ts";

export const activityQuery = z.strictObject({
  ...pageQuery,
  sort: z.enum(["newest", "oldest"]).default("newest"),
  voice: z.string().max(60).optional().meta({ description: "Only what was done to this voice" }),
  person: z.string().max(60).optional().meta({ description: "Only what this person did" }),
  action: z.string().max(60).optional().meta({ description: "Only deeds of this name, such as revision.make" }),
  format: asFormat,
});

export const activityAnswer = z.object({
  events: z.array(
    z.object({
      id: z.string(),
      at: z.iso.datetime(),
      actor: person.nullable().meta({ description: "Null for a guest, or an account that is gone" }),
      action: z.string(),
      subject: z.object({
        id: z.string(),
        name: z.string().nullable().meta({ description: "Of a voice that is there" }),
      }),
      detail: z.record(z.string(), z.unknown()),
    }),
  ),
  nextCursor,
});

export type ActivityAnswer = z.infer<typeof activityAnswer>;
