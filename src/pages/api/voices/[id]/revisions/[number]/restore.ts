import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { numberInPath } from "#lib/server/numberInPath.ts";
import { idInPath } from "#lib/server/request.ts";
import { restoreRevision } from "#lib/server/revisions/restore.ts";
import { expectedVersions } from "#lib/server/workingCopies/etag.ts";

export const POST = answer(async ({ locals, params, request }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const input = { id: idInPath(params), number: numberInPath(params) };
  const expected = expectedVersions(request.headers.get("if-match"));
  const { copy, etag } = await restoreRevision({ ctx, input: { ...input, expected } });
  return json(copy, { headers: { etag } });
});

export const ALL = methodNotAllowed("POST");
