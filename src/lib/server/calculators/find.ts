import type { AnyTopology, StageKind } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { Refusal } from "../errors.ts";

const known = (things: readonly { id: string }[]) => things.map(({ id }) => id).join(", ");

/** The kind of an address, or a refusal that lists those there are. */
export function findKind(slug: string | undefined): StageKind {
  const kind = stageKinds.find(({ id }) => id === slug);
  if (!kind) throw new Refusal("not-found", `There is no stage kind of this name. Known: ${known(stageKinds)}.`);
  return kind;
}

/** The topology of an address, or a refusal that lists those of its kind. */
export function findTopology(kindSlug: string | undefined, slug: string | undefined): AnyTopology {
  const kind = findKind(kindSlug);
  const topology = kind.topologies.find(({ id }) => id === slug);
  if (!topology)
    throw new Refusal("not-found", `${kind.name} has no topology of this name. Known: ${known(kind.topologies)}.`);
  return topology;
}
