import type { Port, StageKind } from "../stage/kind.ts";
import type { AnyTopology } from "../stage/topology.ts";
import type { DocumentLink, DocumentStage, VoiceDocument } from "./document.ts";

/** One end of a link. */
export type LinkEnd = DocumentLink["from"];
/** An output feeding an input. */
export type ChainLink = DocumentLink;
/** Values are complete and were checked at the edge. */
export type ChainStage = DocumentStage;
/** A voice: stages, what feeds what, and what holds for all of them. */
export type Chain = VoiceDocument;

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
