import { acceptedRange, type ConditionField } from "./fields.ts";
import type { AnyTopology } from "./topology.ts";

export type PlainValues = Record<string, number>;
export type PlainConditions = Record<string, number | string | null>;

/** The parts a topology starts with. */
export function defaultParts(topology: AnyTopology): PlainValues {
  return Object.fromEntries(Object.entries(topology.parts).map(([key, field]) => [key, field.default]));
}

/** The conditions of an ideal world, overlaid with those given; a given null switches an optional one off. */
export function completeConditions(topology: AnyTopology, given: PlainConditions = {}): PlainConditions {
  return completeFields(topology.conditions, given);
}

/** The same for conditions that belong to no topology. */
export function completeFields(
  fields: Readonly<Record<string, ConditionField>>,
  given: PlainConditions,
): PlainConditions {
  const complete: PlainConditions = {};
  for (const key in fields) complete[key] = given[key] ?? fields[key]!.default;
  return complete;
}

/** The targets a topology starts with. */
export function defaultTargets(topology: AnyTopology): PlainValues {
  return Object.fromEntries(Object.entries(topology.targets).map(([key, field]) => [key, field.default]));
}

/** Whether a value may be computed with at all. */
export function isAccepted(field: ConditionField, value: number | string | null): boolean {
  if (field.type === "choice") return field.options.some((option) => option.value === value);
  if (value === null) return field.default === null;
  if (typeof value !== "number") return false;
  const [least, most] = acceptedRange(field);
  return value >= least && value <= most;
}
