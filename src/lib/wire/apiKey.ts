import { z } from "zod";
import { oneLine } from "./plainText.ts";

export const newApiKey = z.strictObject({
  name: oneLine(80, "Name the key after what will use it.").meta({ description: "What will use it" }),
});

export const apiKeyAnswer = z.object({
  id: z.string(),
  name: z.string(),
  start: z.string().meta({ description: "Its first characters, to tell keys apart" }),
  team: z.object({ id: z.string(), name: z.string() }).meta({ description: "Where it acts" }),
  createdAt: z.iso.datetime(),
  updatedAt: z.iso.datetime(),
  lastUsedAt: z.iso.datetime().nullable().meta({ description: "To the minute" }),
});

export type ApiKeyAnswer = z.infer<typeof apiKeyAnswer>;

export const newApiKeyAnswer = apiKeyAnswer.extend({
  key: z.string().meta({ description: "Shown this once; send it as Authorization: Bearer" }),
});

export const apiKeyListAnswer = z.object({ keys: z.array(apiKeyAnswer) });
