import { z } from "zod";

/** How every list is asked for: so many entries, from where the page before ended. */
export const pageQuery = {
  limit: z.coerce.number().int().min(1).max(200).default(50).meta({ description: "Entries on a page" }),
  cursor: z.string().max(500).optional().meta({ description: "nextCursor of the page before" }),
};

/** For a link, which cannot carry an Accept header. */
export const asFormat = z.enum(["json", "csv"]).optional().meta({ description: "As Accept would say" });

export const nextCursor = z.string().nullable().meta({ description: "Null on the last page" });

export const person = z.object({
  id: z.string().nullable().meta({ description: "Null once that account is gone" }),
  name: z.string(),
});

export type Person = z.infer<typeof person>;
