import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, memberOf } from "#lib/server/context.ts";
import { idInPath, readJson } from "#lib/server/request.ts";
import { readVoice } from "#lib/server/voices/read.ts";
import { removeVoice } from "#lib/server/voices/remove.ts";
import { renameVoice } from "#lib/server/voices/rename.ts";
import { voiceChange } from "#lib/wire/voice.ts";

export const GET = answer(async ({ locals, params }) =>
  json(await readVoice({ ctx: contextOf(locals), input: { id: idInPath(params) } })),
);

export const PATCH = answer(async ({ locals, params, request }) => {
  const ctx = contextOf(locals);
  memberOf(ctx);
  const { name } = await readJson({ request, locals }, voiceChange);
  return json(await renameVoice({ ctx, input: { id: idInPath(params), name } }));
});

export const DELETE = answer(async ({ locals, params }) => {
  await removeVoice({ ctx: contextOf(locals), input: { id: idInPath(params) } });
  return new Response(null, { status: 204 });
});

export const ALL = methodNotAllowed("GET", "PATCH", "DELETE");
