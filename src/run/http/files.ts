import { existsSync } from "node:fs";
import type { IncomingMessage, ServerResponse } from "node:http";
import sirv from "sirv";

/** Answers a request for a file; false where there is none of that name. */
export type FileServer = (request: IncomingMessage, response: ServerResponse) => Promise<boolean>;

/** Serves the files of the client build. */
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
  return (request, response) =>
    new Promise((resolve) => {
      // Of a file and of no file, exactly one is told.
      response.once("close", () => resolve(true));
      files(request, response, () => resolve(false));
    });
}
