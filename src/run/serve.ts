// Serves the built application: `npm start` runs this, and so do the tests. Needs a build and a PostgreSQL.
import type { RequestListener } from "node:http";
import { join, resolve } from "node:path";
import { pathToFileURL } from "node:url";
import { DemoAccountsError } from "#lib/server/demo/refuse.ts";
import { parseSettings, SettingsError, type Settings } from "#lib/server/env.ts";
import { serveFiles } from "./http/files.ts";
import { gate, type Application } from "./http/gate.ts";
import { closeGracefully, listen, portOf } from "./http/listen.ts";
import { refuse } from "./http/problem.ts";
import { migrateDatabase } from "./migrate.ts";
import { prepareAccounts } from "./seed.ts";

const starting: RequestListener = (request, response) => {
  response.setHeader("Retry-After", "2");
  refuse(request, response, "unavailable", "The server is still starting. Try again in a moment.");
};

class StartError extends Error {}

async function prepareDatabase(settings: Settings) {
  const { DATABASE_URL } = settings;
  try {
    await migrateDatabase(DATABASE_URL, () => prepareAccounts(settings));
  } catch (error) {
    if (error instanceof DemoAccountsError) throw new StartError(error.message, { cause: error });
    const { code, message } = error as { code?: string; message?: string };
    // A refused connection, a wrong password or name: whoever runs the server can mend it, and needs no stack for that.
    if (!/^(E[A-Z]+|CONNECT_TIMEOUT|28\w{3}|3D000)$/.test(code ?? "")) throw error;
    const { host } = new URL(DATABASE_URL);
    throw new StartError(`The database cannot be reached at ${host}: ${message || code}. Check DATABASE_URL.`, {
      cause: error,
    });
  }
}

async function serve() {
  const wanted = parseSettings(process.env);
  let listener = starting;
  const server = await listen((request, response) => listener(request, response), {
    host: wanted.HOST,
    port: wanted.PORT,
  });

  let stopping = false;
  async function stop() {
    if (stopping) return;
    stopping = true;
    await closeGracefully(server);
    process.exit(0);
  }
  process.on("SIGTERM", () => void stop());
  process.on("SIGINT", () => void stop());
  // The start script holds the other end: if it was killed, nobody is left to stop this server.
  process.on("disconnect", () => void stop());

  // The port is known only now; the application, which reads its settings when it loads, must learn the one really used.
  process.env.PORT = String(portOf(server));
  const settings = parseSettings(process.env);

  await prepareDatabase(settings);

  const folder = resolve(settings.OUT_DIR);
  const files = serveFiles(join(folder, "client"));
  const entry = (await import(pathToFileURL(join(folder, "server", "entry.mjs")).href)) as { handler: Application };
  // Without an address of its own the demo is whatever loopback name people typed.
  const origin = process.env.PUBLIC_URL ? new URL(settings.PUBLIC_URL) : undefined;
  listener = gate({ files, application: entry.handler, proxies: settings.TRUST_PROXY, origin });

  const address = `http://${settings.HOST.includes(":") ? `[${settings.HOST}]` : settings.HOST}:${settings.PORT}`;
  if (wanted.PORT !== 0 && wanted.PORT !== settings.PORT) console.log(`Port ${wanted.PORT} is taken.`);
  console.log(`Clatterbench is running at ${address}`);
  process.send?.({ address });
}

try {
  await serve();
} catch (error) {
  console.error(error instanceof SettingsError || error instanceof StartError ? error.message : error);
  process.exit(1);
}
