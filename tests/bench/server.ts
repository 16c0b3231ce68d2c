import { execFileSync } from "node:child_process";
import { readFileSync } from "node:fs";
import postgres from "postgres";
import { releaseCluster, startCluster } from "../../docker-less-db/cluster.mjs";
import { migrateDatabase } from "../../src/run/migrate.ts";
import { ensureBuild } from "../../src/run/prepare.mjs";

const outDir = ".clatterbench/test-dist";

export interface BenchServer {
  host: string;
  port: number;
  /** Resident memory in bytes. */
  memory(): number;
  /** Seconds of processor time used so far; undefined where the system does not tell. */
  processorTime(): number | undefined;
  stop(): Promise<void>;
}

/** The built application on a database of its own, as the tests start it. */
export async function startServer(): Promise<BenchServer> {
  await ensureBuild(outDir, new AbortController().signal);
  const { url } = await startCluster("test");
  const admin = postgres(url, { max: 1, onnotice: () => undefined });
  const name = `bench_${process.pid}`;
  await admin`CREATE DATABASE ${admin(name)}`;
  const database = new URL(url);
  database.pathname = `/${name}`;
  await migrateDatabase(database.href);

  process.env["OUT_DIR"] = outDir;
  const { startApp } = await import("../support/app.ts");
  const app = await startApp({
    CLATTERBENCH_MODE: "demo",
    DATABASE_URL: database.href,
    BETTER_AUTH_SECRET: "only-for-benches-only-for-benches",
    LOG_LEVEL: "silent",
    // What is measured is the calculation, not the refusal to calculate.
    RATE_LIMIT_CALCULATORS: "10000000",
  });
  const { hostname, port } = new URL(app.url);
  return {
    host: hostname,
    port: Number(port),
    memory: () => 1024 * Number(execFileSync("ps", ["-o", "rss=", "-p", String(app.pid)], { encoding: "utf8" })),
    processorTime: () => processorTime(app.pid),
    async stop() {
      await app.stop();
      await admin`DROP DATABASE ${admin(name)} WITH (FORCE)`;
      await admin.end();
      await releaseCluster("test");
    },
  };
}

/** User and system time of a process, counted by Linux in hundredths of a second. */
function processorTime(pid: number): number | undefined {
  if (process.platform !== "linux") return undefined;
  const fields = readFileSync(`/proc/${pid}/stat`, "utf8").split(") ")[1]!.split(" ");
  return (Number(fields[11]) + Number(fields[12])) / 100;
}
