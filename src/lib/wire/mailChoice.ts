import { z } from "zod";

export const mailChoice = z.strictObject({
  mentions: z.boolean().meta({ description: "Whether a mail comes when somebody mentions you" }),
});
