import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { computeChain, findIn, levelPlanOf, type LevelPlan } from "#lib/circuit/voice/index.ts";
import type { Context } from "../context.ts";
import { readDocument } from "./document.ts";

interface Read {
  ctx: Context;
  input: { id: string; revision: number | undefined };
}

/** The levels of a voice that this person may read. */
export async function readLevelPlan({ ctx, input: { id, revision } }: Read): Promise<LevelPlan> {
  const { document } = await readDocument(ctx, id, revision);
  const find = findIn(stageKinds);
  return levelPlanOf(computeChain(document, find), find);
}
