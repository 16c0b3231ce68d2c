import { defaultParts, defaultTargets } from "#lib/circuit/index.ts";
import { linkFaults, type FindTopology, type FoundTopology } from "#lib/circuit/voice/index.ts";
import { assignDesignators } from "../stage/designators.ts";
import { newStageId } from "../stage/newStageId.ts";
import type { StoredLink, StoredStage, WorkingCopyDocument } from "../workingCopy.ts";

const takenIn = ({ stages }: WorkingCopyDocument) => stages.flatMap(({ designators }) => Object.values(designators));

/** A name that no stage of the voice has yet: "Band", "Band 2". */
function freeName({ stages }: WorkingCopyDocument, name: string): string {
  const names = new Set(stages.map((stage) => stage.name));
  const stem = name.replace(/ \d+$/, "");
  let candidate = name;
  for (let count = 2; names.has(candidate); count += 1) candidate = `${stem} ${count}`;
  return candidate;
}

/** The document with a new stage of usual values behind the others. */
export function withNewStage(document: WorkingCopyDocument, { kind, topology }: FoundTopology): WorkingCopyDocument {
  const parts = defaultParts(topology);
  const stage: StoredStage = {
    ...{ id: newStageId(), kind: kind.id, topology: topology.id, name: freeName(document, kind.name), parts },
    ...{ conditions: {}, targets: defaultTargets(topology) },
    designators: assignDesignators(topology, parts, {}, takenIn(document)),
  };
  return { ...document, stages: [...document.stages, stage] };
}

/** The document with a copy of the stage behind it: its values, but designators of its own, and no links. */
export function withStageDoubled(document: WorkingCopyDocument, id: string, find: FindTopology): WorkingCopyDocument {
  const at = document.stages.findIndex((stage) => stage.id === id);
  const stage = document.stages[at];
  const found = stage && find(stage.kind, stage.topology);
  if (!stage || !found) return document;
  const copy: StoredStage = {
    ...stage,
    ...{ id: newStageId(), name: freeName(document, stage.name) },
    designators: assignDesignators(found.topology, stage.parts, {}, takenIn(document)),
  };
  return { ...document, stages: document.stages.toSpliced(at + 1, 0, copy) };
}

export function withStageApart(document: WorkingCopyDocument, id: string, apart: boolean): WorkingCopyDocument {
  const turned = (stage: StoredStage) => {
    const { apart: _, ...rest } = stage;
    return stage.id === id ? { ...rest, ...(apart && { apart }) } : stage;
  };
  return { ...document, stages: document.stages.map(turned) };
}

export function withoutLink(document: WorkingCopyDocument, id: string): WorkingCopyDocument {
  return { ...document, links: document.links.filter((link) => link.id !== id) };
}

type Ends = Pick<StoredLink, "from" | "to">;

/** Why these ends cannot be linked; undefined where they can. */
export function linkFault(document: WorkingCopyDocument, ends: Ends, find: FindTopology): string | undefined {
  const links = [...document.links, { id: "new", ...ends }];
  return linkFaults(document.stages, links, find).find(({ index }) => index === links.length - 1)?.message;
}

export function withLink(document: WorkingCopyDocument, ends: Ends): WorkingCopyDocument {
  return { ...document, links: [...document.links, { id: newStageId(), ...ends }] };
}
