import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { listApiKeys, makeApiKey } from "#lib/server/apiKeys/keys.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { byHand } from "#lib/server/byHand.ts";
import { readJson } from "#lib/server/request.ts";
import { newApiKey } from "#lib/wire/apiKey.ts";

export const GET = answer(async ({ locals }) => {
  byHand(locals);
  return json({ keys: await listApiKeys({ ctx: contextOf(locals) }) });
});

export const POST = answer(async ({ locals, request }) => {
  byHand(locals);
  const ctx = contextOf(locals);
  memberOf(ctx);
  return json(await makeApiKey({ ctx, input: await readJson({ request, locals }, newApiKey) }), { status: 201 });
});

export const ALL = methodNotAllowed("GET", "POST");
