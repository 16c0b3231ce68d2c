import { stageKinds } from "#lib/circuit/kinds/index.ts";
import {
  byPackage,
  byValue,
  computeChain,
  designatorFaults,
  findIn,
  partsList,
  shareHints,
} from "#lib/circuit/voice/index.ts";
import type { PartsListAnswer, PartsListQuery } from "#lib/wire/partsList.ts";
import type { Context } from "../context.ts";
import { readDocument } from "./document.ts";

interface Read {
  ctx: Context;
  input: { id: string } & Omit<PartsListQuery, "format">;
}

/** Every part of a voice, and what purchasing and checking want to know of them. */
export async function readPartsList({ ctx, input }: Read): Promise<PartsListAnswer> {
  const { voice, document } = await readDocument(ctx, input.id, input.revision);
  const find = findIn(stageKinds);
  const list = partsList(document.stages, find, input.boards);
  const { duplicates, gaps, missing } = designatorFaults(document.stages, find);
  return {
    voice: { id: voice.id, name: voice.name },
    revision: input.revision ?? "working",
    ...list,
    values: byValue(list.parts),
    packages: byPackage(list),
    designators: { duplicates, gaps, missing },
    usedOnce: shareHints(list, computeChain(document, find)).map(({ part, instead }) => ({
      ...{ stage: part.stage, part: part.part, value: part.value, unit: part.unit },
      ...(part.designator !== undefined && { designator: part.designator }),
      ...(instead && { instead }),
    })),
  };
}
