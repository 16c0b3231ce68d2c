import type { RailBudget, SupplyBudget } from "../voice/supply.ts";

/** Typical current of one rail in A, old and new, and the window that the older side gave the bench. */
export interface RailChange {
  from: number;
  to: number;
  windowLow: number;
  windowHigh: number;
}

export interface SupplyChange {
  positive: RailChange;
  negative: RailChange;
}

const railChange = (from: RailBudget, to: RailBudget): RailChange => ({
  ...{ from: from.typical, to: to.typical },
  ...{ windowLow: from.windowLow, windowHigh: from.windowHigh },
});

export function changedSupply(from: SupplyBudget | undefined, to: SupplyBudget | undefined): { supply?: SupplyChange } {
  if (!from || !to) return {};
  const { positive, negative } = to;
  return { supply: { positive: railChange(from.positive, positive), negative: railChange(from.negative, negative) } };
}
