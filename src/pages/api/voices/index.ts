import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { readJson, readQuery } from "#lib/server/request.ts";
import { createVoice } from "#lib/server/voices/create.ts";
import { listVoices } from "#lib/server/voices/list.ts";
import { newVoice, voiceListQuery } from "#lib/wire/voice.ts";

export const GET = answer(async ({ locals, url }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  return json(await listVoices({ ctx, input: readQuery(url, voiceListQuery) }));
});

export const POST = answer(async ({ locals, request }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const voice = await createVoice({ ctx, input: await readJson({ request, locals }, newVoice) });
  return json(voice, { status: 201, headers: { location: `/api/voices/${voice.id}` } });
});

export const ALL = methodNotAllowed("GET", "POST");
