import type { IncomingMessage } from "node:http";

const safe = new Set(["GET", "HEAD", "OPTIONS"]);

/**
 * Whether a request could be another site writing in a signed-in person's name: it changes something, carries a cookie,
 * and the browser does not say that our own page sent it. A script sends neither Sec-Fetch-Site nor Origin, and has its
 * cookie because its owner gave it one.
 */
export function isForgedWrite({ method = "GET", headers }: Pick<IncomingMessage, "method" | "headers">): boolean {
  if (safe.has(method) || !headers.cookie) return false;
  const site = headers["sec-fetch-site"];
  if (site !== undefined) return site !== "same-origin" && site !== "none";
  if (headers.origin === undefined) return false;
  return !URL.canParse(headers.origin) || new URL(headers.origin).host !== headers.host;
}
