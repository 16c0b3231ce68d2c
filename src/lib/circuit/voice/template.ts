import { defaultParts } from "../stage/defaults.ts";
import type { PlainConditions } from "../stage/defaults.ts";
import type { StageKind } from "../stage/kind.ts";
import type { ChainLink } from "./chain.ts";
import { nextDesignator } from "./designators.ts";

export interface TemplateStage {
  /** Unique in the template; becomes the stage's id. */
  id: string;
  /** What the stage does in this voice. */
  name: string;
  kind: string;
  topology: string;
  targets: Record<string, number>;
  /** Values that differ from the topology's own defaults. */
  parts: Record<string, number>;
  /** Those that differ from an ideal world and that no link decides. */
  conditions?: PlainConditions;
}

export interface VoiceTemplate {
  id: string;
  name: string;
  summary: string;
  stages: readonly TemplateStage[];
  links: readonly ChainLink[];
}

/** Links from "stage.port" to "stage.port", numbered. */
export function linked(...pairs: readonly (readonly [from: string, to: string])[]): ChainLink[] {
  const end = (place: string) => {
    const at = place.indexOf(".");
    return { stage: place.slice(0, at), port: place.slice(at + 1) };
  };
  return pairs.map(([from, to], index) => ({ id: `link-${index + 1}`, from: end(from), to: end(to) }));
}

export interface BegunStage extends TemplateStage {
  conditions: PlainConditions;
  designators: Record<string, string>;
}

/** The stages a voice begins with: all parts filled in, and each part that is fitted has a designator of its own. */
export function beginStages(template: VoiceTemplate, kinds: readonly StageKind[]): BegunStage[] {
  const taken = new Set<string>();
  return template.stages.map((stage) => {
    const topology = kinds.find(({ id }) => id === stage.kind)?.topologies.find(({ id }) => id === stage.topology);
    if (!topology) throw new Error(`template ${template.id}: there is no ${stage.kind}/${stage.topology}`);
    const parts = { ...defaultParts(topology), ...stage.parts };
    const designators: Record<string, string> = {};
    for (const [part, field] of Object.entries(topology.parts)) {
      if ((parts[part] ?? 0) > 0) designators[part] = nextDesignator(field.partClass, taken);
    }
    return { ...stage, parts, conditions: { ...stage.conditions }, designators };
  });
}
