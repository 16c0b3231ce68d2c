import { libraryVersion, recompute } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import type { recomputeAnswer } from "#lib/wire/revision.ts";
import type { z } from "zod";
import { loadRevision } from "./load.ts";
import { keptAnalysisOf, keptInputsOf } from "./present.ts";
import type { RevisionInput } from "./read.ts";

type RecomputeAnswer = z.input<typeof recomputeAnswer>;

/** Computes a kept revision with today's library and says which figures come out otherwise. What is kept stays as it is. */
export async function recomputeRevision({ ctx, input: { id, number } }: RevisionInput): Promise<RecomputeAnswer> {
  const { revision } = await loadRevision(ctx.db, ctx, { voiceId: id, number });
  const found = recompute(keptInputsOf(revision), keptAnalysisOf(revision), stageKinds);
  return {
    keptWith: revision.libraryVersion,
    computedWith: libraryVersion,
    ...(found as Pick<RecomputeAnswer, "differences" | "warnings">),
  };
}
