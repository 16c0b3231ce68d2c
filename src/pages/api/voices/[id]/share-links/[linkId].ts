import { answer, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf } from "#lib/server/context.ts";
import { idInPath } from "#lib/server/request.ts";
import { revokeShareLink } from "#lib/server/shareLinks/list.ts";

export const DELETE = answer(async ({ locals, params }) => {
  const input = { id: idInPath(params), linkId: idInPath(params, "linkId") };
  await revokeShareLink({ ctx: contextOf(locals), input });
  return new Response(null, { status: 204 });
});

export const ALL = methodNotAllowed("DELETE");
