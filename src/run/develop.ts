// `npm run dev`: the application from its sources, reloaded as they change.
import { dev } from "astro";
import { parseSettings } from "#lib/server/env.ts";
import { migrateDatabase } from "./migrate.ts";
import { prepareAccounts } from "./seed.ts";

const settings = parseSettings(process.env);
await migrateDatabase(settings.DATABASE_URL, () => prepareAccounts(settings));
const server = await dev({ root: process.cwd(), server: { host: settings.HOST, port: settings.PORT } });

async function stop() {
  await server.stop();
  process.exit(0);
}
process.on("SIGTERM", () => void stop());
process.on("SIGINT", () => void stop());
process.on("disconnect", () => void stop());
