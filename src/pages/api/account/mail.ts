import { answer, json, methodNotAllowed } from "#lib/server/answer.ts";
import { contextOf, noSession } from "#lib/server/context.ts";
import { chooseMentions, wantsMentions } from "#lib/server/mail/choices.ts";
import { readJson } from "#lib/server/request.ts";
import { mailChoice } from "#lib/wire/mailChoice.ts";

export const GET = answer(async ({ locals }) => json({ mentions: await wantsMentions({ ctx: contextOf(locals) }) }));

export const PUT = answer(async ({ locals, request }) => {
  const ctx = contextOf(locals);
  if (!ctx.actor) throw noSession();
  const input = await readJson({ request, locals }, mailChoice);
  await chooseMentions({ ctx, input });
  return json(input);
});

export const ALL = methodNotAllowed("GET", "PUT");
