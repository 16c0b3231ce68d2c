// `npm start`: installs, builds, starts a database and serves, each only where there is something to do. Ctrl-C stops
// all of it. Plain Node.js, since it runs before any package is there.
import { spawn } from "node:child_process";
import { randomBytes } from "node:crypto";
import { existsSync, readFileSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { releaseCluster, startCluster } from "../../docker-less-db/cluster.mjs";
import { checkout, ensureStateFolder } from "../../docker-less-db/place.mjs";
import { serverArguments } from "./serverCommand.mjs";
import { checkNode, ensureBuild, ensurePackages } from "./prepare.mjs";

const developing = process.argv.includes("--dev");
const cluster = "app";

function rememberedSecret() {
  const path = join(ensureStateFolder(), "auth-secret");
  if (!existsSync(path)) writeFileSync(path, randomBytes(32).toString("base64url"), { mode: 0o600 });
  return readFileSync(path, "utf8");
}

const stopping = new AbortController();
let server;
let holdsCluster = false;

function stop() {
  if (stopping.signal.aborted) return;
  stopping.abort();
  server?.kill("SIGTERM");
}
for (const signal of ["SIGINT", "SIGTERM", "SIGHUP"]) process.on(signal, stop);

// npm passes signals on, but a killed npm leaves no one at whose terminal Ctrl-C could be pressed.
if (process.env.npm_lifecycle_event) {
  const npm = process.ppid;
  setInterval(() => process.ppid !== npm && stop(), 1000).unref();
}

function settingsOf(databaseUrl, demo) {
  return {
    ...process.env,
    DATABASE_URL: databaseUrl,
    ...(demo && !process.env.BETTER_AUTH_SECRET ? { BETTER_AUTH_SECRET: rememberedSecret() } : {}),
  };
}

/** Runs the server until it ends, and returns its exit code. */
function serve(env) {
  const args = developing
    ? ["--import", "tsx", join("src", "run", "develop.ts")]
    : serverArguments(env.OUT_DIR || "dist");
  return new Promise((resolve, reject) => {
    server = spawn(process.execPath, args, { cwd: checkout, env, stdio: ["ignore", "inherit", "inherit", "ipc"] });
    server.once("error", reject);
    server.once("exit", (code) => resolve(code ?? 1));
  });
}

async function start() {
  checkNode();
  if (existsSync(join(checkout, ".env"))) process.loadEnvFile(join(checkout, ".env"));
  process.env.CLATTERBENCH_MODE ||= "demo";
  const demo = process.env.CLATTERBENCH_MODE === "demo";

  await ensurePackages(stopping.signal);
  stopping.signal.throwIfAborted();
  // A team that runs this in earnest names its own server; a missing name is then told with the other settings.
  if (demo && !process.env.DATABASE_URL) {
    holdsCluster = true;
    process.env.DATABASE_URL = (await startCluster(cluster)).url;
    stopping.signal.throwIfAborted();
  }
  if (!developing) await ensureBuild(process.env.OUT_DIR || "dist", stopping.signal);
  stopping.signal.throwIfAborted();
  return serve(settingsOf(process.env.DATABASE_URL, demo));
}

try {
  process.exitCode = await start();
} catch (error) {
  if (!stopping.signal.aborted) {
    console.error(error.message);
    process.exitCode = 1;
  }
} finally {
  if (holdsCluster) await releaseCluster(cluster);
}
