import { z } from "zod";

export const sessionAnswer = z.object({
  id: z.string(),
  createdAt: z.iso.datetime(),
  updatedAt: z.iso.datetime(),
  expiresAt: z.iso.datetime(),
  address: z.string().nullable(),
  browser: z.string().nullable(),
  current: z.boolean().meta({ description: "Whether this very request came with it" }),
});

export type SessionAnswer = z.infer<typeof sessionAnswer>;

export const sessionListAnswer = z.object({ sessions: z.array(sessionAnswer) });
