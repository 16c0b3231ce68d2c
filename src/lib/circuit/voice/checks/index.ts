import type { FindTopology } from "../chain.ts";
import type { ComputedChain } from "../compute.ts";
import type { SupplyBudget } from "../supply.ts";
import type { Acceptance } from "../document.ts";
import type { JudgedItem } from "./item.ts";
import { levelItems } from "./ofLevels.ts";
import { designatorItems, portItems, unfittedItems } from "./ofLinks.ts";
import { stageItems } from "./ofStages.ts";
import { supplyItems } from "./ofSupply.ts";

export type { Acceptance } from "../document.ts";
export type { CheckItem, JudgedItem } from "./item.ts";
export { leastHeadroom, mostFloor, rackLevel } from "./ofLevels.ts";

const order = { fault: 0, caution: 1, note: 2 };

/** Everything that is not right over a whole voice, the worst first; what was accepted stays in the list. */
export function checkVoice(
  computed: ComputedChain,
  find: FindTopology,
  supply: SupplyBudget,
  accepted: readonly Acceptance[] = [],
): JudgedItem[] {
  const items = [
    ...stageItems(computed),
    ...unfittedItems(computed),
    ...designatorItems(computed, find),
    ...levelItems(computed, find),
    ...supplyItems(computed, supply),
    ...portItems(computed),
  ];
  return items
    .map((item): JudgedItem => {
      const found = accepted.find(({ stage, code }) => stage === item.stage && code === item.code);
      return found ? { ...item, accepted: { reason: found.reason, by: found.by } } : item;
    })
    .sort((a, b) => order[a.severity] - order[b.severity] || Number("accepted" in a) - Number("accepted" in b));
}
