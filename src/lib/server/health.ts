import type { Database } from "#lib/db/index.ts";
import type { healthAnswer } from "#lib/wire/health.ts";
import { sql } from "drizzle-orm";
import type { z } from "zod";
import { Refusal } from "./errors.ts";
import { log } from "./log.ts";
import { version } from "./version.ts";

const patience = 3000;

/** Asks the database for a sign of life; a database that does not answer in time counts as gone. */
export async function readHealth({ db }: { db: Database }): Promise<z.infer<typeof healthAnswer>> {
  let timer: NodeJS.Timeout | undefined;
  const late = new Promise<never>((_, reject) => {
    timer = setTimeout(() => reject(new Error(`no answer in ${patience} ms`)), patience);
  });
  try {
    await Promise.race([db.execute(sql`select 1`), late]);
    return { status: "ok", version, database: "ok" };
  } catch (error) {
    log().warn({ err: error }, "the database gives no sign of life");
    throw new Refusal("unavailable", "The server runs, but its database does not answer.", {
      members: { version, database: "unavailable" },
      headers: { "retry-after": "5" },
    });
  } finally {
    clearTimeout(timer);
  }
}
