/** Carries the address of the connection to better-auth, which only sees headers; whatever the client sent under this name is replaced. */
export const peerHeader = "x-clatterbench-peer";

export function withPeer(request: Request, address: string): Request {
  const headers = new Headers(request.headers);
  headers.set(peerHeader, address);
  return new Request(request, { headers });
}
