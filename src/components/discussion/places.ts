import { topologyOf } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import type { PlaceChoice } from "./Discussion.tsx";

interface PlacedStage {
  id: string;
  name: string;
  kind: string;
  topology: string;
  parts: Record<string, number>;
  designators: Record<string, string>;
}

/** All that can be talked about in a revision: each stage, then its fitted parts and its curves. */
export function placesIn(stages: readonly PlacedStage[]): PlaceChoice[] {
  return stages.flatMap((stage): PlaceChoice[] => {
    const { id, name } = stage;
    const topology = topologyOf(stageKinds, stage);
    const parts = Object.entries(topology?.parts ?? {}).filter(([part]) => (stage.parts[part] ?? 0) > 0);
    return [
      { key: id, label: name, at: { stage: id } },
      ...parts.map(([part, { label }]) => ({
        key: `${id} part ${part}`,
        label: `${name}: ${stage.designators[part] ?? ""} ${label}`.replace(":  ", ": "),
        at: { stage: id, part },
      })),
      ...(topology?.curves ?? []).map(({ id: curve, name: words }) => ({
        key: `${id} curve ${curve}`,
        label: `${name}: curve ${words.toLocaleLowerCase("en")}`,
        at: { stage: id, curve },
      })),
    ];
  });
}
