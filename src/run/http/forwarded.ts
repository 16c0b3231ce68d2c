import type { IncomingMessage } from "node:http";

const forwarding = [
  "x-forwarded-for",
  "x-forwarded-host",
  "x-forwarded-port",
  "x-forwarded-proto",
  "x-real-ip",
  "forwarded",
];

export interface Reached {
  /** How many proxies of ours stand before this server. */
  proxies: number;
  /** The address people type, where one is set: then a request's own Host header decides nothing. */
  origin: URL | undefined;
}

/**
 * Rewrites the headers a request's address is built from, so that everything behind reads them without asking who may
 * have forged them: X-Forwarded-For becomes the one address we vouch for, the others go.
 */
export function vouchForHeaders(request: IncomingMessage, { proxies, origin }: Reached): void {
  const hops = String(request.headers["x-forwarded-for"] ?? "")
    .split(",")
    .map((hop) => hop.trim())
    .filter(Boolean);
  for (const name of forwarding) delete request.headers[name];
  // Each proxy appends whom it heard from: what stands further left than our own proxies was written by a stranger.
  const vouched = proxies > 0 ? hops.at(-proxies) : undefined;
  const address = vouched ?? request.socket.remoteAddress;
  if (address) request.headers["x-forwarded-for"] = address;
  if (!origin) return;
  request.headers.host = origin.host;
  request.headers["x-forwarded-proto"] = origin.protocol.slice(0, -1);
}
