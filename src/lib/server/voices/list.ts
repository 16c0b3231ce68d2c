import { voices } from "#lib/db/index.ts";
import type { VoiceListAnswer, voiceListQuery } from "#lib/wire/voice.ts";
import { and, asc, desc, eq, ilike, sql, type SQL } from "drizzle-orm";
import type { z } from "zod";
import { authorize, memberOf, type Context } from "../context.ts";
import { readCursor, writeCursor, type Cursor } from "./cursor.ts";
import { selectVoices, type VoiceRow } from "./load.ts";
import { presentVoice } from "./present.ts";

type Sort = Cursor["sort"];

const orders: Record<Sort, { by: SQL[]; after: (cursor: Cursor) => SQL; key: (voice: VoiceRow) => string }> = {
  updated: {
    by: [desc(voices.updatedAt), desc(voices.id)],
    after: ({ key, id }) => sql`(${voices.updatedAt}, ${voices.id}) < (${key}::timestamptz, ${id})`,
    key: (voice) => voice.updatedAt.toISOString(),
  },
  created: {
    by: [desc(voices.createdAt), desc(voices.id)],
    after: ({ key, id }) => sql`(${voices.createdAt}, ${voices.id}) < (${key}::timestamptz, ${id})`,
    key: (voice) => voice.createdAt.toISOString(),
  },
  name: {
    by: [asc(voices.name), asc(voices.id)],
    after: ({ key, id }) => sql`(${voices.name}, ${voices.id}) > (${key}, ${id})`,
    key: (voice) => voice.name,
  },
};

const literally = (text: string) => text.replace(/[\\%_]/g, (sign) => `\\${sign}`);

/** One page of the team's voices. */
export async function listVoices(given: {
  ctx: Context;
  input: z.output<typeof voiceListQuery>;
}): Promise<VoiceListAnswer> {
  const { ctx, input } = given;
  const { team } = memberOf(ctx);
  authorize(ctx, "voice.list", { teamId: team.id });
  const order = orders[input.sort];
  const rows = await selectVoices(ctx.db)
    .where(
      and(
        eq(voices.teamId, team.id),
        input.name ? ilike(voices.name, `%${literally(input.name)}%`) : undefined,
        input.cursor ? order.after(readCursor(input.cursor, input.sort)) : undefined,
      ),
    )
    .orderBy(...order.by)
    // One more than asked for tells whether there is a next page.
    .limit(input.limit + 1);

  const page = rows.slice(0, input.limit);
  const last = page.at(-1);
  const more = rows.length > input.limit && last;
  return {
    voices: page.map((voice) => presentVoice(voice, ctx.actor)),
    nextCursor: more ? writeCursor({ sort: input.sort, key: order.key(last), id: last.id }) : null,
  };
}
