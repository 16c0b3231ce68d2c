/** Carries the address of the connection to better-auth, which only sees headers; whatever the client sent under this name is replaced. */
export const peerHeader = "x-clatterbench-peer";

/**
 * The request as better-auth is to see it: with the address it came from, and, if a script sent it, with our own origin.
 * better-auth refuses a write without Origin; a browser always sends one with a write, so without it no page is behind the
 * request that could act in somebody's name.
 */
export function vouchedRequest(request: Request, address: string): Request {
  const headers = new Headers(request.headers);
  headers.set(peerHeader, address);
  const site = headers.get("sec-fetch-site");
  const fromScript = !headers.has("origin") && !headers.has("referer") && (site === null || site === "none");
  if (fromScript) headers.set("origin", new URL(request.url).origin);
  return new Request(request, { headers });
}
