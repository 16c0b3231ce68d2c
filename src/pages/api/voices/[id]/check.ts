import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { idInPath, readQuery } from "#lib/server/request.ts";
import { checkDocument } from "#lib/server/voices/check.ts";
import { checkQuery } from "#lib/wire/check.ts";

export const POST = answer(async ({ locals, params, url }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  return json(await checkDocument({ ctx, input: { id: idInPath(params), ...readQuery(url, checkQuery) } }));
});

export const ALL = methodNotAllowed("POST");
