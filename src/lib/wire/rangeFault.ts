import { formatTyped, type NumberField } from "#lib/circuit/index.ts";

// Apart from quantity.ts, so that the browser checks fields in the same words without loading the schema library.

/** Why a figure cannot be computed with, worded for the person who gave it; undefined where it can. */
export function rangeFault(field: NumberField, value: number, least: number, most: number): string | undefined {
  if (value >= least && value <= most) return undefined;
  if (value <= 0 && least >= 0 && field.scale === "logarithmic") {
    return field.least > 0 ? "This must be more than zero." : "This cannot be negative.";
  }
  const bound = (at: number) => `${formatTyped(at, field.unit)}${field.unit}`;
  return `This must lie between ${bound(least)} and ${bound(most)}.`;
}
