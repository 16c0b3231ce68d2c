import type { Settings } from "../env.ts";

type Place = Pick<Settings, "CLATTERBENCH_MODE" | "HOST" | "PUBLIC_URL">;

const loopback = ["127.0.0.1", "localhost", "[::1]"].flatMap((host) => [host, `${host}:*`]);

/**
 * Where the application may be reached, and so what links in mails begin with. A server has one address; a demo is opened
 * under whichever loopback name and port a person or a test happens to use.
 */
export function baseUrlFor({ CLATTERBENCH_MODE, HOST, PUBLIC_URL }: Place) {
  if (CLATTERBENCH_MODE === "production") return PUBLIC_URL;
  const { host, protocol } = new URL(PUBLIC_URL);
  // A demo told to listen beyond loopback is reached under names nobody can list beforehand.
  const beyond = !["127.0.0.1", "localhost", "::1"].includes(HOST);
  return {
    allowedHosts: beyond ? ["*"] : [host, ...loopback],
    protocol: protocol === "https:" ? ("https" as const) : ("http" as const),
    fallback: PUBLIC_URL,
  };
}
