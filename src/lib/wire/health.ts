import { z } from "zod";

export const healthAnswer = z.object({ status: z.literal("ok"), version: z.string(), database: z.literal("ok") });
