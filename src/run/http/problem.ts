import type { IncomingMessage, ServerResponse } from "node:http";

/** Answers a request that is refused before the application sees it. */
export function refuse(request: IncomingMessage, response: ServerResponse, status: number, title: string, detail: string): void {
  const api = request.url?.startsWith("/api/") ?? false;
  const body = api ? JSON.stringify({ type: "about:blank", title, status, detail }) : `${title}. ${detail}\n`;
  response.writeHead(status, {
    "Content-Type": api ? "application/problem+json" : "text/plain; charset=utf-8",
    "Content-Length": Buffer.byteLength(body),
    "Cache-Control": "no-store",
  });
  response.end(body);
}
