import type { APIContext, APIRoute } from "astro";
import { Refusal } from "./errors.ts";
import { problemResponse } from "./problem.ts";

/** Wraps an endpoint so that whatever it throws leaves as a problem document. */
export function answer(handler: (context: APIContext) => Promise<Response> | Response): APIRoute {
  return async (context) => {
    try {
      return await handler(context);
    } catch (error) {
      return problemResponse(error);
    }
  };
}

/** A JSON answer. What depends on who asks is not kept by caches unless the caller says otherwise. */
export function json(body: unknown, { status = 200, headers = {} }: { status?: number; headers?: HeadersInit } = {}) {
  const all = new Headers(headers);
  all.set("content-type", "application/json");
  if (!all.has("cache-control")) all.set("cache-control", "no-store");
  return new Response(JSON.stringify(body), { status, headers: all });
}

/** A table to be taken away as a file. */
export function csv(fileName: string, text: string): Response {
  return new Response(text, {
    headers: {
      "content-type": "text/csv; charset=utf-8",
      "content-disposition": `attachment; filename="${fileName}"`,
      "cache-control": "no-store",
    },
  });
}

/** For `export const ALL`: Astro calls it for each method a route file does not export. */
export function methodNotAllowed(...allowed: readonly string[]): APIRoute {
  const allow = [...(allowed.includes("GET") ? ["HEAD"] : []), ...allowed].join(", ");
  return ({ request }) =>
    problemResponse(
      new Refusal("method-not-allowed", `This address takes ${allowed.join(", ")}, but ${request.method} was sent.`, {
        headers: { allow },
      }),
    );
}
