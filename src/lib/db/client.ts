import { drizzle } from "drizzle-orm/postgres-js";
import postgres from "postgres";
import * as schema from "./schema/index.ts";

/** Opens a pool. Nothing is sent to the server before the first query. */
export function openDatabase(url: string, { connections = 10 }: { connections?: number } = {}) {
  const client = postgres(url, { max: connections, onnotice: () => undefined, connect_timeout: 10 });
  return Object.assign(drizzle(client, { schema }), { close: () => client.end({ timeout: 5 }) });
}

export type Database = ReturnType<typeof openDatabase>;

export type Transaction = Parameters<Parameters<Database["transaction"]>[0]>[0];

/** What a query may run on: the pool, or an open transaction. */
export type Queryable = Pick<Transaction, "select" | "insert" | "update" | "delete" | "execute">;
