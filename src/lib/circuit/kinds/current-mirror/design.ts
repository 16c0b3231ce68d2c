import { formatQuantity } from "../../quantity/format.ts";
import type { DesignRefusal } from "../../stage/topology.ts";

/** Relative; the ratio of a mirror without parts either is the one asked for or is not. */
const sameRatio = 1e-9;

/** A mirror without parts of its own has the ratio its transistors give. */
export function refuseFixedRatio(wanted: number, got: number | undefined): Record<string, never> | DesignRefusal {
  if (got !== undefined && Math.abs(wanted / got - 1) <= sameRatio) return {};
  const has = got === undefined ? "its output saturates" : `its ratio is ${formatQuantity(got, "")}`;
  return {
    refused: true,
    field: "ratio",
    message: `This mirror has no parts to choose: under these conditions ${has}. Take the degenerated mirror to set a ratio by two resistors.`,
  };
}
