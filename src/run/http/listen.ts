import { createServer, type RequestListener, type Server } from "node:http";
import type { AddressInfo } from "node:net";

const portsTried = 50;

/** Listens on the port asked for, or on the next free one above it; 0 asks for any. */
export async function listen(
  listener: RequestListener,
  { host, port }: { host: string; port: number },
): Promise<Server> {
  const server = createServer(
    // Slow senders give up their place: headers within 10 s, a whole request within 30 s.
    { headersTimeout: 10_000, requestTimeout: 30_000, keepAliveTimeout: 65_000, connectionsCheckingInterval: 5_000 },
    listener,
  );
  for (let candidate = port; ; candidate += 1) {
    try {
      await new Promise<void>((resolve, reject) => {
        server.once("error", reject);
        server.listen(candidate, host, () => {
          server.off("error", reject);
          resolve();
        });
      });
      return server;
    } catch (error) {
      const taken = (error as NodeJS.ErrnoException).code === "EADDRINUSE";
      if (!taken || candidate >= Math.min(port + portsTried, 65535)) throw error;
    }
  }
}

export const portOf = (server: Server): number => (server.address() as AddressInfo).port;

/** Takes no new connection, lets running requests end, and cuts off those that do not within the time given. */
export function closeGracefully(server: Server, milliseconds = 8000): Promise<void> {
  return new Promise((resolve) => {
    const timer = setTimeout(() => server.closeAllConnections(), milliseconds);
    server.close(() => {
      clearTimeout(timer);
      resolve();
    });
    server.closeIdleConnections();
  });
}
