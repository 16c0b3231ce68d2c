import { z } from "zod";

/** RFC 9457, with the places of the faults where the input was wrong. */
export const problemAnswer = z.object({
  type: z.string().meta({ description: "Names the sort of problem" }),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  errors: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
});

export type ProblemAnswer = z.infer<typeof problemAnswer>;
