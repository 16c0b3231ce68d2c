import { formatQuantity } from "../../quantity/format.ts";
import type { ComputedChain } from "../compute.ts";
import { supplyConditions, type SupplyBudget } from "../supply.ts";
import type { CheckItem } from "./item.ts";

/** V that the series element may take at most. */
export const mostDrop = 0.6;
/** V that a rail shared with a noise source may sag. */
export const mostDroop = 0.1;

/** What the trade warns of where a voice meets its power header. */
export function supplyItems(computed: ComputedChain, budget: SupplyBudget): CheckItem[] {
  if (computed.stages.size === 0) return [];
  const conditions = supplyConditions(computed.chain.conditions);
  const { currentAllowance, seriesElement, header } = conditions;
  const items: CheckItem[] = [];
  const say = (code: string, severity: CheckItem["severity"], message: string, figures: Partial<CheckItem> = {}) =>
    items.push({ severity, stage: "", code, message, ...figures });
  for (const [side, rail] of [
    ["positive", budget.positive],
    ["negative", budget.negative],
  ] as const) {
    if (rail.drop > mostDrop) {
      const message = `The series element of the ${side} rail takes ${formatQuantity(rail.drop, "V")}, over ${formatQuantity(mostDrop, "V")}. Take a smaller resistor.`;
      say(`${side}-drop`, "caution", message, { value: rail.drop, limit: mostDrop, unit: "V" });
    }
    if (currentAllowance !== null && rail.most > currentAllowance) {
      const message = `The ${side} rail may draw ${formatQuantity(rail.most, "A")}, over the ${formatQuantity(currentAllowance, "A")} that the brief leaves it.`;
      say(`${side}-allowance`, rail.typical > currentAllowance ? "fault" : "caution", message, {
        ...{ value: rail.most, limit: currentAllowance, unit: "A" },
      });
    }
  }
  const { actual } = budget.droop;
  if (actual > mostDroop) {
    const noisy = [...computed.stages.values()].some(({ gives }) =>
      Object.values(gives).some((signal) => signal?.sort === "audio" && signal.bandwidth !== undefined),
    );
    const message = `The positive rail sags by ${formatQuantity(actual, "V")} when a hit charges the envelopes${noisy ? ", and a noise source hangs on it" : ""}; ${formatQuantity(mostDroop, "V")} is not heard. Give the noise board a filter of its own, or raise the bulk capacitor.`;
    say("droop", noisy ? "caution" : "note", message, { value: actual, limit: mostDroop, unit: "V" });
  }
  if (!seriesElement.startsWith("schottky")) {
    const message =
      "Nothing protects the board from a reversed supply. A series diode in each rail does, for some 0.35 V.";
    say("no-reverse-protection", "caution", message);
  }
  if (header === "open") {
    const message =
      "The power header is open pins: a ribbon turned round destroys parts. Take a keyed shroud, and print which side is −12 V.";
    say("header-open", "caution", message);
  }
  return items;
}
