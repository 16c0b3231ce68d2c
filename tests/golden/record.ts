/**
 * Saves a golden revision for every topology that has none of the present library version:
 * `node --import tsx tests/golden/record.ts`. Files that exist are never written again.
 */
import { existsSync, mkdirSync, writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { format, resolveConfig } from "prettier";
import {
  defaultParts,
  defaultTargets,
  designatorLetters,
  libraryVersion,
  type AnyTopology,
  type PlainConditions,
  type PlainValues,
} from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { recompute, type GoldenRevision } from "./revision.ts";

const folder = new URL(`./${libraryVersion}/`, import.meta.url);
mkdirSync(folder, { recursive: true });

/** Every optional part of the surroundings switched on, so that as many figures as may be are saved. */
function everythingOn(topology: AnyTopology): PlainConditions {
  return Object.fromEntries(
    Object.entries(topology.conditions).map(([key, field]) => [
      key,
      field.type === "number" ? (field.suggestion ?? field.default) : field.default,
    ]),
  );
}

/** Default parts, with any pot fitted that is left out by default. */
function everyPart(topology: AnyTopology): PlainValues {
  const parts = defaultParts(topology);
  return Object.fromEntries(Object.entries(parts).map(([key, value]) => [key, value === 0 ? 2000 : value]));
}

function designatorsOf(topology: AnyTopology): Record<string, string> {
  const used: Record<string, number> = {};
  return Object.fromEntries(
    Object.entries(topology.parts).map(([key, { partClass }]) => {
      const letters = designatorLetters[partClass];
      used[letters] = (used[letters] ?? 0) + 1;
      return [key, `${letters}${used[letters]}`];
    }),
  );
}

for (const kind of stageKinds)
  for (const topology of kind.topologies) {
    const file = new URL(`${kind.id}.${topology.id}.json`, folder);
    if (existsSync(file)) continue;
    const stage: GoldenRevision["stage"] = {
      id: `golden-${kind.id}-${topology.id}`,
      kind: kind.id,
      topology: topology.id,
      name: kind.name,
      parts: everyPart(topology),
      conditions: everythingOn(topology),
      targets: defaultTargets(topology),
      designators: designatorsOf(topology),
    };
    const revision: GoldenRevision = { libraryVersion, stage, ...recompute(topology, stage) };
    const filepath = fileURLToPath(file);
    writeFileSync(file, await format(JSON.stringify(revision), { ...(await resolveConfig(filepath)), filepath }));
    console.log(`Recorded ${kind.id}/${topology.id} of ${libraryVersion}.`);
  }
