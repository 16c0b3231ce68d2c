import { formatQuantity, type Unit } from "#lib/circuit/index.ts";

// Apart from spread.ts, so that the browser checks the fields in the same words without loading the schema library.

/** Why a window holds nothing; undefined where it holds something. A side left out is open. */
export function windowFault(least: number | undefined, most: number | undefined, unit: Unit): string | undefined {
  if (least === undefined && most === undefined) return "Give the least, the most, or both.";
  if (least === undefined || most === undefined || least < most) return undefined;
  return `The least, ${formatQuantity(least, unit)}, must lie below the most, ${formatQuantity(most, unit)}. Exchange them.`;
}

export function toleranceFault(tolerance: number): string | undefined {
  if (!(tolerance > 0)) return "A tolerance must be more than zero. Leave the part out to take it as exact.";
  return tolerance < 1 ? undefined : "A tolerance must be below 1, which is 100 %.";
}
