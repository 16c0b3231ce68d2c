import { use } from "react";
import type { AnyTopology } from "#lib/circuit/index.ts";
import { loadTopology } from "#lib/circuit/kinds/load.ts";

const asked = new Map<string, Promise<AnyTopology>>();

/**
 * The topology of a page, waited for where it is first used. No Suspense boundary belongs around it: without one the
 * page stays as the server drew it until the topology has arrived, and comes alive in one go.
 */
export function useTopology(kind: string, id: string): AnyTopology {
  const name = `${kind}/${id}`;
  const topology = asked.get(name) ?? loadOrStay(kind, id);
  asked.set(name, topology);
  return use(topology);
}

/** Where it never arrives the drawn page stays too: figures that cannot be changed are better than none. */
function loadOrStay(kind: string, id: string): Promise<AnyTopology> {
  return loadTopology(kind, id).catch((error: unknown) => {
    if (import.meta.env.SSR) throw error;
    console.error(error);
    return new Promise<never>(() => undefined);
  });
}
