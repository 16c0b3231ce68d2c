import { openDatabase, type Database } from "#lib/db/index.ts";
import { settings } from "./env.ts";

let open: Database | undefined;

/** The pool of this process. Opened at first use, so that a build needs no database. */
export function database(): Database {
  const { DATABASE_URL, DATABASE_CONNECTIONS } = settings();
  open ??= openDatabase(DATABASE_URL, { connections: DATABASE_CONNECTIONS });
  return open;
}
