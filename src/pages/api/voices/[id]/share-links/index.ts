import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { idInPath, readJson, readQuery } from "#lib/server/request.ts";
import { listShareLinks } from "#lib/server/shareLinks/list.ts";
import { makeShareLink } from "#lib/server/shareLinks/make.ts";
import { newShareLink, shareLinkListQuery } from "#lib/wire/shareLink.ts";

export const GET = answer(async ({ locals, params, url }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  return json(await listShareLinks({ ctx, input: { id: idInPath(params), ...readQuery(url, shareLinkListQuery) } }));
});

export const POST = answer(async ({ locals, params, request }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const input = { id: idInPath(params), ...(await readJson({ request, locals }, newShareLink)) };
  return json(await makeShareLink({ ctx, input }), { status: 201 });
});

export const ALL = methodNotAllowed("GET", "POST");
