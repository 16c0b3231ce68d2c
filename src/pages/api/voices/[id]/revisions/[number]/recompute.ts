import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf } from "#lib/server/context.ts";
import { numberInPath } from "#lib/server/numberInPath.ts";
import { idInPath } from "#lib/server/request.ts";
import { recomputeRevision } from "#lib/server/revisions/recompute.ts";

export const GET = answer(async ({ locals, params }) => {
  const input = { id: idInPath(params), number: numberInPath(params) };
  return json(await recomputeRevision({ ctx: contextOf(locals), input }));
});

export const ALL = methodNotAllowed("GET");
