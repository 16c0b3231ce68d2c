import type { PlainConditions, PlainValues } from "../stage/defaults.ts";
import type { Port, StageKind } from "../stage/kind.ts";
import type { AnyTopology } from "../stage/topology.ts";

/** One end of a link. */
export interface LinkEnd {
  stage: string;
  port: string;
}

/** An output feeding an input. */
export interface ChainLink {
  id: string;
  from: LinkEnd;
  to: LinkEnd;
}

/** A stage as a voice holds it; values are complete and were checked at the edge. */
export interface ChainStage {
  id: string;
  kind: string;
  topology: string;
  name: string;
  parts: PlainValues;
  conditions: PlainConditions;
  targets: PlainValues;
  windows?: PlainValues | undefined;
  designators: Record<string, string>;
  /** Keeps its own conditions, whatever it is linked to: its ideal self. */
  apart?: boolean | undefined;
}

/** A voice: stages, what feeds what, and what holds for all of them. */
export interface Chain {
  stages: readonly ChainStage[];
  links: readonly ChainLink[];
  conditions: PlainConditions;
}

export interface FoundTopology {
  kind: Pick<StageKind, "id" | "name" | "ports" | "telling" | "place">;
  topology: AnyTopology;
}

/** How the chain finds what its stages are; the registry is given, never reached for. */
export type FindTopology = (kind: string, topology: string) => FoundTopology | undefined;

export function findIn(kinds: readonly StageKind[]): FindTopology {
  return (kindId, topologyId) => {
    const kind = kinds.find(({ id }) => id === kindId);
    const topology = kind?.topologies.find(({ id }) => id === topologyId);
    return kind && topology && { kind, topology };
  };
}

/** The ports that a stage of this topology has. */
export function portsOf({ kind, topology }: FoundTopology): readonly Port[] {
  return topology.joints ? kind.ports.filter(({ id }) => id in topology.joints!) : kind.ports;
}
