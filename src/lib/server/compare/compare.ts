import { compareVoices, reviewChecklist } from "#lib/circuit/index.ts";
import { stageKinds } from "#lib/circuit/kinds/index.ts";
import type { CompareAnswer, CompareQuery } from "#lib/wire/compare.ts";
import { countOpenThreads } from "../comments/list.ts";
import type { Context } from "../context.ts";
import { loadVoice } from "../voices/load.ts";
import { readSide, releaseBefore } from "./side.ts";

interface Compare {
  ctx: Context;
  input: Omit<CompareQuery, "format"> & { id: string };
}

/** Compares two states of a voice, or of two voices of one team, and fills in what a reviewer checks. */
export async function compareRevisions({ ctx, input }: Compare): Promise<CompareAnswer> {
  const { id, to: toRef, fromVoice, stage, curves } = input;
  const voice = await loadVoice(ctx.db, ctx, id, "voice.read");
  const other =
    fromVoice === undefined || fromVoice === id ? voice : await loadVoice(ctx.db, ctx, fromVoice, "voice.read");
  const fromRef = input.from ?? (other === voice ? await releaseBefore(ctx.db, id, toRef) : "working");
  const [from, to] = await Promise.all([readSide(ctx.db, ctx, other, fromRef), readSide(ctx.db, ctx, voice, toRef)]);
  const comparison = compareVoices(from, to, {
    kinds: stageKinds,
    ofOneVoice: other === voice,
    curves: curves === "none" ? "none" : stage === undefined ? "changed" : { stage },
  });
  const checklist = reviewChecklist({
    comparison,
    reason: to.about.reason ?? "not said yet: the working copy has no reason",
    warnings: to.warnings,
    stageNames: Object.fromEntries(to.document.stages.map((s) => [s.id, s.name])),
    openThreads: typeof toRef === "number" ? await countOpenThreads(ctx.db, voice.id, toRef) : 0,
  });
  return {
    from: from.about,
    to: to.about,
    ...(comparison as Omit<CompareAnswer, "from" | "to" | "checklist">),
    checklist,
  };
}
