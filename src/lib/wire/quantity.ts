import { z } from "zod";
import { acceptedRange, parseQuantity, type NumberField } from "#lib/circuit/index.ts";
import { rangeFault } from "./rangeFault.ts";

/** A figure as it may be sent: a number in SI base units, or text in engineering or IEC 60062 notation. */
const written = z
  .union([z.number(), z.string().max(40)], { error: "This should be a number, or text such as 4k7 or 100n." })
  .meta({ description: "A number in SI base units, or text such as 4k7, 100n, 1.5" });

/** Checks and reads one figure of a stage; the answer is a number in SI base units within what can be computed. */
export function quantitySchema(field: NumberField): z.ZodType<number, number | string> {
  const [least, most] = acceptedRange(field);
  return written
    .transform((sent, context) => {
      const parsed = typeof sent === "number" ? { ok: true as const, value: sent } : parseQuantity(sent, field.unit);
      const fault = parsed.ok ? rangeFault(field, parsed.value, least, most) : parsed.reason;
      if (fault === undefined && parsed.ok) return parsed.value;
      context.addIssue({ code: "custom", message: fault ?? "", input: sent });
      return z.NEVER;
    })
    .meta({ title: field.label, description: describe(field) });
}

function describe(field: NumberField): string {
  const unit = field.unit === "" ? "a plain ratio" : `in ${field.unit}`;
  return [field.help, `${field.symbol}, ${unit}; usually ${field.least} to ${field.most}.`].filter(Boolean).join(" ");
}
