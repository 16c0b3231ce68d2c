import { answer, methodNotAllowed } from "#lib/server/answer.ts";
import { version } from "#lib/server/version.ts";
import { openApiDocument } from "#lib/wire/openapi.ts";
import { routes } from "#lib/wire/routes/index.ts";

let text: string | undefined;

export const GET = answer(() => {
  text ??= JSON.stringify(openApiDocument(routes, version), null, 1);
  const headers = { "content-type": "application/json", "cache-control": "public, max-age=300" };
  return new Response(text, { headers });
});

export const ALL = methodNotAllowed("GET");
