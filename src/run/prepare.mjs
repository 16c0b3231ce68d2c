// Brings a checkout to where it can run: npm packages as locked, and a build of the sources as they are. Plain Node.js,
// since it runs before any package is there.
import { spawn } from "node:child_process";
import { createHash } from "node:crypto";
import { existsSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { withLock } from "../../docker-less-db/lock.mjs";
import { checkout, ensureStateFolder } from "../../docker-less-db/place.mjs";

export class CommandFailed extends Error {}

const leastNode = [20, 19];

export function checkNode() {
  const [major, minor] = process.versions.node.split(".").map(Number);
  if (major > leastNode[0] || (major === leastNode[0] && minor >= leastNode[1])) return;
  throw new Error(`Clatterbench needs Node.js ${leastNode.join(".")} or newer; this is ${process.versions.node}.`);
}

/** Starts a program in the checkout with its output shown, and waits for it; an abort ends it. */
export function run(program, args, { signal, env = {}, label } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(program, args, {
      cwd: checkout,
      stdio: ["ignore", "inherit", "inherit"],
      env: { ...process.env, ...env },
    });
    const abort = () => child.kill("SIGTERM");
    signal?.addEventListener("abort", abort, { once: true });
    child.once("error", reject);
    child.once("exit", (code, killedBy) => {
      signal?.removeEventListener("abort", abort);
      if (code === 0) resolve();
      else
        reject(
          new CommandFailed(`${label ?? `${program} ${args.join(" ")}`} failed (${killedBy ?? `exit code ${code}`}).`),
        );
    });
  });
}

const readPackages = (path) => (existsSync(path) ? JSON.parse(readFileSync(path, "utf8")).packages : undefined);

/** Whether node_modules holds what the lock file names. npm records what it installed, at the end of an install. */
function packagesAreInstalled() {
  const locked = readPackages(join(checkout, "package-lock.json"));
  const installed = readPackages(join(checkout, "node_modules", ".package-lock.json"));
  if (!installed) return false;
  // Packages for other platforms are locked too, and never installed.
  return Object.entries(locked).every(
    ([path, { version, optional, devOptional, peer }]) =>
      path === "" || installed[path]?.version === version || (!installed[path] && (optional || devOptional || peer)),
  );
}

export async function ensurePackages(signal) {
  if (packagesAreInstalled()) return;
  await withLock(join(ensureStateFolder(), "packages.lock"), async () => {
    if (packagesAreInstalled()) return;
    console.log("Installing packages (about a minute) …");
    const npm = process.env.npm_execpath;
    const [program, ...first] = npm?.endsWith(".js") ? [process.execPath, npm] : ["npm"];
    await run(program, [...first, "ci", "--include=dev", "--no-audit", "--no-fund", "--loglevel=error"], {
      signal,
      label: "npm ci",
    });
  });
}

const buildInputs = ["src", "public", "package-lock.json", "package.json", "astro.config.mjs", "tsconfig.json"];

function filesIn(path) {
  if (!existsSync(path)) return [];
  if (!statSync(path).isDirectory()) return [path];
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesIn(join(path, name)));
}

function hashOfInputs() {
  const hash = createHash("sha256").update(process.version);
  for (const file of buildInputs.flatMap((input) => filesIn(join(checkout, input)))) {
    const content = readFileSync(file);
    hash.update(`${file.slice(checkout.length)}\0${content.length}\0`).update(content);
  }
  return hash.digest("hex");
}

/** Builds into `folder` unless it already holds a build of the very same sources. */
export async function ensureBuild(folder, signal) {
  const stamp = join(checkout, folder, "inputs.sha256");
  const isCurrent = (hash) => existsSync(stamp) && readFileSync(stamp, "utf8") === hash;
  await withLock(join(ensureStateFolder(), `build-${folder.replaceAll("/", "-")}.lock`), async () => {
    const hash = hashOfInputs();
    if (isCurrent(hash)) return;
    console.log("Building …");
    rmSync(stamp, { force: true });
    const astro = join("node_modules", "astro", "astro.js");
    const env = { OUT_DIR: folder, ASTRO_TELEMETRY_DISABLED: "1", NODE_ENV: "production" };
    await run(process.execPath, [astro, "build", "--silent"], { signal, env, label: "The build" });
    await run(process.execPath, [join("src", "run", "bundle.mjs")], { signal, env, label: "The server's bundle" });
    // Written last, so that a build which was interrupted is not taken for a whole one.
    writeFileSync(stamp, hash);
  });
}
