import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { byHand } from "#lib/server/byHand.ts";
import { contextOf } from "#lib/server/context.ts";
import { listSessions } from "#lib/server/sessions/sessions.ts";

export const GET = answer(async ({ locals }) => {
  byHand(locals);
  return json({ sessions: await listSessions({ ctx: contextOf(locals), input: { current: locals.sessionId } }) });
});

export const ALL = methodNotAllowed("GET");
