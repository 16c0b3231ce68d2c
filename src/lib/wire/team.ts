import { roles } from "#lib/policy/index.ts";
import { z } from "zod";

export const roleChange = z.strictObject({ role: z.enum(roles) });

export const handOver = z.strictObject({
  userId: z.string().max(60).meta({ description: "Who becomes an owner; you become a designer" }),
});

export const memberAnswer = z.object({
  userId: z.string(),
  name: z.string(),
  email: z.string(),
  role: z.enum(roles),
  since: z.iso.datetime(),
});

export type MemberAnswer = z.infer<typeof memberAnswer>;

export const memberListAnswer = z.object({ members: z.array(memberAnswer) });
