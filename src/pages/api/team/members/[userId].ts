import { answer, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { idInPath, readJson } from "#lib/server/request.ts";
import { changeRole } from "#lib/server/teams/changeRole.ts";
import { removeMember } from "#lib/server/teams/removeMember.ts";
import { roleChange } from "#lib/wire/team.ts";

export const PATCH = answer(async ({ locals, params, request }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const userId = idInPath(params, "userId");
  await changeRole({ ctx, input: { userId, ...(await readJson({ request, locals }, roleChange)) } });
  return new Response(null, { status: 204 });
});

export const DELETE = answer(async ({ locals, params }) => {
  await removeMember({ ctx: contextOf(locals), input: { userId: idInPath(params, "userId") } });
  return new Response(null, { status: 204 });
});

export const ALL = methodNotAllowed("PATCH", "DELETE");
