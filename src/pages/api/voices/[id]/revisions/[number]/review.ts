import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { numberInPath } from "#lib/server/numberInPath.ts";
import { idInPath, readJson } from "#lib/server/request.ts";
import { decideReview } from "#lib/server/revisions/decide.ts";
import { reviewDecision } from "#lib/wire/revision.ts";

export const POST = answer(async ({ locals, params, request }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const input = { id: idInPath(params), number: numberInPath(params) };
  return json(
    await decideReview({ ctx, input: { ...input, ...(await readJson({ request, locals }, reviewDecision)) } }),
  );
});

export const ALL = methodNotAllowed("POST");
