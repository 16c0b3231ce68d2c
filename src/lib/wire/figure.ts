import { z } from "zod";
import { parseQuantity, type Unit } from "#lib/circuit/index.ts";

/** A figure of a known unit, sent as a number or as people write it. Only its form is checked. */
export function figureSchema(unit: Unit): z.ZodType<number, number | string> {
  return z
    .union([z.number(), z.string().max(40)], { error: "This should be a number, or text such as 4k7 or 100n." })
    .transform((sent, context) => {
      const parsed = typeof sent === "number" ? { ok: true as const, value: sent } : parseQuantity(sent, unit);
      if (parsed.ok) return parsed.value;
      context.addIssue({ code: "custom", message: parsed.reason, input: sent });
      return z.NEVER;
    })
    .meta({ description: unit === "" ? "A plain ratio" : `In ${unit}, or text such as 4k7` });
}
