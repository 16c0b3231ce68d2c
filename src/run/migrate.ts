import { resolve } from "node:path";
import { drizzle } from "drizzle-orm/postgres-js";
import { migrate } from "drizzle-orm/postgres-js/migrator";
import postgres from "postgres";

// Every command of this project runs in the checkout's root, wherever the server was bundled to.
const migrationsFolder = resolve("migrations");

// Any number will do, as long as every server process takes the same one and nothing else in the database does.
const lockNumber = 4_703_318_642;

/**
 * Brings a database to the newest schema, then does `afterwards` (loading demo data, say). Both happen under an advisory
 * lock: of several processes that start at once the first does the work and the others find it done.
 */
export async function migrateDatabase(url: string, afterwards?: () => Promise<void>): Promise<void> {
  // The lock belongs to a connection, so there must be only one.
  const connection = postgres(url, { max: 1, connect_timeout: 10, onnotice: () => undefined });
  try {
    await connection`SELECT pg_advisory_lock(${lockNumber}::bigint)`;
    await migrate(drizzle(connection), { migrationsFolder });
    await afterwards?.();
  } finally {
    // Ending the connection frees the lock, even when the work has failed.
    await connection.end({ timeout: 5 });
  }
}
