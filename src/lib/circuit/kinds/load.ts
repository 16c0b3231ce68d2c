import type { AnyTopology } from "../stage/topology.ts";
import type { StageKind } from "../stage/kind.ts";

// The registry for the browser, found by folder: a page is sent the network it works with and none of the others.
const topologies = import.meta.glob<Record<string, unknown>>(["./*/topologies/*.ts", "./*/topologies/*/index.ts"]);
const kinds = import.meta.glob<Record<string, StageKind>>("./*/index.ts");

/** Fetches one topology of the registry. Needs Vite; what runs in Node alone imports the registry itself. */
export async function loadTopology(kind: string, id: string): Promise<AnyTopology> {
  const file =
    topologies[`./${kind}/topologies/${id}/index.ts`] ??
    topologies[`./${kind}/topologies/${id}.ts`] ??
    kinds[`./${kind}/index.ts`];
  const exported: unknown[] = Object.values((await file?.()) ?? {});
  // A kind of one network need not keep it in a file of its own: then the kind itself is what was found.
  const found = exported
    .flatMap((one): readonly unknown[] => (isKind(one) ? one.topologies : [one]))
    .find((one) => isTopology(one, id));
  if (!found) throw new Error(`There is no topology ${id} of ${kind}.`);
  return found as AnyTopology;
}

const isKind = (one: unknown): one is StageKind => typeof one === "object" && one !== null && "topologies" in one;
const isTopology = (one: unknown, id: string): one is AnyTopology =>
  typeof one === "object" && one !== null && "analyse" in one && "id" in one && one.id === id;
