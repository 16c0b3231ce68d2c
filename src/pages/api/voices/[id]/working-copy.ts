import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { idInPath, readJson } from "#lib/server/request.ts";
import { etagOf, expectedVersions, versionsIn } from "#lib/server/workingCopies/etag.ts";
import { readWorkingCopy } from "#lib/server/workingCopies/read.ts";
import { saveWorkingCopy } from "#lib/server/workingCopies/save.ts";
import { workingCopyDocument } from "#lib/wire/workingCopy.ts";

export const GET = answer(async ({ locals, params, request }) => {
  const { copy, etag } = await readWorkingCopy({ ctx: contextOf(locals), input: { id: idInPath(params) } });
  const headers = { etag, "cache-control": "private, no-cache" };
  const known = versionsIn(request.headers.get("if-none-match") ?? "").some((version) => etagOf(version) === etag);
  return known ? new Response(null, { status: 304, headers }) : json(copy, { headers });
});

export const PUT = answer(async ({ locals, params, request }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const id = idInPath(params);
  const expected = expectedVersions(request.headers.get("if-match"));
  const document = await readJson({ request, locals }, workingCopyDocument);
  const { copy, etag } = await saveWorkingCopy({ ctx, input: { id, document, expected } });
  return json(copy, { headers: { etag } });
});

export const ALL = methodNotAllowed("GET", "PUT");
