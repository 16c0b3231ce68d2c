import type { PlainConditions, PlainValues } from "../stage/defaults.ts";
import type { StageKind } from "../stage/kind.ts";
import type { AnyTopology } from "../stage/topology.ts";

/** One stage of a saved voice. */
export interface DocumentStage {
  id: string;
  kind: string;
  topology: string;
  name: string;
  parts: PlainValues;
  conditions: PlainConditions;
  targets: PlainValues;
  windows?: PlainValues | undefined;
  /** Of parts and devices, by key. */
  designators: Record<string, string>;
  /** Keeps its own conditions, whatever it is linked to: its ideal self. */
  apart?: boolean | undefined;
  /** Keys of parts and devices that stay on the drawing and off the board. */
  notFitted?: readonly string[] | undefined;
}

export interface DocumentLink {
  id: string;
  from: { stage: string; port: string };
  to: { stage: string; port: string };
}

/** Something the checks say of a voice that was looked at and is meant to stay. */
export interface Acceptance {
  /** Id of the stage; empty where it is about the whole voice. */
  stage: string;
  code: string;
  reason: string;
  /** Who says so. */
  by: string;
}

/** A voice as it is saved: what working copies and revisions hold. */
export interface VoiceDocument {
  stages: readonly DocumentStage[];
  links: readonly DocumentLink[];
  conditions: Record<string, number | string>;
  accepted?: readonly Acceptance[] | undefined;
}

/** The network of a saved stage; undefined where this version of the library has none of that name. */
export function topologyOf(
  kinds: readonly StageKind[],
  stage: { kind: string; topology: string },
): AnyTopology | undefined {
  return kinds.find(({ id }) => id === stage.kind)?.topologies.find(({ id }) => id === stage.topology);
}
