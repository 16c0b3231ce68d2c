import { randomUUID } from "node:crypto";
import postgres from "postgres";
import { inject } from "vitest";
import { addressOf } from "./templateDatabase.ts";

export interface TestDatabase {
  url: string;
  drop(): Promise<void>;
}

/** A migrated, empty database that nobody else uses. */
export async function createDatabase(): Promise<TestDatabase> {
  const server = inject("databaseServer");
  const name = `test_${randomUUID().replaceAll("-", "")}`;
  const run = async (command: (admin: postgres.Sql) => Promise<unknown>) => {
    const admin = postgres(server, { max: 1, onnotice: () => undefined });
    try {
      await command(admin);
    } finally {
      await admin.end();
    }
  };
  await run((admin) => admin`CREATE DATABASE ${admin(name)} TEMPLATE ${admin(inject("databaseTemplate"))}`);
  return {
    url: addressOf(server, name),
    drop: () => run((admin) => admin`DROP DATABASE IF EXISTS ${admin(name)} WITH (FORCE)`),
  };
}
