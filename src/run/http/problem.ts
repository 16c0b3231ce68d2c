import type { IncomingMessage, ServerResponse } from "node:http";
import { Refusal, type ErrorCode } from "#lib/server/errors.ts";
import { problemDocument } from "#lib/server/problem.ts";

/** Answers a request that is refused before the application sees it: a problem document to scripts, a line to people. */
export function refuse(request: IncomingMessage, response: ServerResponse, code: ErrorCode, detail: string): void {
  const refusal = new Refusal(code, detail);
  const api = request.url?.startsWith("/api/") ?? false;
  const body = api ? JSON.stringify(problemDocument(refusal)) : `${detail}\n`;
  response.writeHead(refusal.status, {
    "Content-Type": api ? "application/problem+json" : "text/plain; charset=utf-8",
    "Content-Length": Buffer.byteLength(body),
    "Cache-Control": "no-store",
    "X-Content-Type-Options": "nosniff",
  });
  response.end(body);
}
