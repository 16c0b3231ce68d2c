import type { AnyTopology } from "#lib/circuit/index.ts";
import { figureText, partText, windowText } from "#lib/wire/figureText.ts";
import type { StageState } from "#lib/wire/stageState.ts";

/** What stands in the fields: text, which may be no figure while it is being typed. */
export interface StageFields {
  targets: Record<string, string>;
  windows: Record<string, string>;
  parts: Record<string, string>;
  conditions: Record<string, string>;
}

export function fieldsOf(topology: AnyTopology, state: StageState): StageFields {
  const map = <F>(fields: Readonly<Record<string, F>>, text: (key: string, field: F) => string) =>
    Object.fromEntries(Object.entries(fields).map(([key, field]) => [key, text(key, field)]));
  return {
    targets: map(topology.targets, (key, { unit }) => figureText(state.targets[key]!, unit)),
    windows: map(topology.targets, (key, { window }) => windowText(state.windows[key] ?? window)),
    parts: map(topology.parts, (key, { unit }) => partText(state.parts[key]!, unit)),
    conditions: map(topology.conditions, (key, field) => {
      const value = state.conditions[key];
      return field.type === "number" && typeof value === "number" ? figureText(value, field.unit) : String(value ?? "");
    }),
  };
}
