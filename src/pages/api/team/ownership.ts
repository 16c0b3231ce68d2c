import { answer, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { readJson } from "#lib/server/request.ts";
import { handOverTeam } from "#lib/server/teams/handOver.ts";
import { handOver } from "#lib/wire/team.ts";

export const POST = answer(async ({ locals, request }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  await handOverTeam({ ctx, input: await readJson({ request, locals }, handOver) });
  return new Response(null, { status: 204 });
});

export const ALL = methodNotAllowed("POST");
