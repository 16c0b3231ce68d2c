import { answer, methodNotAllowed } from "#lib/server/answer.ts";
import { revokeApiKey } from "#lib/server/apiKeys/keys.ts";
import { byHand } from "#lib/server/byHand.ts";
import { contextOf } from "#lib/server/context.ts";
import { idInPath } from "#lib/server/request.ts";

export const DELETE = answer(async ({ locals, params }) => {
  byHand(locals);
  await revokeApiKey({ ctx: contextOf(locals), input: { id: idInPath(params) } });
  return new Response(null, { status: 204 });
});

export const ALL = methodNotAllowed("DELETE");
