import { auditEvents, users, voices } from "#lib/db/index.ts";
import type { ActivityAnswer, activityQuery } from "#lib/wire/activity.ts";
import { and, asc, desc, eq, sql } from "drizzle-orm";
import type { z } from "zod";
import { authorize, memberOf, type Context } from "../context.ts";
import { isMoment, readPageCursor, writePageCursor } from "../cursor.ts";

interface List {
  ctx: Context;
  input: z.output<typeof activityQuery>;
}

/** One page of who did what when in the actor's team, from the log that only grows. */
export async function listActivity({ ctx, input }: List): Promise<ActivityAnswer> {
  const { team } = memberOf(ctx);
  authorize(ctx, "activity.read", { teamId: team.id });
  const newest = input.sort === "newest";
  const after = input.cursor ? readPageCursor(input.cursor, input.sort, isMoment) : undefined;
  const rows = await ctx.db
    .select({ event: auditEvents, actorName: users.name, voiceName: voices.name })
    .from(auditEvents)
    .leftJoin(users, eq(users.id, auditEvents.actorId))
    .leftJoin(voices, eq(voices.id, auditEvents.subjectId))
    .where(
      and(
        eq(auditEvents.teamId, team.id),
        input.voice === undefined ? undefined : eq(auditEvents.subjectId, input.voice),
        input.person === undefined ? undefined : eq(auditEvents.actorId, input.person),
        input.action === undefined ? undefined : eq(auditEvents.action, input.action),
        after &&
          sql`(${auditEvents.at}, ${auditEvents.id}) ${sql.raw(newest ? "<" : ">")} (${after.key}::timestamptz, ${after.id})`,
      ),
    )
    .orderBy(...(newest ? [desc(auditEvents.at), desc(auditEvents.id)] : [asc(auditEvents.at), asc(auditEvents.id)]))
    .limit(input.limit + 1);
  const page = rows.slice(0, input.limit);
  const last = page.at(-1)?.event;
  const more = rows.length > input.limit && last;
  return {
    events: page.map(({ event: { id, at, actorId, action, subjectId, detail }, actorName, voiceName }) => ({
      ...{ id, action, detail },
      at: at.toISOString(),
      actor: actorName === null ? null : { id: actorId, name: actorName },
      subject: { id: subjectId, name: voiceName },
    })),
    nextCursor: more ? writePageCursor({ order: input.sort, key: last.at.toISOString(), id: last.id }) : null,
  };
}
