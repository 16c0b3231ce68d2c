import { existsSync } from "node:fs";
import type { IncomingMessage, ServerResponse } from "node:http";
import sirv from "sirv";

export type FileServer = (request: IncomingMessage, response: ServerResponse, next: () => void) => void;

/** Serves the files of the client build; whatever is not one of them goes on to `next`. */
export function serveFiles(folder: string): FileServer {
  if (!existsSync(folder)) throw new Error(`There is nothing to serve in ${folder}. Build first: npm run build`);
  const files = sirv(folder, {
    etag: true,
    setHeaders(response, pathname) {
      response.setHeader("X-Content-Type-Options", "nosniff");
      // Names under /_astro/ carry a hash of the content: a changed file gets another name.
      response.setHeader(
        "Cache-Control",
        pathname.startsWith("/_astro/") ? "public, max-age=31536000, immutable" : "no-cache",
      );
    },
  });
  return (request, response, next) => {
    if (request.method === "GET" || request.method === "HEAD") files(request, response, next);
    else next();
  };
}
