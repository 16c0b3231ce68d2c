import type { PartClass } from "../stage/fields.ts";
import type { StageKind } from "../stage/kind.ts";
import { topologyOf, type VoiceDocument } from "../voice/document.ts";

/** How many of one value a board takes, before and now. */
export interface QuantityChange {
  partClass: PartClass;
  value: number;
  unit: "Ω" | "F";
  from: number;
  to: number;
  /** Now fitted once on the whole board and not before: it costs a reel. */
  newUnique: boolean;
}

const classes: readonly PartClass[] = ["resistor", "capacitor", "pot"];

type Counts = Map<string, { partClass: PartClass; value: number; count: number }>;

function count(document: VoiceDocument, kinds: readonly StageKind[]): Counts {
  const counts: Counts = new Map();
  for (const stage of document.stages) {
    for (const [part, { partClass }] of Object.entries(topologyOf(kinds, stage)?.parts ?? {})) {
      const value = stage.parts[part];
      if (value === undefined || value === 0) continue;
      const key = `${partClass} ${value.toPrecision(9)}`;
      const known = counts.get(key) ?? { partClass, value, count: 0 };
      counts.set(key, { ...known, count: known.count + 1 });
    }
  }
  return counts;
}

/** Lines of the parts list whose quantity differs, by class and then by value. */
export function changedQuantities(
  from: VoiceDocument,
  to: VoiceDocument,
  kinds: readonly StageKind[],
): QuantityChange[] {
  const [before, now] = [count(from, kinds), count(to, kinds)];
  return [...new Set([...before.keys(), ...now.keys()])]
    .flatMap((key): QuantityChange[] => {
      const { partClass, value } = (now.get(key) ?? before.get(key))!;
      const quantities = { from: before.get(key)?.count ?? 0, to: now.get(key)?.count ?? 0 };
      if (quantities.from === quantities.to) return [];
      const newUnique = quantities.from === 0 && quantities.to === 1;
      return [{ partClass, value, unit: partClass === "capacitor" ? "F" : "Ω", ...quantities, newUnique }];
    })
    .sort((a, b) => classes.indexOf(a.partClass) - classes.indexOf(b.partClass) || a.value - b.value);
}
