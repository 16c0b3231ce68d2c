import { answer, csv, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { idInPath, readJson, readQuery } from "#lib/server/request.ts";
import { listRevisions } from "#lib/server/revisions/list.ts";
import { makeRevision } from "#lib/server/revisions/make.ts";
import { wantsCsv } from "#lib/server/wantedFormat.ts";
import { expectedVersions } from "#lib/server/workingCopies/etag.ts";
import { newRevision, revisionListQuery } from "#lib/wire/revision.ts";
import { revisionsCsv } from "#lib/wire/revisionsCsv.ts";

export const GET = answer(async ({ locals, params, request, url }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const query = readQuery(url, revisionListQuery);
  const page = await listRevisions({ ctx, input: { id: idInPath(params), ...query } });
  return wantsCsv(request, query.format) ? csv("revisions.csv", revisionsCsv(page.revisions)) : json(page);
});

export const POST = answer(async ({ locals, params, request }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const id = idInPath(params);
  const ifMatch = request.headers.get("if-match");
  const expected = ifMatch === null ? null : expectedVersions(ifMatch);
  const input = await readJson({ request, locals }, newRevision);
  const revision = await makeRevision({ ctx, input: { id, expected, ...input } });
  const headers = { location: `/api/voices/${id}/revisions/${revision.number}` };
  return json(revision, { status: 201, headers });
});

export const ALL = methodNotAllowed("GET", "POST");
