import type { AnyTopology } from "./topology.ts";

/** What a port carries. A link joins an output to an input of the same sort. */
export type PortSort = "trigger" | "audio" | "control" | "bias";

export interface Port {
  id: string;
  label: string;
  sort: PortSort;
  direction: "in" | "out";
  /** A jack of the panel: linked to the rest of the rack. */
  jack?: true;
  /** May stay without a link though it is no jack: one of several ways to use the stage. */
  mayStayOpen?: true;
}

/** A figure printed elsewhere, or computed by a script of `tests/reference`, that the stage must reproduce. */
export interface ReferenceCase {
  id: string;
  topology: string;
  /** `analyse` these parts, or `design` these targets. */
  given: {
    parts?: Record<string, number>;
    targets?: Record<string, number>;
    conditions?: Record<string, number | string>;
  };
  expect: Record<string, number>;
  /** Relative; covers the rounding of the printed figure. */
  tolerance: number;
  source: { title: string; place: string; howKnown: "read" | "from memory" | "computed" };
  note?: string;
}

export interface StageKind {
  /** Slug, folder name and registry entry. */
  id: string;
  name: string;
  /** What it is for, one sentence. */
  summary: string;
  /** Where it sits in a voice. */
  place: "trigger and control" | "audio" | "whole module";
  ports: readonly Port[];
  topologies: readonly AnyTopology[];
  /** Results to show where there is room for two. */
  telling: readonly [string, string];
  reference: readonly ReferenceCase[];
  /** Version of the stored shape of this kind's stages. */
  version: number;
}

/** Declares a stage kind. */
export function defineStageKind(kind: StageKind): StageKind {
  const ids = new Set(kind.topologies.map((t) => t.id));
  if (ids.size !== kind.topologies.length || ids.size === 0)
    throw new Error(`${kind.id}: topologies need distinct ids`);
  for (const topology of kind.topologies) {
    for (const result of kind.telling)
      if (!(result in topology.results)) throw new Error(`${kind.id}/${topology.id}: no result ${result}`);
    for (const port of Object.keys(topology.joints ?? {}))
      if (!kind.ports.some(({ id }) => id === port)) throw new Error(`${kind.id}/${topology.id}: no port ${port}`);
  }
  return kind;
}
