import type { PlainConditions } from "../stage/defaults.ts";
import type { PartClass } from "../stage/fields.ts";
import type { AnyTopology } from "../stage/topology.ts";

/** What sort of part a role asks for, as far as the stage says: the dielectric of its capacitors, the law of its pot. */
export function typeOf(partClass: PartClass, topology: AnyTopology, conditions: PlainConditions): string {
  switch (partClass) {
    case "resistor":
      return "film resistor";
    case "capacitor":
      return `${chosen("dielectric", topology, conditions) ?? "film or class 1 ceramic"} capacitor`;
    case "pot":
      return `${chosen("potLaw", topology, conditions)?.replace(/,.*/, "") ?? "linear"} pot`;
  }
}

function chosen(key: string, { conditions: fields }: AnyTopology, conditions: PlainConditions): string | undefined {
  const field = fields[key];
  if (field?.type !== "choice") return undefined;
  const value = conditions[key] ?? field.default;
  return field.options.find((option) => option.value === value)?.label;
}
