import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { checkVoice, computeChain, findIn, levelsOf, supplyOf } from "#lib/circuit/voice/index.ts";
import type { CheckAnswer } from "#lib/wire/check.ts";
import type { Context } from "../context.ts";
import { readDocument } from "./document.ts";

interface Check {
  ctx: Context;
  input: { id: string; revision?: number | undefined };
}

/** Levels, supply and all that is not right, over a whole voice. */
export async function checkDocument({ ctx, input: { id, revision } }: Check): Promise<CheckAnswer> {
  const { voice, document } = await readDocument(ctx, id, revision);
  const find = findIn(stageKinds);
  const computed = computeChain(document, find);
  const supply = supplyOf(computed);
  return {
    voice: { id: voice.id, name: voice.name },
    revision: revision ?? "working",
    levels: levelsOf(computed),
    supply,
    items: checkVoice(computed, find, supply, document.accepted),
  };
}
