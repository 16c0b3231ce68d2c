// Fills a migrated demo database with the demo team; the server does the same when it starts.
import { openDatabase } from "#lib/db/index.ts";
import { refuseDemoAccounts } from "#lib/server/demo/refuse.ts";
import { seedDemo } from "#lib/server/demo/seed.ts";
import type { Settings } from "#lib/server/env.ts";

/** What the mode asks of the database: demo accounts in a demo, and none anywhere else. */
export async function prepareAccounts({
  CLATTERBENCH_MODE,
  DATABASE_URL,
}: Pick<Settings, "CLATTERBENCH_MODE" | "DATABASE_URL">) {
  const db = openDatabase(DATABASE_URL, { connections: 1 });
  try {
    await (CLATTERBENCH_MODE === "demo" ? seedDemo(db) : refuseDemoAccounts(db));
  } finally {
    await db.close();
  }
}
