import postgres from "postgres";
import type { TestProject } from "vitest/node";
import { releaseCluster, startCluster } from "../../docker-less-db/cluster.mjs";
import { migrateDatabase } from "../../src/run/migrate.ts";

declare module "vitest" {
  interface ProvidedContext {
    /** Where the tests' PostgreSQL is, as a user who may create databases there. */
    databaseServer: string;
    /** A migrated, empty database to copy from. */
    databaseTemplate: string;
  }
}

export function addressOf(server: string, database: string): string {
  const url = new URL(server);
  url.pathname = `/${database}`;
  return url.href;
}

/** Runs once before a project's tests: the migrations are applied to one database, which every test file then copies. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const given = process.env.TEST_DATABASE_URL;
  const server = given || (await startCluster("test")).url;
  const template = `template_${project.name}_${process.pid}`;
  const admin = postgres(server, { max: 1, onnotice: () => undefined });
  const drop = () => admin`DROP DATABASE IF EXISTS ${admin(template)} WITH (FORCE)`;

  await drop();
  await admin`CREATE DATABASE ${admin(template)}`;
  await migrateDatabase(addressOf(server, template));
  project.provide("databaseServer", server);
  project.provide("databaseTemplate", template);

  return async () => {
    await drop();
    await admin.end();
    if (!given) await releaseCluster("test");
  };
}
