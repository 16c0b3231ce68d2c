import { formatPartValue } from "#lib/circuit/index.ts";
import { csvText, type Cell } from "./csvText.ts";
import { compareDesignators } from "./designator.ts";
import type { PartsListAnswer } from "./partsList.ts";

const head = ["designator", "quantity", "value", "value (SI)", "unit", "tolerance", "type", "stage", "role", "fitted"];

/** The parts list as one table: every part and device by designator, those without one last. */
export function partsListCsv({ parts, devices }: PartsListAnswer): string {
  const rows = [
    ...parts.map((part) => ({
      part,
      figures: [formatPartValue(part.value, part.unit), part.value, part.unit, part.tolerance] as Cell[],
    })),
    ...devices.map((part) => ({ part, figures: ["", "", "", ""] as Cell[] })),
  ];
  rows.sort((a, b) => compareDesignators(a.part.designator, b.part.designator));
  return csvText([
    head,
    ...rows.map(({ part, figures }): Cell[] => [
      ...[part.designator ?? "", part.quantity, ...figures],
      ...[part.type, part.stageName, part.label, part.fitted ? "yes" : "not fitted"],
    ]),
  ]);
}
