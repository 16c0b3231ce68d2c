import { revisions } from "#lib/db/index.ts";
import type { revisionListAnswer, revisionListQuery } from "#lib/wire/revision.ts";
import { and, asc, desc, eq, gt, lt } from "drizzle-orm";
import type { z } from "zod";
import type { Context } from "../context.ts";
import { isCount, readPageCursor, writePageCursor } from "../cursor.ts";
import { loadVoice } from "../voices/load.ts";
import { readingOf, selectSummaries } from "./load.ts";
import { presentSummary } from "./present.ts";

interface List {
  ctx: Context;
  input: z.output<typeof revisionListQuery> & { id: string };
}

/** One page of a voice's revisions; who reads released ones alone is shown no other. */
export async function listRevisions({ ctx, input }: List): Promise<z.output<typeof revisionListAnswer>> {
  const voice = await loadVoice(ctx.db, ctx, input.id, "voice.read");
  const newest = input.sort === "newest";
  const after = input.cursor ? Number(readPageCursor(input.cursor, input.sort, isCount).key) : undefined;
  const rows = await selectSummaries(ctx.db)
    .where(
      and(
        eq(revisions.voiceId, voice.id),
        input.status ? eq(revisions.status, input.status) : undefined,
        readingOf(ctx, voice) === "revision.read" ? undefined : eq(revisions.decision, "release"),
        after === undefined ? undefined : (newest ? lt : gt)(revisions.number, after),
      ),
    )
    .orderBy((newest ? desc : asc)(revisions.number))
    // One more than asked for tells whether there is a next page.
    .limit(input.limit + 1);
  const page = rows.slice(0, input.limit);
  const last = page.at(-1);
  const more = rows.length > input.limit && last;
  return {
    revisions: page.map((row) => presentSummary(row, voice, ctx.actor)),
    nextCursor: more ? writePageCursor({ order: input.sort, key: String(last.number), id: last.id }) : null,
  };
}
